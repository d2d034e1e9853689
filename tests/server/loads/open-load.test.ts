import { beforeAll, describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
import {
  detailOf,
  giveUp,
  loadSnapshot,
  openLoad,
  openLoadingBay,
  problemOf,
  stagedRun,
  type LoadingBay,
} from './loading-bay';

const app = openTestApp();
let bay: LoadingBay;

beforeAll(async () => {
  bay = await openLoadingBay(app);
});

describe('opening a load', () => {
  it('numbers it by sterilizer, day of the year and count of the day, and lists the run', async () => {
    const technician = await app.as('technician');
    const { runId, packages } = await stagedRun(app, bay.pouch.id, 3);
    const loadId = await openLoad(technician, bay, { runId });
    const detail = await detailOf(technician, loadId);
    // 3 March 2026 is day 62 of the year: 31 + 28 + 3.
    expect(detail.summary.number).toMatch(/^1-26062-\d\d$/);
    expect(detail.view.packages.map((entry) => entry.code).sort()).toEqual(packages.map((one) => one.code).sort());
    expect(detail.view.packages.every((entry) => !entry.isScanned && entry.state === 'staged')).toBe(true);
    await giveUp(app, loadId);
  });

  it('is refused on a program the sterilizer is not qualified for, by name', async () => {
    const before = await loadSnapshot(app);
    const reply = await (await app.as('technician')).post('/api/loads').send({
      requestId: anId(),
      sterilizerId: bay.sterilizerId,
      programId: bay.unqualifiedProgramId,
      cartId: bay.cartIds[0],
      runId: null,
    });
    expect(reply.status).toBe(422);
    expect(problemOf(reply.body)).toMatchObject({ code: 'load.program-not-qualified' });
    expect(problemOf(reply.body).detail).toContain('W3-16');
    expect(await loadSnapshot(app)).toBe(before);
  });

  it.each([
    ['out-of-service', 'Sterilizer 1 is out of service. Choose another sterilizer.'],
    ['awaiting-requalification', 'Sterilizer 1 is awaiting requalification. Choose another sterilizer.'],
  ])('is refused on a sterilizer that is %s', async (state, sentence) => {
    const technician = await app.as('technician');
    await app.db('sterilizers').where({ id: bay.sterilizerId }).update({ service_state: state });
    const before = await loadSnapshot(app);
    const ask = {
      requestId: anId(),
      sterilizerId: bay.sterilizerId,
      programId: bay.programId,
      cartId: bay.cartIds[0],
      runId: null,
    };
    const refused = await technician.post('/api/loads').send(ask);
    expect(refused.status).toBe(422);
    expect(problemOf(refused.body)).toMatchObject({ code: 'load.sterilizer-not-in-service', detail: sentence });
    expect(await loadSnapshot(app)).toBe(before);

    // A refusal keeps nothing: once the sterilizer is in service again, the very same request is taken.
    await app.db('sterilizers').where({ id: bay.sterilizerId }).update({ service_state: 'in-service' });
    const taken = await technician.post('/api/loads').send(ask).expect(201);
    await giveUp(app, (taken.body as { loadId: string }).loadId);
  });

  it('is refused on a cart that carries another load, also when two ask at once', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    const ask = { sterilizerId: bay.sterilizerId, programId: bay.programId, cartId: bay.cartIds[0], runId: null };
    const replies = await Promise.all([
      technician.post('/api/loads').send({ requestId: anId(), ...ask }),
      lead.post('/api/loads').send({ requestId: anId(), ...ask }),
    ]);
    expect(replies.map((reply) => reply.status).sort()).toEqual([201, 409]);
    const won = replies.find((reply) => reply.status === 201)?.body as { loadId: string };
    await giveUp(app, won.loadId);
  });

  it('gives two loads opened at once on two carts two numbers', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    const loadIds = await Promise.all([openLoad(technician, bay, { cart: 0 }), openLoad(lead, bay, { cart: 1 })]);
    const numbers = await Promise.all(loadIds.map(async (id) => (await detailOf(technician, id)).summary.number));
    expect(new Set(numbers).size).toBe(2);
    for (const loadId of loadIds) await giveUp(app, loadId);
  });

  it('lets one of two take a run', async () => {
    const technician = await app.as('technician');
    const lead = await app.as('lead');
    const { runId } = await stagedRun(app, bay.pouch.id, 2);
    const ask = (cart: 0 | 1) => ({
      requestId: anId(),
      sterilizerId: bay.sterilizerId,
      programId: bay.programId,
      cartId: bay.cartIds[cart],
      runId,
    });
    const replies = await Promise.all([
      technician.post('/api/loads').send(ask(0)),
      lead.post('/api/loads').send(ask(1)),
    ]);
    expect(replies.map((reply) => reply.status).sort()).toEqual([201, 409]);
    const won = replies.find((reply) => reply.status === 201)?.body as { loadId: string };
    await giveUp(app, won.loadId);
  });

  it('knows nothing of the equipment of another facility', async () => {
    const reply = await (await app.as('technician', 'B')).post('/api/loads').send({
      requestId: anId(),
      sterilizerId: bay.sterilizerId,
      programId: bay.programId,
      cartId: bay.cartIds[0],
      runId: null,
    });
    expect(reply.status).toBe(404);
  });
});
