import { describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { api, noContentSchema, withQuery } from '../../../src/lib/api-client';
import { fieldNameOf, isProblem, NoLineError, ProblemError, sentenceOf } from '../../../src/lib/errors';
import { lineStore } from '../../../src/lib/line';
import { serverNow } from '../../../src/lib/server-clock';
import { signedOutGate } from '../../../src/lib/signed-out-gate';
import { nobody } from '../../support/render-app';
import { stubServer } from '../../support/server-stub';

const traySchema = z.object({ name: z.string() });
const dele = 'person-dele';
const ines = 'person-ines';

describe('what is sent', () => {
  it('marks every write as our own and carries JSON', async () => {
    const server = stubServer({ 'POST /api/items': () => ({ json: { name: 'Tray' } }) });
    await expect(api.post('/api/items', { name: 'Tray' }, traySchema)).resolves.toEqual({ name: 'Tray' });
    const [call] = server.calls;
    expect(call?.headers.get('X-Requested-With')).toBe('paperside');
    expect(call?.headers.get('Content-Type')).toBe('application/json');
    expect(call?.body).toEqual({ name: 'Tray' });
  });

  it('sends a form as it is, for the browser to name its boundary', async () => {
    const server = stubServer({ 'POST /api/items/import': () => ({ json: { name: 'x' } }) });
    const form = new FormData();
    form.set('file', new File(['a'], 'items.csv'));
    await api.upload('/api/items/import', form, traySchema);
    expect(server.calls[0]?.body).toBe(form);
    expect(server.calls[0]?.headers.has('Content-Type')).toBe(false);
    expect(server.calls[0]?.headers.get('X-Requested-With')).toBe('paperside');
  });

  it('says when the screen asks by itself, long after the last touch', async () => {
    const server = stubServer({ 'GET /api/today': () => ({ json: { name: 'x' } }) });
    vi.useFakeTimers({ toFake: ['Date'] });
    await api.get('/api/today', traySchema);
    vi.setSystemTime(Date.now() + 60_000);
    await api.get('/api/today', traySchema);
    expect(server.calls.map((call) => call.headers.get('X-Background'))).toEqual([null, 'yes']);
  });

  it('leaves out of the address what has no value', () => {
    expect(withQuery('/api/items', { search: 'tray & co', page: 2, kind: null, retired: undefined, text: '' })).toBe(
      '/api/items?search=tray+%26+co&page=2',
    );
    expect(withQuery('/api/items', {})).toBe('/api/items');
  });
});

describe('what comes back', () => {
  it('is a problem with its code, sentence and fields', async () => {
    stubServer({
      'POST /api/items': () => ({
        problem: 'item.code-taken',
        status: 409,
        detail: 'Another item has this code.',
        fields: [{ pointer: '/body/code', detail: 'Taken.' }],
      }),
    });
    const error: unknown = await api.post('/api/items', {}, traySchema).catch((thrown: unknown) => thrown);
    expect(isProblem(error, 'item.code-taken')).toBe(true);
    expect(error).toMatchObject({ httpStatus: 409, reference: 'ref-1', fields: [{ pointer: '/body/code' }] });
    expect(sentenceOf(error)).toBe('Another item has this code.');
  });

  it('is refused when it is not what was agreed', async () => {
    stubServer({ 'GET /api/items': () => ({ json: { nome: 'Tray' } }) });
    await expect(api.get('/api/items', traySchema)).rejects.toMatchObject({ code: 'reply.unreadable' });
  });

  it('is in plain words even when a stranger answers', async () => {
    stubServer({ 'GET /api/items': () => ({ text: '<h1>Oops</h1>', status: 500, contentType: 'text/html' }) });
    const error: unknown = await api.get('/api/items', traySchema).catch((thrown: unknown) => thrown);
    expect(error).toBeInstanceOf(ProblemError);
    expect(sentenceOf(error)).not.toMatch(/500|html|Oops/);
  });

  it('may be nothing', async () => {
    stubServer({ 'DELETE /api/session': () => ({ nothing: true }) });
    await expect(api.delete('/api/session', undefined, noContentSchema)).resolves.toBeUndefined();
  });

  it('tells the time of the server when the tablet is far off', async () => {
    vi.useFakeTimers({ toFake: ['Date'], now: new Date('2026-03-17T09:00:00Z') });
    vi.stubGlobal('fetch', () =>
      Promise.resolve(Response.json({ name: 'x' }, { headers: { Date: 'Tue, 17 Mar 2026 10:30:00 GMT' } })),
    );
    await api.get('/api/today', traySchema);
    expect(serverNow().toISOString()).toBe('2026-03-17T10:30:00.000Z');
    vi.stubGlobal('fetch', () =>
      Promise.resolve(Response.json({ name: 'x' }, { headers: { Date: 'Tue, 17 Mar 2026 09:00:01 GMT' } })),
    );
    await api.get('/api/today', traySchema);
    expect(serverNow().toISOString()).toBe('2026-03-17T09:00:00.000Z');
  });
});

describe('the line to the server', () => {
  it.each([
    ['nobody answers', { silence: true }],
    ['a gateway answers for it', { text: 'Bad gateway', status: 502, contentType: 'text/plain' }],
  ] as const)('is down when %s, and up with the next answer', async (_name, answer) => {
    const server = stubServer({ 'GET /api/today': () => answer });
    await expect(api.get('/api/today', traySchema)).rejects.toBeInstanceOf(NoLineError);
    expect(lineStore.get().isUp).toBe(false);
    server.handlers['GET /api/today'] = () => ({ problem: 'x', status: 404, detail: 'Not here.' });
    await expect(api.get('/api/today', traySchema)).rejects.toBeInstanceOf(ProblemError);
    expect(lineStore.get().isUp).toBe(true);
  });

  it('is not taken to be down when the screen itself gave the call up', async () => {
    const leaving = new AbortController();
    stubServer({
      'GET /api/today': () => {
        leaving.abort();
        return { json: { name: 'x' } };
      },
    });
    await expect(api.get('/api/today', traySchema, { signal: leaving.signal })).rejects.toThrow();
    expect(lineStore.get().isUp).toBe(true);
  });
});

describe('a sign-in that ends in the middle of work', () => {
  function serverThatAsksOnce(address: string) {
    let isSignedIn = false;
    const server = stubServer({ [address]: () => (isSignedIn ? { json: { name: 'Tray' } } : nobody) });
    return {
      server,
      signIn: (personId: string) => {
        isSignedIn = true;
        signedOutGate.signedIn(personId);
      },
    };
  }

  it('holds the call, tells it once, and goes on with it when the same person is back', async () => {
    signedOutGate.signedIn(dele);
    const { server, signIn } = serverThatAsksOnce('POST /api/items');
    const told = vi.fn();
    const stop = signedOutGate.onSignedOut(told);
    const both = Promise.all([
      api.post('/api/items', { requestId: 'r1' }, traySchema),
      api.post('/api/items', { requestId: 'r2' }, traySchema),
    ]);
    await vi.waitFor(() => {
      expect(signedOutGate.heldCalls).toBe(2);
    });
    expect(told).toHaveBeenCalledTimes(1);
    signIn(dele);
    await expect(both).resolves.toEqual([{ name: 'Tray' }, { name: 'Tray' }]);
    // The repeat carries the same request id, so that nothing is done twice.
    expect(server.calls.map((call) => call.body)).toEqual([
      { requestId: 'r1' },
      { requestId: 'r2' },
      { requestId: 'r1' },
      { requestId: 'r2' },
    ]);
    stop();
  });

  it('puts no act of one person under the name of another', async () => {
    signedOutGate.signedIn(dele);
    const { server, signIn } = serverThatAsksOnce('POST /api/items');
    const write = api.post('/api/items', {}, traySchema);
    const refused = expect(write).rejects.toMatchObject({ code: 'session.other-person' });
    await vi.waitFor(() => {
      expect(signedOutGate.heldCalls).toBe(1);
    });
    signIn(ines);
    await refused;
    expect(server.calls).toHaveLength(1);
  });

  it('goes on reading for whoever signs in', async () => {
    signedOutGate.signedIn(dele);
    const { signIn } = serverThatAsksOnce('GET /api/today');
    const read = api.get('/api/today', traySchema);
    await vi.waitFor(() => {
      expect(signedOutGate.heldCalls).toBe(1);
    });
    signIn(ines);
    await expect(read).resolves.toEqual({ name: 'Tray' });
  });

  it('gives the call up with the person who leaves', async () => {
    signedOutGate.signedIn(dele);
    serverThatAsksOnce('GET /api/today');
    const read = api.get('/api/today', traySchema);
    const refused = expect(read).rejects.toMatchObject({ httpStatus: 401, code: 'session.none' });
    await vi.waitFor(() => {
      expect(signedOutGate.heldCalls).toBe(1);
    });
    signedOutGate.leave();
    await refused;
  });

  it('does not hold what asks for a sign-in itself, nor anything while nobody was signed in', async () => {
    signedOutGate.signedIn(dele);
    serverThatAsksOnce('POST /api/session');
    await expect(api.post('/api/session', {}, traySchema, { whenSignedOut: 'throw' })).rejects.toMatchObject({
      httpStatus: 401,
    });
    signedOutGate.leave();
    await expect(api.post('/api/session', {}, traySchema)).rejects.toMatchObject({ httpStatus: 401 });
    expect(signedOutGate.isClosed.get()).toBe(false);
  });

  it('lets a screen that goes away take its held call with it', async () => {
    signedOutGate.signedIn(dele);
    serverThatAsksOnce('GET /api/today');
    const leaving = new AbortController();
    const read = api.get('/api/today', traySchema, { signal: leaving.signal });
    const refused = expect(read).rejects.toThrow();
    await vi.waitFor(() => {
      expect(signedOutGate.heldCalls).toBe(1);
    });
    leaving.abort();
    await refused;
    expect(signedOutGate.heldCalls).toBe(0);
    signedOutGate.leave();
  });
});

describe('the field that a problem names', () => {
  // RFC 6901, section 3: "~1" stands for "/", "~0" for "~".
  it.each([
    ['/body/code', 'code'],
    ['/body/packages/0/code', 'packages.0.code'],
    ['/code', 'code'],
    ['/body', 'body'],
    ['/body/a~1b~0c', 'a/b~c'],
  ])('%s is called %s in a form', (pointer, name) => {
    expect(fieldNameOf(pointer)).toBe(name);
  });
});
