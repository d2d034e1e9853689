import { beforeAll, describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
import { packOne } from '../packages/packing-room';
import { edit, giveUp, openLoad, openLoadingBay, problemOf, scan, stagedRun, type LoadingBay } from './loading-bay';

const app = openTestApp();
let bay: LoadingBay;

beforeAll(async () => {
  bay = await openLoadingBay(app);
});

describe('load stickers', () => {
  it('are printed one live per package; a reprint needs a reason and voids the one before', async () => {
    const technician = await app.as('technician');
    const loadId = await openLoad(technician, bay);
    const one = await packOne(app, bay.container.id);
    await scan(technician, loadId, one.code);
    const print = (packageIds: string[] | null, reason: string | null) =>
      technician.post(`/api/loads/${loadId}/stickers`).send({ requestId: anId(), packageIds, reason });

    const first = await print(null, null);
    expect(first.status).toBe(200);
    const pdf = (first.body as { pdf: string }).pdf;
    const sheet = await technician
      .get(pdf)
      .expect(200)
      .expect('content-type', /application\/pdf/);
    expect((sheet.body as Buffer).subarray(0, 5).toString()).toBe('%PDF-');

    expect(problemOf((await print(null, null)).body).code).toBe('load.no-stickers-needed');
    expect(problemOf((await print([one.id], null)).body).code).toBe('load.sticker-reprint-needs-reason');
    expect((await print([one.id], 'The first one tore')).status).toBe(200);
    const rows = await app
      .db('load_stickers')
      .where({ package_id: one.id })
      .orderBy('copy')
      .select<{ copy: number; voided_at: Date | null }[]>();
    expect(rows.map((row) => [row.copy, row.voided_at !== null])).toEqual([
      [1, true],
      [2, false],
    ]);
    // The old sheet would bring a void sticker back.
    expect((await technician.get(pdf)).status).toBe(404);

    await edit(technician, loadId, [{ edit: 'take-off', packageId: one.id }]);
    expect(await app.db('load_stickers').where({ package_id: one.id }).whereNull('voided_at')).toHaveLength(0);
    await giveUp(app, loadId);
  });

  it('cannot be live twice for one package, whatever the code above the table does', async () => {
    const technician = await app.as('technician');
    const loadId = await openLoad(technician, bay);
    const one = await packOne(app, bay.container.id);
    await scan(technician, loadId, one.code);
    const row = (copy: number) => ({
      id: anId(),
      batch_id: anId(),
      load_id: loadId,
      package_id: one.id,
      copy,
      reason: copy > 1 ? 'Again' : null,
      printed_by: app.person('technician').id,
      printed_at: app.clock.now(),
    });
    await app.db('load_stickers').insert(row(1));
    await expect(app.db('load_stickers').insert(row(2))).rejects.toMatchObject({
      constraint: 'load_stickers_package_id_live_key',
    });
    await giveUp(app, loadId);
  });

  it('are not printed for what was not scanned', async () => {
    const technician = await app.as('technician');
    const { runId, packages } = await stagedRun(app, bay.pouch.id, 1);
    const loadId = await openLoad(technician, bay, { runId });
    const reply = await technician
      .post(`/api/loads/${loadId}/stickers`)
      .send({ requestId: anId(), packageIds: [packages[0]?.id], reason: null });
    expect(problemOf(reply.body).code).toBe('load.sticker-not-scanned');
    await giveUp(app, loadId);
  });
});
