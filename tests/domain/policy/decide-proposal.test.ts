import { defaultPolicy } from '#domain/load/policy';
import { daysToChoose, decideProposal } from '#domain/policy/decide-proposal';
import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';

const proposing = {
  newest: { policy: defaultPolicy, facingBySterilizer: { s1: 'alternating' } },
  stated: { changes: { packageClearanceMm: mm(40) }, facingBySterilizer: undefined },
  effectiveOn: '2026-03-03',
  today: '2026-03-03',
  hasOpenProposal: false,
  canOthersConfirm: true,
} as const;

type Proposing = Parameters<typeof decideProposal>[0];

function codeOf(change: Partial<Proposing>): string {
  const decided = decideProposal({ ...proposing, ...change });
  return decided.ok ? 'proposed' : decided.refusal.code;
}

describe('a change may be proposed', () => {
  it('that holds from today on, and tells what it changes', () => {
    expect(decideProposal(proposing)).toEqual({
      ok: true,
      value: [{ of: 'parameter', id: 'packageClearanceMm', before: 25, after: 40 }],
    });
  });

  it('that only changes how one sterilizer faces', () => {
    expect(codeOf({ stated: { changes: {}, facingBySterilizer: {} } })).toBe('proposed');
  });

  it('for a day within a year, and for none before or after', () => {
    expect(codeOf({ effectiveOn: '2026-03-02' })).toBe('policy.day-past');
    expect(codeOf({ effectiveOn: '2027-03-04' })).toBe('proposed');
    expect(codeOf({ effectiveOn: '2027-03-05' })).toBe('policy.day-too-far');
    expect(daysToChoose('2026-03-03')).toEqual({ first: '2026-03-03', last: '2027-03-04' });
  });

  it('only when none waits', () => {
    expect(codeOf({ hasOpenProposal: true })).toBe('policy.proposal-open');
  });

  it('only where somebody else could confirm it', () => {
    expect(codeOf({ canOthersConfirm: false })).toBe('policy.nobody-to-confirm');
  });

  it('only when something differs', () => {
    expect(codeOf({ stated: { changes: {}, facingBySterilizer: undefined } })).toBe('policy.nothing-changed');
    expect(codeOf({ stated: { changes: { packageClearanceMm: mm(25) }, facingBySterilizer: undefined } })).toBe(
      'policy.nothing-changed',
    );
    expect(codeOf({ stated: { changes: {}, facingBySterilizer: { s1: 'alternating' } } })).toBe(
      'policy.nothing-changed',
    );
  });
});
