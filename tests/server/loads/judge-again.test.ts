import { createHash } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { canonicalJson, contentsOf } from '../../../src/domain/load/contents';
import type { LoadView } from '../../../src/domain/load/model';
import { ruleSetVersion } from '../../../src/domain/load/policy';
import { anId, openTestApp } from '../../support/test-app';
import { changePolicy } from '../policies/policy-room';
import { closeLoad, judgedAgain, readyLoad } from './closed-loads';
import { detailOf, giveUp, loadSnapshot, openLoad, openLoadingBay, type LoadingBay } from './loading-bay';

const app = openTestApp();
let bay: LoadingBay;
/** Closed when a challenge device was wanted in every load, and its absence was worth a note. */
let loadId: string;

beforeAll(async () => {
  bay = await openLoadingBay(app);
  await changePolicy(app, { changes: { challengeDevice: 'every-load', challengeDeviceMissing: 'advice' } });
  loadId = await readyLoad(app, bay);
  await closeLoad(app, bay, loadId);
});

const rulesOf = (findings: readonly { readonly ruleId: string }[]) => findings.map(({ ruleId }) => ruleId);

describe('a closed load judged again', () => {
  it('says the same as then while nothing has changed', async () => {
    const { status, body } = await judgedAgain(app, loadId);
    expect(status).toBe(200);
    expect(body.then).toMatchObject({ ruleSet: ruleSetVersion, policyNumber: 2 });
    expect(body.now).toMatchObject({ ruleSet: ruleSetVersion, policyNumber: 2, holding: 0 });
    expect(rulesOf(body.then.findings)).toContain('challenge-device-placed');
    expect(body.now?.findings).toEqual(body.then.findings);
    expect(body.comparison).toMatchObject({ changed: [], onlyNow: [], onlyThen: [] });
    expect(body.comparison?.both.map((pair) => pair.now)).toEqual(body.then.findings);
    expect(body.whyNot).toBeNull();
    expect(body.load).toMatchObject({ id: loadId, closedBy: 'Ada technician' });
  });

  it('tells what is judged otherwise, what only now and what only then, under which versions', async () => {
    const asClosed = (await judgedAgain(app, loadId)).body.then;
    await changePolicy(app, { changes: { challengeDeviceMissing: 'stop', greatestPouchMassKg: 0.05 } });
    const { body } = await judgedAgain(app, loadId);
    expect(body.then).toEqual(asClosed);
    expect(body.now?.policyNumber).toBe(3);
    expect(body.comparison?.changed.map(({ then, now }) => [now.ruleId, then.severity, now.severity])).toEqual([
      ['challenge-device-placed', 'advice', 'stop'],
    ]);
    expect(rulesOf(body.comparison?.onlyNow ?? [])).toEqual(['pouch-mass', 'pouch-mass']);
    expect(body.comparison?.onlyThen).toEqual([]);
    expect(body.now?.holding).toBeGreaterThan(0);

    await changePolicy(app, { changes: { challengeDevice: 'not-asked', greatestPouchMassKg: 5 } });
    const later = (await judgedAgain(app, loadId)).body;
    expect(later.then).toEqual(asClosed);
    expect(later.now?.policyNumber).toBe(4);
    expect(rulesOf(later.comparison?.onlyThen ?? [])).toEqual(['challenge-device-placed']);
    expect(later.comparison?.onlyNow).toEqual([]);
  });

  it('is judged as it was, whatever became of the catalogue and the equipment since', async () => {
    const before = await judgedAgain(app, loadId);
    const detail = await detailOf(await app.as('technician'), loadId);
    await app.db('items').where({ id: bay.pouch.id }).update({ mass_kg: 30, name: 'Something else' });
    await app.db('shelves').where({ id: bay.lower.id }).update({ greatest_mass_kg: 1 });
    try {
      expect((await judgedAgain(app, loadId)).body).toEqual(before.body);
      expect(await detailOf(await app.as('technician'), loadId)).toEqual(detail);
    } finally {
      await app.db('items').where({ id: bay.pouch.id }).update({ mass_kg: 0.2, name: 'Mayo scissors curved' });
      await app.db('shelves').where({ id: bay.lower.id }).update({ greatest_mass_kg: 60 });
    }
  });

  it('takes the facing rule of its sterilizer', async () => {
    await changePolicy(app, {
      changes: { facing: 'not-set' },
      facingBySterilizer: { [bay.sterilizerId]: 'alternating' },
    });
    const { body } = await judgedAgain(app, loadId);
    // Two pouches that face the same way.
    expect(rulesOf(body.comparison?.onlyNow ?? [])).toContain('facing');
    await changePolicy(app, { changes: { facing: 'one-way' }, facingBySterilizer: {} });
  });

  it('changes nothing by being looked at', async () => {
    const before = [await loadSnapshot(app), await app.db('audit_events').count()];
    await judgedAgain(app, loadId);
    expect([await loadSnapshot(app), await app.db('audit_events').count()]).toEqual(before);
  });
});

