import { beforeAll, describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
import { addItem, addRun, pack, packageRow, packOne, stage, type TestItem } from './packing-room';

const app = openTestApp();
let scissors: TestItem;

beforeAll(async () => {
  scissors = await addItem(app);
});

describe('two people at once', () => {
  it('stage one package into two runs: one gets it, the other is told, twenty times over', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    const [first, second] = [await addRun(app, 'First'), await addRun(app, 'Second')];
    for (const one of await pack(app, scissors.id, 20)) {
      const replies = await Promise.all([
        technician.post(`/api/runs/${first}/scan`).send({ requestId: anId(), raw: one.code }),
        lead.post(`/api/runs/${second}/packages`).send({ requestId: anId(), packageIds: [one.id] }),
      ]);
      const wins = [
        replies[0].status === 200 && (replies[0].body as { answer: string }).answer === 'taken',
        replies[1].status === 200,
      ];
      expect(wins.filter(Boolean)).toHaveLength(1);
      if (wins[1]) expect(replies[0].body).toMatchObject({ answer: 'not-ready' });
      else expect(replies[1].body).toMatchObject({ code: 'package.in-another-run' });
      expect(await packageRow(app, one.id)).toMatchObject({ state: 'staged', run_id: wins[0] ? first : second });
      const staged = await app.db('audit_events').where({ subject_id: one.id, kind: 'package.staged' });
      expect(staged).toHaveLength(1);
    }
  });

  it('stage the same two packages in opposite order without blocking each other for good', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    const runs = [await addRun(app), await addRun(app)] as const;
    const [a, b] = await pack(app, scissors.id, 2);
    if (!a || !b) throw new Error('nothing was packed');
    const replies = await Promise.all([
      technician.post(`/api/runs/${runs[0]}/packages`).send({ requestId: anId(), packageIds: [a.id, b.id] }),
      lead.post(`/api/runs/${runs[1]}/packages`).send({ requestId: anId(), packageIds: [b.id, a.id] }),
    ]);
    expect(replies.map((reply) => reply.status).sort()).toEqual([200, 409]);
  });

  it('drop a run and stage into it: the package ends free or the drop comes first, never staged in a dropped run', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    for (let turn = 0; turn < 10; turn += 1) {
      const runId = await addRun(app);
      const waiting = await packOne(app, scissors.id);
      await stage(app, runId, [waiting.id]);
      const late = await packOne(app, scissors.id);
      const replies = await Promise.all([
        lead.post(`/api/runs/${runId}/drop`).send({ requestId: anId() }),
        technician.post(`/api/runs/${runId}/packages`).send({ requestId: anId(), packageIds: [late.id] }),
      ]);
      expect(replies[0].status).toBe(200);
      expect([200, 409]).toContain(replies[1].status);
      for (const one of [waiting, late]) {
        expect(await packageRow(app, one.id)).toMatchObject({ state: 'packed', run_id: null });
      }
    }
  });
});
