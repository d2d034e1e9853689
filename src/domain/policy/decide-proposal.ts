import { accept, refuse, type Result } from '../result';
import { addDays } from '../time/calendar-day';
import { changesBetween, withStated, type SettingChange, type StatedSettings } from './setting-change';
import type { PolicySettings } from './settings';

/** A day further ahead is a slip of the pen more often than a plan. */
const longestAheadDays = 366;

/** The days a change may begin to hold on, both included. */
export function daysToChoose(today: string): { readonly first: string; readonly last: string } {
  return { first: today, last: addDays(today, longestAheadDays) };
}

export type ProposalRefusal =
  | 'policy.proposal-open'
  | 'policy.nobody-to-confirm'
  | 'policy.day-past'
  | 'policy.day-too-far'
  | 'policy.nothing-changed';

type Proposing = {
  /** Of the newest version, whether or not its day has come: a change rests on what was agreed last. */
  readonly newest: PolicySettings;
  readonly stated: StatedSettings;
  readonly effectiveOn: string;
  /** The facility's calendar day. */
  readonly today: string;
  readonly hasOpenProposal: boolean;
  /** Whether anybody but the proposer may confirm here. */
  readonly canOthersConfirm: boolean;
};

/** Whether a change of policy may be put to another person, and what it changes. */
export function decideProposal({
  newest,
  stated,
  effectiveOn,
  today,
  hasOpenProposal,
  canOthersConfirm,
}: Proposing): Result<readonly SettingChange[], ProposalRefusal> {
  if (hasOpenProposal) {
    return refuse('policy.proposal-open', 'A change is proposed already. It has to be settled before the next one.');
  }
  if (!canOthersConfirm) {
    return refuse(
      'policy.nobody-to-confirm',
      'Nobody else here may confirm a change, and one person alone cannot change the policy.',
    );
  }
  const { first, last } = daysToChoose(today);
  if (effectiveOn < first)
    return refuse('policy.day-past', 'A change can be in force from today on, not from a day before.');
  if (effectiveOn > last) return refuse('policy.day-too-far', 'Choose a day within a year from today.');
  const changes = changesBetween(newest, withStated(newest, stated));
  return changes.length === 0
    ? refuse('policy.nothing-changed', 'Nothing differs from the newest version. Change a setting first.')
    : accept(changes);
}
