import { dayOfEffect, decideSettling, proposalStates, type SettlingAct } from '#domain/policy/settle-proposal';
import { describe, expect, it } from 'vitest';

const acts: readonly SettlingAct[] = ['confirm', 'withdraw', 'refuse'];

function outcome(act: SettlingAct, personId: string, state: (typeof proposalStates)[number] = 'open'): string {
  const decided = decideSettling({ act, state, proposedBy: 'odd', personId });
  return decided.ok ? decided.value : decided.refusal.code;
}

describe('a proposal', () => {
  it('is confirmed or refused by another person, and withdrawn only by who made it', () => {
    expect(acts.map((act) => outcome(act, 'even'))).toEqual(['confirmed', 'policy.not-the-proposer', 'refused']);
  });

  it('is never confirmed or refused by who made it', () => {
    expect(acts.map((act) => outcome(act, 'odd'))).toEqual(['policy.same-person', 'withdrawn', 'policy.own-proposal']);
  });

  it('is settled once: afterwards nobody does anything with it', () => {
    for (const state of proposalStates.filter((one) => one !== 'open')) {
      for (const act of acts) {
        for (const person of ['odd', 'even']) expect(outcome(act, person, state)).toBe('policy.proposal-settled');
      }
    }
  });
});

describe('the day of effect', () => {
  it('is the day proposed', () => {
    expect(dayOfEffect('2026-03-20', '2026-03-05')).toBe('2026-03-20');
    expect(dayOfEffect('2026-03-05', '2026-03-05')).toBe('2026-03-05');
  });

  it('is the day of confirming where the proposed day passed meanwhile: nothing holds from before two agreed', () => {
    expect(dayOfEffect('2026-03-04', '2026-03-05')).toBe('2026-03-05');
  });
});
