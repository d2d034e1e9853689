import express from 'express';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import request from 'supertest';
import { afterAll, describe, expect, it } from 'vitest';
import { problemMiddleware } from '../../../server/http/problem-middleware';
import { openLogger } from '../../../server/platform/logger';

const folder = mkdtempSync(path.join(tmpdir(), 'paperside-'));
writeFileSync(path.join(folder, 'a.js'), 'short');

const app = express();
app.use(express.json());
app.use('/assets', express.static(folder, { fallthrough: false }));
app.get('/slow', () => {
  throw Object.assign(new Error('canceling statement due to statement timeout'), { code: '57014' });
});
app.use(problemMiddleware(openLogger('silent')));

afterAll(() => {
  rmSync(folder, { recursive: true });
});

describe('what the parts below refuse by themselves', () => {
  it.each([
    ['a file that is not there any more', () => request(app).get('/assets/missing.js'), 404],
    ['a path with a zero byte', () => request(app).get('/assets/%00'), 400],
    ['a range beyond the end', () => request(app).get('/assets/a.js').set('Range', 'bytes=900-'), 400],
    [
      'a body that is not packed as it says',
      () =>
        request(app)
          .post('/assets/a.js')
          .set('Content-Encoding', 'gzip')
          .set('Content-Type', 'application/json')
          .send('{}'),
      400,
    ],
    ['a wait that took too long', () => request(app).get('/slow'), 409],
  ])('is a problem in plain words: %s', async (_what, ask, status) => {
    const reply = await ask();
    expect(reply.status).toBe(status);
    expect(reply.headers['content-type']).toContain('application/problem+json');
    expect(reply.body).toMatchObject({ status, detail: expect.stringMatching(/^[A-Z].*\.$/) as string });
  });
});
