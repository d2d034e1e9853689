import { afterEach, beforeAll, describe, expect, it } from 'vitest';
import { defaultPolicy, policyParameters } from '../../../src/domain/load/policy';
import { anId, openTestApp } from '../../support/test-app';
import {
  aChange,
  addSterilizer,
  beginPolicy,
  clearProposals,
  overviewOf,
  policyRows,
  propose,
  today,
} from './policy-room';

const app = openTestApp();
let sterilizerId: string;
let foreignSterilizerId: string;

beforeAll(async () => {
  await beginPolicy(app);
  sterilizerId = await addSterilizer(app, 'A', '1');
  foreignSterilizerId = await addSterilizer(app, 'B', '1');
});

afterEach(() => clearProposals(app));

describe('a change', () => {
  it('is put to another person with what it changes, why and from when, and changes nothing yet', async () => {
    const proposed = await propose(
      app,
      aChange({
        changes: { packageClearanceMm: 40, challengeDeviceMissing: 'accept', facing: 'alternating' },
        facingBySterilizer: { [sterilizerId]: 'one-way' },
        effectiveOn: '2026-03-20',
      }),
    );
    expect(proposed.status).toBe(201);
    const expected = [
      { of: 'parameter', id: 'facing', before: 'one-way', after: 'alternating' },
      { of: 'parameter', id: 'challengeDeviceMissing', before: 'stop', after: 'accept' },
      { of: 'parameter', id: 'packageClearanceMm', before: 25, after: 40 },
      { of: 'facing-at-sterilizer', sterilizerId, before: null, after: 'one-way' },
    ];
    expect(proposed.body.proposal).toMatchObject({
      state: 'open',
      changes: expected,
      reason: 'The new trays need more room.',
      effectiveOn: '2026-03-20',
      proposedBy: { id: app.person('supervisor').id, name: 'Ada supervisor' },
      settledBy: null,
    });
    const overview = await overviewOf(app);
    expect(overview.proposal).toEqual(proposed.body.proposal);
    expect(overview.versions).toHaveLength(1);
    expect(overview.versions[0]?.settings.policy).toEqual(defaultPolicy);
    const event = await app.db('audit_events').where({ kind: 'policy.change-proposed' }).first<object>();
    expect(event).toMatchObject({
      actor_id: app.person('supervisor').id,
      subject_kind: 'policy-proposal',
      subject_id: proposed.body.proposal.id,
      payload: { changes: expected, effectiveOn: '2026-03-20', reason: 'The new trays need more room.' },
    });
  });

  it('is written once, however often it is sent', async () => {
    const body = aChange();
    const replies = await Promise.all([propose(app, body), propose(app, body), propose(app, body)]);
    expect(replies.map(({ status }) => status)).toEqual([201, 201, 201]);
    expect(new Set(replies.map((reply) => reply.body.proposal.id)).size).toBe(1);
    expect(await app.db('policy_proposals').where({ state: 'open' }).select('id')).toHaveLength(1);
  });

  it('waits alone: of two at once one is taken', async () => {
    for (let round = 0; round < 8; round += 1) {
      const replies = await Promise.all([
        propose(app, aChange(), 'supervisor'),
        propose(app, aChange({ changes: { headroomMm: 5 } }), 'administrator'),
      ]);
      expect(replies.map(({ status }) => status).sort()).toEqual([201, 409]);
      expect(replies.find(({ status }) => status === 409)?.body.code).toBe('policy.proposal-open');
      await clearProposals(app);
    }
  });

  it('comes by an administrator just as well', async () => {
    expect((await propose(app, aChange(), 'administrator')).status).toBe(201);
  });
});

describe('every parameter', () => {
  it.each(policyParameters.map((parameter) => [parameter.id, parameter] as const))(
    '%s can be changed to the ends of its range or any of its choices, and to nothing else',
    async (id, parameter) => {
      const good =
        parameter.form === 'quantity'
          ? [parameter.range.least, parameter.range.greatest]
          : parameter.choices.map((choice) => choice.value);
      for (const value of good.filter((one) => one !== defaultPolicy[id])) {
        const reply = await propose(app, aChange({ changes: { [id]: value } }));
        expect([id, value, reply.status, reply.body.proposal.changes]).toEqual([
          id,
          value,
          201,
          [{ of: 'parameter', id, before: defaultPolicy[id], after: value }],
        ]);
        await clearProposals(app);
      }
      const before = await policyRows(app);
      const bad =
        parameter.form === 'quantity'
          ? [parameter.range.least - 0.01, parameter.range.greatest + 0.01, 1e308, '12', null, true, [], {}]
          : ['either', '', 3, null];
      for (const value of bad) {
        const reply = await propose(app, aChange({ changes: { [id]: value } }));
        expect([id, value, reply.status, reply.body.code]).toEqual([id, value, 400, 'request.not-understood']);
        expect(reply.body.fields?.map(({ pointer }) => pointer)).toEqual([`/body/changes/${id}`]);
      }
      expect(await policyRows(app)).toBe(before);
    },
  );
});

