import { beforeAll, describe, expect, it } from 'vitest';
import { mm } from '../../../src/domain/units/quantity';
import { anId, openTestApp } from '../../support/test-app';
import { packOne } from '../packages/packing-room';
import {
  detailOf,
  edit,
  giveUp,
  openLoad,
  openLoadingBay,
  problemOf,
  scan,
  stagedRun,
  type LoadingBay,
} from './loading-bay';

const app = openTestApp();
let bay: LoadingBay;

beforeAll(async () => {
  bay = await openLoadingBay(app);
});

describe('accepting a finding', () => {
  /** One pouch turned against the others: the facing rule says so, and a lead may let it stay. */
  async function loadWithOddFacing() {
    const technician = await app.as('technician');
    const { runId, packages } = await stagedRun(app, bay.pouch.id, 3);
    const loadId = await openLoad(technician, bay, { runId });
    await scan(technician, loadId, bay.racks[0].placeCode);
    for (const one of packages) await scan(technician, loadId, one.code, { kind: 'holder', holderId: bay.racks[0].id });
    await edit(technician, loadId, [{ edit: 'turn-paper', packageId: packages[1]?.id ?? '', paper: 'right' }]);
    const { findings } = await judged(loadId);
    const finding = findings.find((one) => one.ruleId === 'facing');
    if (!finding) throw new Error('the facing rule found nothing');
    return { technician, loadId, packages, finding };
  }

  async function judged(loadId: string) {
    const { evaluateLoad } = await import('../../../src/domain/load/evaluate-load');
    const { loadDetailSchema } = await import('../../../src/contract/loads');
    const detail = loadDetailSchema.parse(await detailOf(await app.as('technician'), loadId));
    return { findings: evaluateLoad(detail.view, detail.policy) };
  }

  it('needs a lead and a reason, and holds for exactly that finding', async () => {
    const { technician, loadId, finding, packages } = await loadWithOddFacing();
    const ask = { requestId: anId(), findingKey: finding.key, reason: 'Its maker asks for it this way round' };
    expect((await technician.post(`/api/loads/${loadId}/acceptances`).send(ask)).status).toBe(403);
    const lead = await app.as('lead');
    expect(
      (await lead.post(`/api/loads/${loadId}/acceptances`).send({ ...ask, requestId: anId(), reason: '  ' })).status,
    ).toBe(400);
    await lead.post(`/api/loads/${loadId}/acceptances`).send(ask).expect(200);
    const twice = await lead.post(`/api/loads/${loadId}/acceptances`).send({ ...ask, requestId: anId() });
    expect(twice.status).toBe(409);

    // The same pouch somewhere else, still turned: another finding, which nobody has accepted.
    await edit(technician, loadId, [{ edit: 'turn-paper', packageId: packages[1]?.id ?? '', paper: 'left' }]);
    await edit(technician, loadId, [{ edit: 'turn-paper', packageId: packages[0]?.id ?? '', paper: 'right' }]);
    const { decideClose } = await import('../../../src/domain/load/decide-close');
    const { loadDetailSchema } = await import('../../../src/contract/loads');
    const detail = loadDetailSchema.parse(await detailOf(technician, loadId));
    expect(
      decideClose(detail.view, detail.policy).blocks.some(
        (block) => block.kind === 'finding' && block.finding.ruleId === 'facing',
      ),
    ).toBe(true);
    await giveUp(app, loadId);
  });

  it('is refused for a finding that holds the load, and for one that is not there', async () => {
    const technician = await app.as('technician');
    const loadId = await openLoad(technician, bay);
    const one = await packOne(app, bay.pouch.id);
    await scan(technician, loadId, one.code);
    await edit(technician, loadId, [
      {
        edit: 'place',
        packageId: one.id,
        placement: {
          at: 'shelf',
          shelfId: bay.lower.id,
          xMm: mm(100),
          yMm: mm(100),
          turn: 0,
          pose: 'flat',
          paper: 'down',
        },
      },
    ]);
    const stop = (await judged(loadId)).findings.find((finding) => finding.severity === 'stop');
    const lead = await app.as('lead');
    const reason = 'We have always done it so';
    const held = await lead
      .post(`/api/loads/${loadId}/acceptances`)
      .send({ requestId: anId(), findingKey: stop?.key, reason });
    expect(problemOf(held.body).code).toBe('load.finding-not-acceptable');
    const gone = await lead
      .post(`/api/loads/${loadId}/acceptances`)
      .send({ requestId: anId(), findingKey: 'facing:nothing', reason });
    expect(problemOf(gone.body).code).toBe('load.finding-gone');
    await giveUp(app, loadId);
  });
});
