import { describe, expect, it } from 'vitest';
import type { RunSummary } from '../../../src/contract/runs';
import { anId, openTestApp } from '../../support/test-app';
import { addRun, eventsAbout, snapshot } from './packing-room';

const app = openTestApp();

async function change(runId: string, body: object) {
  const technician = await app.as('technician');
  const reply = await technician.patch(`/api/runs/${runId}`).send({ requestId: anId(), version: 1, ...body });
  return { status: reply.status, body: reply.body as { run: RunSummary; code: string; detail: string } };
}

const tomorrow = '2026-03-04T18:00:00.000Z';

describe('changing a run', () => {
  it('gives it another name and another hour, with both told in the history', async () => {
    const runId = await addRun(app, 'Room 4');
    const { status, body } = await change(runId, { name: '  Room 4, second list ', wantedAt: '2026-03-04T18:00:00Z' });
    expect(status).toBe(200);
    expect(body.run).toMatchObject({ name: 'Room 4, second list', wantedAt: tomorrow, version: 2, state: 'waiting' });
    expect((await eventsAbout(app, runId)).at(-1)).toEqual({
      kind: 'run.changed',
      payload: {
        before: { name: 'Room 4', wantedAt: null },
        after: { name: 'Room 4, second list', wantedAt: tomorrow },
      },
    });
  });

  it('leaves what is not stated, and takes the hour away when told so', async () => {
    const runId = await addRun(app, 'Room 5');
    await change(runId, { wantedAt: tomorrow });
    expect((await change(runId, { version: 2, name: 'Room 6' })).body.run).toMatchObject({ wantedAt: tomorrow });
    expect((await change(runId, { version: 3, wantedAt: null })).body.run).toMatchObject({
      name: 'Room 6',
      wantedAt: null,
      version: 4,
    });
  });

  it('writes nothing when nothing differs, and once when asked twice', async () => {
    const runId = await addRun(app, 'Room 7');
    const before = await snapshot(app);
    expect((await change(runId, { name: 'Room 7', wantedAt: null })).body.run.version).toBe(1);
    expect(await snapshot(app)).toBe(before);
    const request = { requestId: anId(), name: 'Room 8' };
    const first = await change(runId, request);
    const after = await snapshot(app);
    expect(await change(runId, request)).toEqual(first);
    expect(await snapshot(app)).toBe(after);
  });

  it('lets one of two who change it at once, and tells the other', async () => {
    const runId = await addRun(app, 'Room 9');
    const replies = await Promise.all([change(runId, { name: 'Here' }), change(runId, { name: 'There' })]);
    expect(replies.map(({ status }) => status).sort()).toEqual([200, 409]);
    const late = replies.find(({ status }) => status === 409);
    expect(late?.body).toMatchObject({
      code: 'run.changed-meanwhile',
      detail: 'Somebody else changed this run meanwhile. Look again.',
    });
    expect((await eventsAbout(app, runId)).filter(({ kind }) => kind === 'run.changed')).toHaveLength(1);
  });

  it.each(['taken', 'dropped'])('is refused for a run that is %s', async (state) => {
    const runId = await addRun(app, 'Over');
    await app.db('runs').where({ id: runId }).update({ state });
    const before = await snapshot(app);
    expect(await change(runId, { name: 'Late' })).toMatchObject({ status: 409, body: { code: `run.${state}` } });
    expect(await snapshot(app)).toBe(before);
  });

  it.each([
    ['no name', { name: ' ' }],
    ['a name too long', { name: 'x'.repeat(81) }],
    ['a NUL', { name: 'A\u0000B' }],
    ['an hour that is none', { wantedAt: 'soon' }],
    ['no version', { version: undefined, name: 'New' }],
    ['a field too many', { state: 'dropped' }],
  ])('is refused with %s', async (_what, body) => {
    const runId = await addRun(app, 'Stays');
    const before = await snapshot(app);
    const reply = await change(runId, body);
    expect(reply.status).toBe(400);
    expect(await snapshot(app)).toBe(before);
  });

  it('knows no run of another facility', async () => {
    const theirs = await addRun(app, 'Theirs', 'B');
    const before = await snapshot(app);
    expect(await change(theirs, { name: 'Ours' })).toMatchObject({ status: 404, body: { code: 'run.none' } });
    expect(await snapshot(app)).toBe(before);
  });
});
