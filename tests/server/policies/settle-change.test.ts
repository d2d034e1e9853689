import { afterEach, beforeAll, describe, expect, it } from 'vitest';
import { defaultPolicy } from '../../../src/domain/load/policy';
import { anId, openTestApp } from '../../support/test-app';
import {
  aChange,
  addSterilizer,
  beginPolicy,
  clearProposals,
  overviewOf,
  policyRows,
  propose,
  settle,
  today,
} from './policy-room';

const app = openTestApp();
let sterilizerId: string;

beforeAll(async () => {
  await beginPolicy(app);
  sterilizerId = await addSterilizer(app, 'A', '1');
});

afterEach(async () => {
  app.clock.set('2026-03-03T13:30:00.000Z');
  await clearProposals(app);
});

async function newestNumber(): Promise<number> {
  return (await overviewOf(app)).versions[0]?.number ?? 0;
}

/** By the supervisor. */
async function aProposal(changes: Readonly<Record<string, unknown>> = {}): Promise<string> {
  const value = 26 + (await newestNumber());
  const reply = await propose(
    app,
    aChange({ baseNumber: await newestNumber(), changes: { packageClearanceMm: value }, ...changes }),
  );
  if (reply.status !== 201) throw new Error(reply.text);
  return reply.body.proposal.id;
}

describe('a change that another person confirms', () => {
  it('is the next version: number, both people, reason, day, full settings and what changed', async () => {
    const before = (await overviewOf(app)).versions[0];
    const id = await aProposal({
      changes: { packageClearanceMm: 44, challengeDeviceMissing: 'advice' },
      facingBySterilizer: { [sterilizerId]: 'alternating' },
      effectiveOn: '2026-03-20',
    });
    app.clock.advance({ hours: 2 });
    const reply = await settle(app, 'confirm', id, { role: 'infection-prevention' });
    expect([reply.status, reply.body]).toEqual([200, { number: (before?.number ?? 0) + 1, effectiveOn: '2026-03-20' }]);

    const { versions, proposal } = await overviewOf(app);
    expect(proposal).toBeNull();
    expect(versions[0]).toEqual({
      number: (before?.number ?? 0) + 1,
      effectiveOn: '2026-03-20',
      standing: 'planned',
      confirmedAt: '2026-03-03T15:30:00.000Z',
      author: 'Ada supervisor',
      secondPerson: 'Ada infection-prevention',
      reason: 'The new trays need more room.',
      settings: {
        policy: { ...before?.settings.policy, packageClearanceMm: 44, challengeDeviceMissing: 'advice' },
        facingBySterilizer: { [sterilizerId]: 'alternating' },
      },
      defaulted: [],
      changes: [
        { of: 'parameter', id: 'challengeDeviceMissing', before: 'stop', after: 'advice' },
        {
          of: 'parameter',
          id: 'packageClearanceMm',
          before: before?.settings.policy.packageClearanceMm,
          after: 44,
        },
        { of: 'facing-at-sterilizer', sterilizerId, before: null, after: 'alternating' },
      ],
    });
    expect(versions[1]).toEqual(before);
    const event = await app.db('audit_events').where({ kind: 'policy.change-confirmed' }).first<object>();
    expect(event).toMatchObject({
      actor_id: app.person('infection-prevention').id,
      payload: { number: (before?.number ?? 0) + 1, effectiveOn: '2026-03-20' },
    });
  });

  it('holds from the day it is confirmed where its own day has passed meanwhile', async () => {
    const id = await aProposal({ effectiveOn: today });
    app.clock.set('2026-03-06T15:00:00.000Z');
    const reply = await settle(app, 'confirm', id, { role: 'administrator' });
    expect(reply.body.effectiveOn).toBe('2026-03-06');
  });

  it('is confirmed once, however often that is sent', async () => {
    const id = await aProposal();
    const number = (await newestNumber()) + 1;
    const body = { requestId: anId() };
    const replies = await Promise.all([
      settle(app, 'confirm', id, { role: 'administrator', body }),
      settle(app, 'confirm', id, { role: 'administrator', body }),
    ]);
    expect(replies.map((reply) => [reply.status, reply.body.number])).toEqual([
      [200, number],
      [200, number],
    ]);
    expect(await newestNumber()).toBe(number);
  });
});

describe('the proposer', () => {
  it('cannot confirm or refuse their own', async () => {
    const id = await aProposal();
    const before = await policyRows(app);
    const confirmed = await settle(app, 'confirm', id, { role: 'supervisor' });
    expect([confirmed.status, confirmed.body.code]).toEqual([422, 'policy.same-person']);
    expect(confirmed.body.detail).toContain('Another person');
    const refused = await settle(app, 'refuse', id, { role: 'supervisor' });
    expect([refused.status, refused.body.code]).toEqual([422, 'policy.own-proposal']);
    expect(await policyRows(app)).toBe(before);
  });

  it('can withdraw it with a reason, and nobody else can', async () => {
    const id = await aProposal();
    const before = await policyRows(app);
    const other = await settle(app, 'withdraw', id, { role: 'administrator' });
    expect([other.status, other.body.code]).toEqual([422, 'policy.not-the-proposer']);
    const silent = await settle(app, 'withdraw', id, { role: 'supervisor', body: { reason: ' ' } });
    expect([silent.status, silent.body.fields?.[0]?.pointer]).toEqual([400, '/body/reason']);
    expect(await policyRows(app)).toBe(before);

    const versions = (await overviewOf(app)).versions;
    expect((await settle(app, 'withdraw', id, { role: 'supervisor' })).status).toBe(204);
    const after = await overviewOf(app);
    expect(after.versions).toEqual(versions);
    expect(after.proposal).toBeNull();
    expect(after.notMade[0]).toMatchObject({
      id,
      state: 'withdrawn',
      settledBy: 'Ada supervisor',
      settledReason: 'Not now.',
    });
  });
});

