import { beforeAll, describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
import { addRun, eventsAbout, pack, packageRow, packOne } from '../packages/packing-room';
import { detailOf, giveUp, openLoad, openLoadingBay, problemOf, scan, stagedRun, type LoadingBay } from './loading-bay';

const app = openTestApp();
let bay: LoadingBay;
let otherSterilizerId: string;

beforeAll(async () => {
  bay = await openLoadingBay(app);
  const first = await app.db('sterilizers').where({ id: bay.sterilizerId }).first<Record<string, unknown>>();
  otherSterilizerId = anId();
  await app
    .db('sterilizers')
    .insert({ ...first, id: otherSterilizerId, code: 'ST-2', number: '2', name: 'Sterilizer 2' });
  await app
    .db('sterilizer_programs')
    .insert({ sterilizer_id: otherSterilizerId, program_id: bay.programId, is_qualified: true });
});

const rounds = Array.from({ length: 8 }, (_, round) => round);

describe('two people at once', () => {
  it('open one run on two sterilizers: exactly one load gets it, the other is told that it is taken', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    for (const _ of rounds) {
      const { runId, packages } = await stagedRun(app, bay.pouch.id, 2);
      const ask = (sterilizerId: string, cartId: string) => ({
        requestId: anId(),
        sterilizerId,
        programId: bay.programId,
        cartId,
        runId,
      });
      const replies = await Promise.all([
        technician.post('/api/loads').send(ask(bay.sterilizerId, bay.cartIds[0])),
        lead.post('/api/loads').send(ask(otherSterilizerId, bay.cartIds[1])),
      ]);
      expect(replies.map((reply) => reply.status).sort()).toEqual([201, 409]);
      const late = replies.find((reply) => reply.status === 409);
      expect(problemOf(late?.body)).toMatchObject({
        code: 'run.taken',
        detail: 'Mixed wraps is already on another load.',
      });
      const { loadId } = replies.find((reply) => reply.status === 201)?.body as { loadId: string };
      const listed = await app.db('load_packages').where({ is_open: true }).pluck<string[]>('package_id');
      expect(listed.sort()).toEqual(packages.map((one) => one.id).sort());
      expect(await app.db('loads').where({ state: 'building' }).pluck<string[]>('id')).toEqual([loadId]);
      await giveUp(app, loadId);
    }
  });

  it('give a load up and stage into its run or elsewhere: no package is lost, doubled or left in the load', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    for (const round of rounds) {
      const { runId, packages } = await stagedRun(app, bay.pouch.id, 4);
      const loadId = await openLoad(technician, bay, { runId });
      for (const one of packages.slice(0, 2)) await scan(technician, loadId, one.code);
      const added = await packOne(app, bay.pouch.id);
      const otherRun = await addRun(app, 'Elsewhere');
      const packageIds = packages.map((one) => one.id).reverse();
      const [gaveUp, intoIts, intoOther] = await Promise.all([
        technician.post(`/api/loads/${loadId}/abandon`).send({ requestId: anId(), reason: 'Needed for a test' }),
        lead.post(`/api/runs/${runId}/packages`).send({ requestId: anId(), packageIds: [added.id] }),
        lead.post(`/api/runs/${otherRun}/packages`).send({ requestId: anId(), packageIds }),
      ]);
      expect(gaveUp.status).toBe(204);
      // Before: a load has taken the run. After: it waits again.
      expect(intoIts.status === 200 ? 'staged' : problemOf(intoIts.body).code, `round ${round}`).toMatch(
        /^(staged|run\.taken)$/,
      );
      expect(problemOf(intoOther.body).code).toMatch(/^package\.in-another-(load|run)$/);
      for (const one of packages) {
        expect(await packageRow(app, one.id)).toMatchObject({ state: 'staged', run_id: runId });
      }
      expect(await packageRow(app, added.id)).toMatchObject(
        intoIts.status === 200 ? { state: 'staged', run_id: runId } : { state: 'packed', run_id: null },
      );
      expect(await app.db('load_packages').where({ load_id: loadId, is_open: true })).toEqual([]);
      expect(await app.db('runs').where({ id: runId }).first('state')).toEqual({ state: 'waiting' });
    }
  });

  it('take the same act back: it happens once, and the act before it stays', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    const loadId = await openLoad(technician, bay);
    for (const _ of rounds) {
      const [first, second] = await pack(app, bay.container.id, 2);
      if (!first || !second) throw new Error('nothing was packed');
      await scan(technician, loadId, first.code);
      await scan(technician, loadId, second.code);
      const undoing = `Scan of ${second.code}`;
      const replies = await Promise.all(
        [technician, lead].map((agent) => agent.post(`/api/loads/${loadId}/undo`).send({ requestId: anId(), undoing })),
      );
      expect(replies.map((reply) => reply.status).sort()).toEqual([200, 409]);
      const late = replies.find((reply) => reply.status === 409);
      expect(problemOf(late?.body)).toMatchObject({ code: 'load.changed-since' });
      expect(problemOf(late?.body).detail).toContain(first.code);
      expect(await packageRow(app, second.id)).toMatchObject({ state: 'packed' });
      expect(await packageRow(app, first.id)).toMatchObject({ state: 'in-load' });
    }
    const undone = (await eventsAbout(app, loadId)).filter(({ kind }) => kind === 'load.undone');
    expect(undone).toHaveLength(rounds.length);
    expect((await detailOf(technician, loadId)).view.packages).toHaveLength(rounds.length);
    await giveUp(app, loadId);
  });
});
