import { beforeAll, describe, expect, it } from 'vitest';
import { defaultPolicy, policyParameters } from '../../../src/domain/load/policy';
import { anId, openTestApp } from '../../support/test-app';
import { aChange, beginPolicy, changePolicy, overviewOf, policyRows, propose, settle } from './policy-room';

const app = openTestApp();

beforeAll(async () => {
  await beginPolicy(app);
  await changePolicy(app, {});
});

describe('a version', () => {
  it('never changes and never goes, whoever writes to the database', async () => {
    const before = await policyRows(app);
    await expect(app.db('policies').where({ number: 2 }).update({ reason: 'Another' })).rejects.toThrow(
      'never changes',
    );
    await expect(app.db('policies').where({ number: 2 }).delete()).rejects.toThrow('never changes');
    await expect(app.db.raw('truncate policies cascade')).rejects.toThrow('never changes');
    expect(await policyRows(app)).toBe(before);
  });

  it('has two different people, or none where a facility begins', async () => {
    const row = {
      facility_id: app.facilities.A,
      settings: '{}',
      reason: 'Straight into the table',
      effective_on: '2026-03-03',
      effective_at: app.clock.now(),
      created_at: app.clock.now(),
    };
    const [one, other] = [app.person('supervisor').id, app.person('administrator').id];
    const insert = (number: number, people: object) =>
      app.db('policies').insert({ ...row, id: anId(), number, ...people });
    await expect(insert(90, { author_id: one, second_person_id: one })).rejects.toThrow('policies_two_people_check');
    await expect(insert(91, { author_id: one })).rejects.toThrow('policies_two_people_check');
    await expect(insert(2, { author_id: one, second_person_id: other })).rejects.toThrow(
      'policies_facility_id_number_key',
    );
  });
});

describe('a proposal', () => {
  it('says for good what it said, and is settled once', async () => {
    const proposed = await propose(app, aChange({ baseNumber: 2, changes: { headroomMm: 4 } }));
    const { id } = proposed.body.proposal;
    const row = () => app.db('policy_proposals').where({ id });
    await expect(row().update({ reason: 'Another' })).rejects.toThrow('settled once');
    await expect(row().delete()).rejects.toThrow('settled once');
    const confirming = { state: 'confirmed', settled_at: app.clock.now() };
    await expect(row().update({ ...confirming, settled_by: app.person('supervisor').id })).rejects.toThrow(
      'policy_proposals_two_people_check',
    );
    await settle(app, 'refuse', id, { role: 'administrator' });
    await expect(row().update({ state: 'open', settled_by: null, settled_at: null })).rejects.toThrow('settled once');
    await expect(app.db.raw('truncate policy_proposals cascade')).rejects.toThrow();
  });

  it('is the only open one of its facility, whatever races', async () => {
    const row = {
      facility_id: app.facilities.A,
      base_number: 2,
      changes: '[{}]',
      reason: 'Straight into the table',
      effective_on: '2026-03-03',
      proposed_by: app.person('supervisor').id,
      proposed_at: app.clock.now(),
    };
    await app.db('policy_proposals').insert({ ...row, id: anId() });
    await expect(app.db('policy_proposals').insert({ ...row, id: anId() })).rejects.toThrow(
      'policy_proposals_facility_id_open_key',
    );
  });
});

describe('a version of an older release', () => {
  it('takes the default of what the program learned of later, says so, and drops what nobody knows any more', async () => {
    const { headroomMm: _one, facing: _other, ...older } = defaultPolicy;
    await beginPolicy(app, 'B', { ...older, packageClearanceMm: 31, fumesPerFortnight: 12 });
    const [version] = (await overviewOf(app, 'technician', 'B')).versions;
    expect(version?.settings).toEqual({
      policy: { ...defaultPolicy, packageClearanceMm: 31 },
      facingBySterilizer: {},
    });
    expect(version?.defaulted).toEqual(
      policyParameters.map(({ id }) => id).filter((id) => id === 'facing' || id === 'headroomMm'),
    );

    expect(await changePolicy(app, { changes: { wallClearanceMm: 30 } }, 'B')).toBe(2);
    const [next, first] = (await overviewOf(app, 'technician', 'B')).versions;
    expect(next?.defaulted).toEqual([]);
    expect(next?.settings.policy).toEqual({ ...defaultPolicy, packageClearanceMm: 31, wallClearanceMm: 30 });
    expect(first).toEqual({ ...version, standing: 'past' });
  });
});