describe('another person', () => {
  it('can refuse with a reason; the next can then be proposed', async () => {
    const id = await aProposal();
    const silent = await settle(app, 'refuse', id, { role: 'infection-prevention', body: { reason: '' } });
    expect([silent.status, silent.body.fields?.[0]?.pointer]).toEqual([400, '/body/reason']);
    expect((await settle(app, 'refuse', id, { role: 'infection-prevention' })).status).toBe(204);
    expect((await overviewOf(app)).notMade[0]).toMatchObject({
      id,
      state: 'refused',
      proposedBy: { name: 'Ada supervisor' },
      settledBy: 'Ada infection-prevention',
      settledReason: 'Not now.',
    });
    const event = await app.db('audit_events').where({ kind: 'policy.change-refused' }).first<object>();
    expect(event).toMatchObject({ subject_id: id, payload: { reason: 'Not now.' } });
    await aProposal();
  });

  it('finds nothing to settle where there is no such proposal, and no more where it is settled', async () => {
    expect((await settle(app, 'confirm', anId(), { role: 'administrator' })).status).toBe(404);
    expect((await settle(app, 'confirm', 'something', { role: 'administrator' })).status).toBe(400);
    const id = await aProposal();
    await settle(app, 'withdraw', id, { role: 'supervisor' });
    const before = await policyRows(app);
    for (const act of ['confirm', 'refuse', 'withdraw'] as const) {
      const reply = await settle(app, act, id, { role: 'administrator' });
      expect([reply.status, reply.body.code]).toEqual([409, 'policy.proposal-settled']);
    }
    expect(await policyRows(app)).toBe(before);
  });
});

describe('at one moment', () => {
  it('two confirm: it becomes one version, and the other is told', async () => {
    for (let round = 0; round < 8; round += 1) {
      const id = await aProposal();
      const number = (await newestNumber()) + 1;
      const replies = await Promise.all([
        settle(app, 'confirm', id, { role: 'administrator' }),
        settle(app, 'confirm', id, { role: 'infection-prevention' }),
      ]);
      expect(replies.map(({ status }) => status).sort()).toEqual([200, 409]);
      expect(replies.find(({ status }) => status === 409)?.body.code).toBe('policy.proposal-settled');
      expect(await newestNumber()).toBe(number);
    }
  });

  it('one confirms and the other withdraws: it is either a version or withdrawn, never both', async () => {
    for (let round = 0; round < 8; round += 1) {
      const before = await newestNumber();
      const id = await aProposal();
      const [confirmed, withdrawn] = await Promise.all([
        settle(app, 'confirm', id, { role: 'administrator' }),
        settle(app, 'withdraw', id, { role: 'supervisor' }),
      ]);
      expect([
        [200, 409],
        [409, 204],
      ]).toContainEqual([confirmed.status, withdrawn.status]);
      const { versions, notMade, proposal } = await overviewOf(app);
      expect(proposal).toBeNull();
      expect((versions[0]?.number ?? 0) - before).toBe(confirmed.status === 200 ? 1 : 0);
      expect(notMade.some((one) => one.id === id)).toBe(withdrawn.status === 204);
    }
  });

  it('one confirms and another proposes the next: neither is lost nor mixed', async () => {
    const id = await aProposal();
    const base = await newestNumber();
    const [confirmed, proposed] = await Promise.all([
      settle(app, 'confirm', id, { role: 'administrator' }),
      propose(app, aChange({ baseNumber: base, changes: { headroomMm: 7 } }), 'administrator'),
    ]);
    expect(confirmed.status).toBe(200);
    // Whichever came first: the other was open still, or the version looked at is not the newest any more.
    expect([
      proposed.status,
      proposed.body.code === 'policy.proposal-open' || proposed.body.code === 'policy.changed-meanwhile',
    ]).toEqual([409, true]);
  });
});

describe('a later version', () => {
  it('rests on the newest one, also before that one’s day, and then holds in its place', async () => {
    const planned = await aProposal({ changes: { headroomMm: 11 }, effectiveOn: '2026-05-01' });
    await settle(app, 'confirm', planned, { role: 'administrator' });
    const earlier = await aProposal({ changes: { wallClearanceMm: 33 }, effectiveOn: '2026-04-01' });
    await settle(app, 'confirm', earlier, { role: 'administrator' });
    app.clock.set('2026-05-02T15:00:00.000Z');
    const [newest, before] = (await overviewOf(app)).versions;
    expect(newest).toMatchObject({ standing: 'in-force', effectiveOn: '2026-04-01' });
    expect(newest?.settings.policy).toMatchObject({ headroomMm: 11, wallClearanceMm: 33 });
    expect(newest?.changes).toEqual([
      { of: 'parameter', id: 'wallClearanceMm', before: defaultPolicy.wallClearanceMm, after: 33 },
    ]);
    expect(before?.standing).toBe('overtaken');
  });
});