describe('what is kept at the close', () => {
  it('is all the rules looked at: the digest of its contents can be made from it', async () => {
    const row = await app
      .db('loads')
      .where({ id: loadId })
      .first<{ view_at_close: LoadView; contents_digest: string }>('view_at_close', 'contents_digest');
    const digest = createHash('sha256')
      .update(canonicalJson(contentsOf(row.view_at_close)))
      .digest('hex');
    expect(digest).toBe(row.contents_digest);
  });

  it('never changes, whoever writes to the database', async () => {
    const before = await loadSnapshot(app);
    for (const change of [
      { verdict: JSON.stringify({ findings: [] }) },
      { rule_set: 'another' },
      { contents_digest: 'another' },
      { contents: '{}' },
      { view_at_close: null },
      { closed_by: app.person('lead').id },
      { closed_at: new Date(0) },
    ]) {
      await expect(app.db('loads').where({ id: loadId }).update(change)).rejects.toThrow('keeps the policy');
    }
    expect(await loadSnapshot(app)).toBe(before);
  });

  it('is shown with the load: the findings of then', async () => {
    const { closing } = await detailOf(await app.as('technician'), loadId);
    expect(closing?.findings).toEqual((await judgedAgain(app, loadId)).body.then.findings);
  });
});

/** A copy of the closed load, kept as other releases kept theirs. */
async function closedOtherwise(changes: object): Promise<string> {
  const row = await app.db('loads').where({ id: loadId }).first<Record<string, unknown>>();
  const id = anId();
  const { greatest } = await app.db('loads').max({ greatest: 'count_of_day' }).first<{ greatest: number }>();
  await app.db('loads').insert({
    ...row,
    verdict: JSON.stringify(row.verdict),
    contents: JSON.stringify(row.contents),
    view_at_close: JSON.stringify(row.view_at_close),
    run_id: null,
    ...changes,
    id,
    number: `1-26062-${greatest + 1}`,
    count_of_day: greatest + 1,
  });
  return id;
}

describe('a load that an older release closed', () => {
  it('says that it cannot be judged again, and still shows what it was closed with', async () => {
    const older = await closedOtherwise({ view_at_close: null });
    const { status, body } = await judgedAgain(app, older);
    expect([status, body.now, body.comparison]).toEqual([200, null, null]);
    expect(body.whyNot).toContain('cannot be judged again');
    expect(rulesOf(body.then.findings)).toContain('challenge-device-placed');
    expect((await detailOf(await app.as('technician'), older)).closing?.findings).toEqual(body.then.findings);
  });

  it('says so too where less was kept than the rules look at now', async () => {
    const older = await closedOtherwise({ view_at_close: JSON.stringify({ loadId: anId() }) });
    const { body } = await judgedAgain(app, older);
    expect([body.now, body.comparison]).toEqual([null, null]);
    expect(body.whyNot).toContain('was not kept yet');
  });

  it('is read with patience where its verdict is of another form', async () => {
    for (const verdict of [{}, { findings: 'none' }, { findings: [{ title: 'Half a finding' }], acceptances: 4 }]) {
      const older = await closedOtherwise({ verdict: JSON.stringify(verdict) });
      const { status, body } = await judgedAgain(app, older);
      expect([status, body.then.findings, body.then.acceptances]).toEqual([200, [], []]);
    }
  });
});

describe('a load that is not closed', () => {
  it('cannot be judged again', async () => {
    const open = await openLoad(await app.as('technician'), bay);
    for (const state of ['building', 'abandoned']) {
      const { status, body } = await judgedAgain(app, open);
      expect([state, status, body.code]).toEqual([state, 422, 'load.not-closed']);
      await giveUp(app, open);
    }
  });

  it('or is another facility’s, or is not there, is not found', async () => {
    const stranger = await app.as('technician', 'B');
    for (const id of [loadId, anId()]) await stranger.get(`/api/loads/${id}/judged-again`).expect(404);
    await stranger.get('/api/loads/something/judged-again').expect(400);
  });
});
