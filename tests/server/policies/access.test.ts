import { beforeAll, describe, expect, it } from 'vitest';
import { routes } from '../../../server/app';
import { roles, type Role } from '../../../src/domain/access/permissions';
import { anId, openTestApp } from '../../support/test-app';
import { aChange, beginPolicy, overviewOf, policyRows, propose, settle } from './policy-room';

const app = openTestApp();
let proposalId: string;

beforeAll(async () => {
  await beginPolicy(app);
  await beginPolicy(app, 'B');
  const proposed = await propose(app, aChange());
  expect(proposed.status).toBe(201);
  proposalId = proposed.body.proposal.id;
});

const viewers: readonly Role[] = [
  'technician',
  'lead',
  'supervisor',
  'infection-prevention',
  'engineer',
  'surveyor',
  'administrator',
];

/** Who may, written down apart from the matrix that the server asks. */
const acts: readonly {
  readonly method: 'get' | 'post';
  readonly path: () => string;
  readonly body?: () => object;
  readonly may: readonly Role[];
}[] = [
  { method: 'get', path: () => '/api/policies', may: viewers },
  {
    method: 'post',
    path: () => '/api/policy-proposals',
    body: () => aChange(),
    may: ['supervisor', 'administrator'],
  },
  {
    method: 'post',
    path: () => `/api/policy-proposals/${proposalId}/confirm`,
    body: () => ({ requestId: anId() }),
    may: ['supervisor', 'infection-prevention', 'administrator'],
  },
  {
    method: 'post',
    path: () => `/api/policy-proposals/${proposalId}/withdraw`,
    body: () => ({ requestId: anId(), reason: 'Not now.' }),
    may: ['supervisor', 'administrator'],
  },
  {
    method: 'post',
    path: () => `/api/policy-proposals/${proposalId}/refuse`,
    body: () => ({ requestId: anId(), reason: 'Not now.' }),
    may: ['supervisor', 'infection-prevention', 'administrator'],
  },
];

describe('who may do what with the policy', () => {
  it('leaves no route of the policy out of this table', () => {
    const own = routes.filter((route) => route.path.startsWith('/api/polic'));
    expect(acts).toHaveLength(own.length);
  });

  it.each(roles)('refuses a %s exactly what it may not do, and nothing changes', async (role) => {
    const agent = await app.as(role);
    const before = await policyRows(app);
    for (const act of acts.filter((one) => !one.may.includes(role))) {
      const reply = await (act.method === 'get' ? agent.get(act.path()) : agent.post(act.path()).send(act.body?.()));
      expect({ path: act.path(), status: reply.status }).toEqual({ path: act.path(), status: 403 });
      expect(reply.type).toBe('application/problem+json');
      expect(reply.body).toMatchObject({ code: 'access.not-permitted' });
    }
    expect(await policyRows(app)).toBe(before);
  });

  it('answers nobody without a session, and no write without our own header', async () => {
    const before = await policyRows(app);
    for (const act of acts) {
      const anyone = app.anyone();
      const reply = await (act.method === 'get' ? anyone.get(act.path()) : anyone.post(act.path()).send(act.body?.()));
      expect({ path: act.path(), status: reply.status }).toEqual({ path: act.path(), status: 401 });
      if (act.method === 'get') continue;
      const supervisor = await app.as('supervisor');
      const foreign = await supervisor.post(act.path()).unset('X-Requested-With').send(act.body?.());
      expect(foreign.body).toMatchObject({ code: 'request.foreign' });
    }
    expect(await policyRows(app)).toBe(before);
  });

  it.each(viewers)('shows a %s everything, with both names', async (role) => {
    const overview = await overviewOf(app, role);
    expect(overview.versions.map(({ number, standing }) => [number, standing])).toEqual([[1, 'in-force']]);
    expect(overview.proposal).toMatchObject({
      state: 'open',
      proposedBy: { name: 'Ada supervisor' },
      reason: 'The new trays need more room.',
    });
  });
});

describe('people of another facility', () => {
  it('see nothing of this one’s policy', async () => {
    const theirs = await overviewOf(app, 'supervisor', 'B');
    expect(theirs.versions).toHaveLength(1);
    expect(theirs.proposal).toBeNull();
  });

  it.each(['confirm', 'withdraw', 'refuse'] as const)(
    'cannot %s what is proposed here: there is no such thing',
    async (act) => {
      const before = await policyRows(app);
      for (const role of ['supervisor', 'administrator'] as const) {
        const reply = await settle(app, act, proposalId, { role, facility: 'B' });
        expect([reply.status, reply.body.code]).toEqual([404, 'policy.no-proposal']);
      }
      expect(await policyRows(app)).toBe(before);
    },
  );
});
