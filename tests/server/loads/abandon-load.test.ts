import { beforeAll, describe, expect, it } from 'vitest';
import { anId, openTestApp } from '../../support/test-app';
import { packageRow } from '../packages/packing-room';
import { detailOf, giveUp, openLoad, openLoadingBay, scan, stagedRun, type LoadingBay } from './loading-bay';

const app = openTestApp();
let bay: LoadingBay;

beforeAll(async () => {
  bay = await openLoadingBay(app);
});

describe('giving a load up', () => {
  it('needs a reason, and lets its packages, run, holders and cart wait again', async () => {
    const technician = await app.as('technician');
    const { runId, packages } = await stagedRun(app, bay.pouch.id, 2);
    const loadId = await openLoad(technician, bay, { runId });
    await scan(technician, loadId, bay.racks[0].placeCode);
    await scan(technician, loadId, packages[0]?.code ?? '', { kind: 'holder', holderId: bay.racks[0].id });
    expect((await technician.post(`/api/loads/${loadId}/abandon`).send({ requestId: anId(), reason: '' })).status).toBe(
      400,
    );
    await technician
      .post(`/api/loads/${loadId}/abandon`)
      .send({ requestId: anId(), reason: 'Sterilizer needed for a test' })
      .expect(204);
    for (const one of packages) expect(await packageRow(app, one.id)).toMatchObject({ state: 'staged', run_id: runId });
    const again = await openLoad(technician, bay, { runId });
    expect((await detailOf(technician, again)).view.packages).toHaveLength(2);
    expect(await scan(technician, again, bay.racks[0].placeCode)).toMatchObject({ answer: 'place-set' });
    await giveUp(app, again);
  });
});
