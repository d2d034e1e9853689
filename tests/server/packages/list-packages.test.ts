import { beforeAll, describe, expect, it } from 'vitest';
import type { PackageDetail, PackageListResponse } from '../../../src/contract/packages';
import { anId, openTestApp } from '../../support/test-app';
import { addItem, addRun, pack, packOne, putInState, stage, type TestItem } from './packing-room';

const app = openTestApp();
let scissors: TestItem;
let tray: TestItem;
let runId: string;

beforeAll(async () => {
  scissors = await addItem(app, { name: 'Metzenbaum scissors' });
  tray = await addItem(app, { name: 'Laceration tray', kind: 'wrapped-tray', packaging: 'wrap', is_implant: true });
  await pack(app, scissors.id, 50);
  app.clock.advance({ minutes: 1 });
  const [first, second] = await pack(app, tray.id, 3);
  if (!first || !second) throw new Error('nothing was packed');
  runId = await addRun(app, 'Morning');
  await stage(app, runId, [first.id]);
  await putInState(app, second.id, { held_reason: 'Tape open', expires_on: '2026-03-02' });
});

async function list(query: Record<string, string>): Promise<PackageListResponse> {
  const technician = await app.as('technician');
  const reply = await technician.get('/api/packages').query(query).expect(200);
  return reply.body as PackageListResponse;
}

describe('the list of packages', () => {
  it('begins with the latest packed and comes in pages of 50', async () => {
    const first = await list({});
    expect(first).toMatchObject({ total: 53, page: 1 });
    expect(first.packages).toHaveLength(50);
    expect(first.packages.slice(0, 3).map((one) => one.item.code)).toEqual([tray.code, tray.code, tray.code]);
    const second = await list({ page: '2' });
    expect(second).toMatchObject({ total: 53, page: 2 });
    expect(second.packages).toHaveLength(3);
    const ids = [...first.packages, ...second.packages].map((one) => one.id);
    expect(new Set(ids).size).toBe(53);
    expect((await list({ page: '3' })).packages).toEqual([]);
  });

  it('finds by a part of the item’s name in any case, by item code, and by the package’s own code', async () => {
    expect(await list({ search: 'LACERATION' })).toMatchObject({ total: 3 });
    expect(await list({ search: scissors.code })).toMatchObject({ total: 50 });
    const [one] = (await list({})).packages;
    const code = one?.code ?? '';
    expect(
      (await list({ search: code.replaceAll('-', '').toLowerCase() })).packages.map((found) => found.code),
    ).toEqual([code]);
    expect((await list({ search: code.slice(0, 10) })).packages.map((found) => found.code)).toContain(code);
  });

  it('narrows by state, run and item', async () => {
    expect(await list({ state: 'staged' })).toMatchObject({ total: 1 });
    expect(await list({ runId })).toMatchObject({ total: 1, packages: [{ run: { name: 'Morning' } }] });
    expect(await list({ itemId: tray.id, state: 'packed' })).toMatchObject({ total: 2 });
    expect(await list({ itemId: anId() })).toMatchObject({ total: 0 });
  });

  it('tells who packed it, what holds it and that it is past its last day', async () => {
    const { packages } = await list({ itemId: tray.id });
    const held = packages.find((one) => one.heldReason !== null);
    expect(held).toMatchObject({
      heldReason: 'Tape open',
      expiresOn: '2026-03-02',
      isExpired: true,
      packedBy: app.person('technician').displayName,
      labels: 0,
      item: { isImplant: true, kind: 'wrapped-tray' },
    });
  });
});

describe('one package', () => {
  it('is found by its id, by its code as printed and by its code as scanned', async () => {
    const technician = await app.as('technician');
    const one = await packOne(app, scissors.id);
    for (const reference of [one.id, one.code, one.code.replaceAll('-', ''), one.code.toLowerCase()]) {
      const reply = await technician.get(`/api/packages/${reference}`).expect(200);
      expect(reply.body).toMatchObject({ package: { id: one.id } });
    }
  });

  it('tells its history in order, with names', async () => {
    const technician = await app.as('technician');
    const one = await packOne(app, scissors.id);
    app.clock.advance({ minutes: 2 });
    await technician
      .post('/api/packages/labels')
      .send({ requestId: anId(), packageIds: [one.id], layout: 'single' })
      .expect(201);
    app.clock.advance({ minutes: 2 });
    const lead = await app.as('lead');
    await lead.post(`/api/runs/${runId}/scan`).send({ requestId: anId(), raw: one.code }).expect(200);
    app.clock.advance({ minutes: 2 });
    await technician
      .post('/api/packages/labels')
      .send({ requestId: anId(), packageIds: [one.id], layout: 'single', reason: 'Wet' })
      .expect(201);
    await lead
      .post(`/api/runs/${runId}/remove`)
      .send({ requestId: anId(), packageIds: [one.id] })
      .expect(200);

    const reply = await technician.get(`/api/packages/${one.id}`).expect(200);
    const detail = reply.body as PackageDetail;
    const [ada, lee] = [app.person('technician').displayName, app.person('lead').displayName];
    expect(detail.history.map(({ who, sentence }) => `${who}: ${sentence}`)).toEqual([
      `${ada}: Packed`,
      `${ada}: Label printed`,
      `${lee}: Staged into “Morning”`,
      `${ada}: Label printed again, copy 2: Wet`,
      `${lee}: Taken out of “Morning”`,
    ]);
    expect(detail.labelPrints.map(({ copy, reason }) => ({ copy, reason }))).toEqual([
      { copy: 1, reason: null },
      { copy: 2, reason: 'Wet' },
    ]);
    expect(detail).toMatchObject({ isContentsConfirmed: true, hasInternalIndicator: true, hasExternalIndicator: true });
  });
});
