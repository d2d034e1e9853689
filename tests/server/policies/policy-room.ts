import type { PolicyOverview, PolicyProposal } from '../../../src/contract/policies';
import type { Role } from '../../../src/domain/access/permissions';
import { storedSettings } from '../../../src/domain/policy/settings';
import { defaultPolicy } from '../../../src/domain/load/policy';
import { answer, type Answer } from '../../support/answer';
import { anId, type FacilityLetter, type TestApp } from '../../support/test-app';

type Problem = { readonly code: string; readonly detail: string; readonly fields?: { pointer: string }[] };

/** The day the tests begin on, as the facilities of the tests call it. */
export const today = '2026-03-03';

/** A change that may be proposed. */
export function aChange(changes: Readonly<Record<string, unknown>> = {}) {
  return {
    requestId: anId(),
    baseNumber: 1,
    changes: { packageClearanceMm: 40 },
    reason: 'The new trays need more room.',
    effectiveOn: today,
    ...changes,
  };
}

/** The version a facility begins with: put straight into the table, since nobody proposes it. */
export async function beginPolicy(app: TestApp, facility: FacilityLetter = 'A', settings?: unknown): Promise<string> {
  const id = anId();
  await app.db('policies').insert({
    id,
    facility_id: app.facilities[facility],
    number: 1,
    settings: JSON.stringify(settings ?? storedSettings({ policy: defaultPolicy, facingBySterilizer: {} })),
    reason: 'As delivered',
    effective_on: '2026-01-01',
    effective_at: '2026-01-01T06:00:00.000Z',
    created_at: '2026-01-01T06:00:00.000Z',
  });
  return id;
}

export async function addSterilizer(app: TestApp, facility: FacilityLetter, number: string): Promise<string> {
  const id = anId();
  await app.db('sterilizers').insert({
    id,
    facility_id: app.facilities[facility],
    code: `ST-${number}`,
    number,
    name: `Sterilizer ${number}`,
    size_class: 'large',
    chamber_width_mm: 620,
    chamber_depth_mm: 1250,
    chamber_height_mm: 700,
    drain_x_mm: 280,
    drain_y_mm: 100,
    greatest_load_mass_kg: 100,
    service_state: 'in-service',
  });
  return id;
}

export async function propose(
  app: TestApp,
  body: object,
  role: Role = 'supervisor',
  facility: FacilityLetter = 'A',
): Promise<Answer<{ proposal: PolicyProposal } & Problem>> {
  return answer((await app.as(role, facility)).post('/api/policy-proposals').send(body));
}

export async function settle(
  app: TestApp,
  act: 'confirm' | 'withdraw' | 'refuse',
  proposalId: string,
  {
    role,
    facility = 'A',
    body = {},
  }: { readonly role: Role; readonly facility?: FacilityLetter; readonly body?: object },
): Promise<Answer<{ number: number; effectiveOn: string } & Problem>> {
  const asked = act === 'confirm' ? {} : { reason: 'Not now.' };
  const agent = await app.as(role, facility);
  return answer(
    agent.post(`/api/policy-proposals/${proposalId}/${act}`).send({ requestId: anId(), ...asked, ...body }),
  );
}

/** One person proposes, another confirms. */
export async function changePolicy(
  app: TestApp,
  changes: Readonly<Record<string, unknown>>,
  facility: FacilityLetter = 'A',
): Promise<number> {
  const { versions } = await overviewOf(app, 'supervisor', facility);
  const proposed = await propose(
    app,
    aChange({ baseNumber: versions[0]?.number ?? 0, ...changes }),
    'supervisor',
    facility,
  );
  if (proposed.status !== 201) throw new Error(proposed.text);
  const confirmed = await settle(app, 'confirm', proposed.body.proposal.id, { role: 'administrator', facility });
  if (confirmed.status !== 200) throw new Error(confirmed.text);
  return confirmed.body.number;
}

export async function overviewOf(
  app: TestApp,
  role: Role = 'technician',
  facility: FacilityLetter = 'A',
): Promise<PolicyOverview> {
  const reply = await answer<PolicyOverview>((await app.as(role, facility)).get('/api/policies'));
  if (reply.status !== 200) throw new Error(reply.text);
  return reply.body;
}

/** Everything of the policy that a refused act must leave as it was. */
export async function policyRows(app: TestApp): Promise<string> {
  const rows = await Promise.all([
    app.db('policies').orderBy('id').select(),
    app.db('policy_proposals').orderBy('id').select(),
    app.db('audit_events').where('kind', 'like', 'policy.%').orderBy('id').select(),
  ]);
  return JSON.stringify(rows);
}

/** Whatever is open is settled, so that the next test can begin. */
export async function clearProposals(app: TestApp): Promise<void> {
  for (const { id, proposed_by: personId } of await app
    .db('policy_proposals')
    .where({ state: 'open' })
    .select<{ id: string; proposed_by: string }[]>('id', 'proposed_by')) {
    await app.db('policy_proposals').where({ id }).update({
      state: 'withdrawn',
      settled_by: personId,
      settled_at: app.clock.now(),
      settled_reason: 'End of the test',
    });
  }
}