describe('a change is refused, with what is wrong with it,', () => {
  const refusals: readonly (readonly [
    string,
    () => Readonly<Record<string, unknown>>,
    number,
    string,
    string | undefined,
  ])[] = [
    [
      'a setting nobody knows',
      () => ({ changes: { fumesPerFortnight: 3 } }),
      400,
      'request.not-understood',
      '/body/changes',
    ],
    ['a word too much', () => ({ urgent: true }), 400, 'request.not-understood', '/body'],
    ['no reason', () => ({ reason: '   ' }), 400, 'request.not-understood', '/body/reason'],
    ['a reason too long', () => ({ reason: 'x'.repeat(501) }), 400, 'request.not-understood', '/body/reason'],
    ['no day', () => ({ effectiveOn: '2026-02-30' }), 400, 'request.not-understood', '/body/effectiveOn'],
    ['yesterday', () => ({ effectiveOn: '2026-03-02' }), 422, 'policy.day-past', '/body/effectiveOn'],
    ['a day after next year', () => ({ effectiveOn: '2062-03-03' }), 422, 'policy.day-too-far', '/body/effectiveOn'],
    [
      'nothing that differs',
      () => ({ changes: { packageClearanceMm: 25 } }),
      422,
      'policy.nothing-changed',
      '/body/changes',
    ],
    ['nothing at all', () => ({ changes: {} }), 422, 'policy.nothing-changed', '/body/changes'],
    [
      'another facility’s sterilizer',
      () => ({ facingBySterilizer: { [foreignSterilizerId]: 'alternating' } }),
      404,
      'sterilizer.none',
      undefined,
    ],
    [
      'a facing rule there is not',
      () => ({ facingBySterilizer: { [sterilizerId]: 'sideways' } }),
      400,
      'request.not-understood',
      undefined,
    ],
    [
      'a sterilizer that is no id',
      () => ({ facingBySterilizer: { 'ST-1': 'alternating' } }),
      400,
      'request.not-understood',
      undefined,
    ],
    ['another version than the newest', () => ({ baseNumber: 7 }), 409, 'policy.changed-meanwhile', undefined],
  ];

  it.each(refusals)('for %s, and nothing changes', async (_what, change, status, code, pointer) => {
    const before = await policyRows(app);
    const reply = await propose(app, aChange(change()));
    expect([reply.status, reply.body.code]).toEqual([status, code]);
    expect(reply.headers['content-type']).toContain('application/problem+json');
    expect(reply.body.detail.length).toBeGreaterThan(10);
    if (pointer !== undefined) expect(reply.body.fields?.[0]?.pointer).toBe(pointer);
    expect(await policyRows(app)).toBe(before);
  });

  it('names the sterilizer that is not here', async () => {
    const reply = await propose(app, aChange({ facingBySterilizer: { [foreignSterilizerId]: 'alternating' } }));
    expect(reply.body.fields?.[0]?.pointer).toBe(`/body/facingBySterilizer/${foreignSterilizerId}`);
  });

  it('where nobody else could confirm it: one person alone cannot change the policy', async () => {
    const alone = app.person('supervisor');
    const others = app
      .db('memberships')
      .where({ facility_id: app.facilities.A })
      .whereIn('role', ['supervisor', 'infection-prevention', 'administrator'])
      .whereNot({ person_id: alone.id });
    const ids = await others.clone().pluck<string[]>('person_id');
    await app.db('people').whereIn('id', ids).update({ is_disabled: true });
    try {
      const before = await policyRows(app);
      const reply = await propose(app, aChange());
      expect([reply.status, reply.body.code]).toEqual([422, 'policy.nobody-to-confirm']);
      expect(await policyRows(app)).toBe(before);

      await app.db('people').whereIn('id', ids).update({ is_disabled: false });
      await app
        .db('memberships')
        .whereIn('person_id', ids)
        .update({ expires_at: new Date(app.clock.now().getTime() - 1000) });
      expect((await propose(app, aChange())).body.code).toBe('policy.nobody-to-confirm');
    } finally {
      await app.db('people').whereIn('id', ids).update({ is_disabled: false });
      await app.db('memberships').whereIn('person_id', ids).update({ expires_at: null });
    }
    expect((await propose(app, aChange())).status).toBe(201);
  });
});

describe('the day', () => {
  it('is the facility’s own: at 05:30 UTC it is still the evening before in Chicago', async () => {
    app.clock.set('2026-03-05T05:30:00.000Z');
    expect((await overviewOf(app)).today).toBe('2026-03-04');
    expect((await propose(app, aChange({ effectiveOn: '2026-03-03' }))).body.code).toBe('policy.day-past');
    expect((await propose(app, aChange({ effectiveOn: '2026-03-04' }))).status).toBe(201);
    app.clock.set('2026-03-03T13:30:00.000Z');
    expect((await overviewOf(app)).today).toBe(today);
  });
});

describe('a facility that has no version yet', () => {
  it('begins from the defaults', async () => {
    expect((await overviewOf(app, 'technician', 'B')).versions).toEqual([]);
    const reply = await propose(app, aChange({ requestId: anId(), baseNumber: 0 }), 'supervisor', 'B');
    expect(reply.status).toBe(201);
    expect(reply.body.proposal.changes).toEqual([
      { of: 'parameter', id: 'packageClearanceMm', before: defaultPolicy.packageClearanceMm, after: 40 },
    ]);
  });
});
