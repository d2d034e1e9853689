import { beforeAll, describe, expect, it } from 'vitest';
import { mm } from '../../../src/domain/units/quantity';
import { anId, openTestApp } from '../../support/test-app';
import { addRun, pack, packageRow } from '../packages/packing-room';
import { detailOf, giveUp, openLoad, openLoadingBay, scan, type LoadingBay } from './loading-bay';

const app = openTestApp();
let bay: LoadingBay;

beforeAll(async () => {
  bay = await openLoadingBay(app);
});

describe('two acts that want the same things in opposite order', () => {
  it('packages: several taken off a load while the same ones are staged, over and over', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    const loadId = await openLoad(technician, bay);
    const runId = await addRun(app);
    for (let round = 0; round < 6; round += 1) {
      const packages = await pack(app, bay.container.id, 10);
      // Onto the load in the opposite order of their ids, which sort by the time they were made.
      for (const one of [...packages].reverse()) {
        await scan(technician, loadId, one.code);
        app.clock.advance({ seconds: 1 });
      }
      const edits = packages.map((one) => ({ edit: 'take-off', packageId: one.id }));
      const packageIds = packages.map((one) => one.id);
      let isTakenOff = false;
      const takeOff = async () => {
        const reply = await technician.post(`/api/loads/${loadId}/edits`).send({ requestId: anId(), edits });
        isTakenOff = true;
        return reply;
      };
      // One after the other until it is done, so that some of them fall into the middle of it.
      const stageMeanwhile = async () => {
        const answers: string[] = [];
        while (!isTakenOff) {
          const reply = await lead.post(`/api/runs/${runId}/packages`).send({ requestId: anId(), packageIds });
          answers.push(reply.status === 200 ? 'staged' : (reply.body as { code: string }).code);
        }
        return answers;
      };
      const [takenOff, ...staged] = await Promise.all([
        takeOff(),
        stageMeanwhile(),
        stageMeanwhile(),
        stageMeanwhile(),
        stageMeanwhile(),
      ]);
      expect(takenOff.status, JSON.stringify(takenOff.body)).toBe(200);
      // In a load still, or free already: an answer in its own words, never that the database had to give one up.
      for (const answer of staged.flat()) expect(['staged', 'package.in-another-load']).toContain(answer);
      const states = await Promise.all(packages.map(async (one) => (await packageRow(app, one.id)).state));
      expect([...new Set(states)]).toHaveLength(1);
      expect(['packed', 'staged']).toContain(states[0]);
    }
    await giveUp(app, loadId);
  }, 60_000);

  it('holders: two put on two carts at one moment; one load gets both, the other is told', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    const loads = [
      { agent: technician, id: await openLoad(technician, bay, { cart: 0 }), racks: bay.racks },
      { agent: lead, id: await openLoad(lead, bay, { cart: 1 }), racks: [...bay.racks].reverse() },
    ];
    for (let round = 0; round < 10; round += 1) {
      const replies = await Promise.all(
        loads.map(async ({ agent, id, racks }) => {
          const { view } = await detailOf(agent, id);
          const shelfId = view.cart.shelves[0]?.id;
          return agent.post(`/api/loads/${id}/edits`).send({
            requestId: anId(),
            edits: racks.map((rack, place) => ({
              edit: 'place-holder',
              holderId: rack.id,
              shelfId,
              xMm: mm(20 + 200 * place),
              yMm: mm(100),
              turn: 0,
            })),
          });
        }),
      );
      expect(replies.map((reply) => reply.status).sort(), replies.map((reply) => reply.text).join()).toEqual([
        200, 422,
      ]);
      const late = replies.find((reply) => reply.status === 422);
      expect((late?.body as { code: string }).code).toBe('holder.not-free');
      const won = loads[replies.findIndex((reply) => reply.status === 200)];
      expect((await detailOf(technician, won?.id ?? '')).view.holders).toHaveLength(2);
      await technician
        .post(`/api/loads/${won?.id ?? ''}/edits`)
        .send({ requestId: anId(), edits: bay.racks.map((rack) => ({ edit: 'take-holder-off', holderId: rack.id })) })
        .expect(200);
    }
    for (const { id } of loads) await giveUp(app, id);
  }, 60_000);
});
