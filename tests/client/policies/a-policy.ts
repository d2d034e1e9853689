import type { JudgedAgain } from '#contract/judged-again';
import type { PolicyOverview, PolicyProposal, PolicyVersion } from '#contract/policies';
import { defaultPolicy } from '#domain/load/policy';
import type { KeptFinding } from '#domain/policy/compare-findings';
import { mm } from '#domain/units/quantity';

/* An invented policy of an invented place, for the screens that show it. */

export const sterilizerId = '0190f000-0000-7000-8000-000000000601';
const otherSterilizerId = '0190f000-0000-7000-8000-000000000602';

const first: PolicyVersion = {
  number: 1,
  effectiveOn: '2026-02-01',
  standing: 'past',
  confirmedAt: '2026-02-01T09:00:00.000Z',
  author: null,
  secondPerson: null,
  reason: 'The settings Paperside begins with.',
  settings: { policy: defaultPolicy, facingBySterilizer: {} },
  defaulted: [],
  changes: [],
};

const second: PolicyVersion = {
  number: 2,
  effectiveOn: '2026-02-20',
  standing: 'in-force',
  confirmedAt: '2026-02-18T09:00:00.000Z',
  author: 'Ingrid Vale',
  secondPerson: 'Tomas Reyes-Lund',
  reason: 'The new trays stand closer to the wall.',
  settings: {
    policy: { ...defaultPolicy, wallClearanceMm: mm(40) },
    facingBySterilizer: { [sterilizerId]: 'alternating' },
  },
  defaulted: ['headroomMm'],
  changes: [
    { of: 'parameter', id: 'wallClearanceMm', before: 25, after: 40 },
    { of: 'facing-at-sterilizer', sterilizerId, before: null, after: 'alternating' },
  ],
};

export const proposerId = '0190f000-0000-7000-8000-0000000000a1';

export const proposal: PolicyProposal = {
  id: '0190f000-0000-7000-8000-0000000000b1',
  state: 'open',
  changes: [
    { of: 'parameter', id: 'challengeDeviceMissing', before: 'stop', after: 'accept' },
    { of: 'parameter', id: 'packageClearanceMm', before: 25, after: 30 },
  ],
  reason: 'The makers ask for 30 mm.',
  effectiveOn: '2026-03-10',
  proposedBy: { id: proposerId, name: 'Ingrid Vale' },
  proposedAt: '2026-03-02T09:00:00.000Z',
  settledBy: null,
  settledAt: null,
  settledReason: null,
};

export function anOverview(changes: Partial<PolicyOverview> = {}): PolicyOverview {
  return {
    today: '2026-03-03',
    versions: [second, first],
    proposal: null,
    notMade: [
      {
        ...proposal,
        id: '0190f000-0000-7000-8000-0000000000b0',
        state: 'refused',
        reason: 'The evening shift is heavier.',
        changes: [{ of: 'parameter', id: 'massMarginPercent', before: 0, after: 10 }],
        settledBy: 'Tomas Reyes-Lund',
        settledAt: '2026-02-25T09:00:00.000Z',
        settledReason: 'Let us look at the dry times first.',
      },
    ],
    sterilizers: [
      { id: sterilizerId, code: 'ST-1', name: 'Sterilizer 1' },
      { id: otherSterilizerId, code: 'ST-2', name: 'Sterilizer 2' },
    ],
    ...changes,
  };
}

export const loadId = '0190f000-0000-7000-8000-000000000701';

export function aFinding(key: string, changes: Partial<KeptFinding> = {}): KeptFinding {
  return {
    key,
    ruleId: 'package-clearance',
    severity: 'accept',
    title: `Finding ${key}`,
    reason: 'Steam has to get between.',
    remedy: 'Move one of them.',
    source: { text: 'Common practice, no source.', provenance: 'common-practice' },
    places: [{ on: 'load' }],
    figure: { measured: 12, limit: 25, unit: 'mm', want: 'at-least', limitFrom: 'default' },
    ...changes,
  };
}

export function aJudgement(changes: Partial<JudgedAgain> = {}): JudgedAgain {
  const then = aFinding('A');
  const now = aFinding('A', { severity: 'stop' });
  return {
    load: { id: loadId, number: '1-26062-01', closedAt: '2026-02-10T10:00:00.000Z', closedBy: 'Dele Oyelaran' },
    then: {
      ruleSet: '2026-01-01.1',
      policyNumber: 1,
      policyEffectiveOn: '2026-02-01',
      findings: [then, aFinding('B'), aFinding('D')],
      acceptances: [
        {
          findingKey: 'B',
          ruleId: 'package-clearance',
          reason: 'It was dry before.',
          acceptedBy: 'Lucasta Mburu',
          acceptedAt: '2026-02-10T09:50:00.000Z',
        },
      ],
    },
    now: {
      ruleSet: '2026-03-01.1',
      policyNumber: 2,
      policyEffectiveOn: '2026-02-20',
      findings: [now, aFinding('C'), aFinding('D')],
      holding: 2,
    },
    comparison: {
      changed: [{ then, now }],
      onlyNow: [aFinding('C')],
      onlyThen: [aFinding('B')],
      both: [{ then: aFinding('D'), now: aFinding('D') }],
    },
    whyNot: null,
    ...changes,
  };
}
