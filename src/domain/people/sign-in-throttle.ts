/*
 * How many tries a guesser gets. NIST SP 800-63B-4, 3.2.2: at most 100 failed tries in a row on one account, with growing
 * delays allowed before that; OWASP ASVS 5.0, 6.3.1. The steps in between are ours: a gloved hand mistypes, so five
 * tries are free, and then the wait doubles from half a minute up to an hour.
 */

/** Failures in a row that cost nothing. */
export const freeFailures = 5;
/** Failures in a row after which only an administrator lets a person in again. */
export const greatestFailures = 100;
const firstWaitS = 30;
const greatestWaitS = 60 * 60;

/** From one address: this many failures, of whatever names, within the window. A whole department may share one. */
export const sourceFailures = 60;
/** Seconds. */
export const sourceWindowS = 15 * 60;

export type SignInTries = {
  /** Failures in a row of this staff number or badge, since it last succeeded or was reset. */
  readonly failuresInARow: number;
  readonly lastFailureMs: number | null;
  /** Instants, in milliseconds since 1970, of the failures from this address within the window, oldest first. */
  readonly sourceFailuresMs: readonly number[];
};

export type ThrottleVerdict =
  { readonly may: 'try' } | { readonly may: 'wait'; readonly seconds: number } | { readonly may: 'not-until-reset' };

/** Seconds to wait after that many failures in a row. */
export function waitAfter(failuresInARow: number): number {
  if (failuresInARow < freeFailures) return 0;
  return Math.min(greatestWaitS, firstWaitS * 2 ** (failuresInARow - freeFailures));
}

function secondsUntil(thenMs: number, nowMs: number): number {
  return Math.max(0, Math.ceil((thenMs - nowMs) / 1000));
}

/** Whether a try may be made now. Says the same of numbers that exist and of numbers that do not. */
export function judgeTry(tries: SignInTries, nowMs: number): ThrottleVerdict {
  if (tries.failuresInARow >= greatestFailures) return { may: 'not-until-reset' };
  const subjectWait =
    tries.lastFailureMs === null
      ? 0
      : secondsUntil(tries.lastFailureMs + waitAfter(tries.failuresInARow) * 1000, nowMs);
  const decisive = tries.sourceFailuresMs.at(-sourceFailures);
  const sourceWait = decisive === undefined ? 0 : secondsUntil(decisive + sourceWindowS * 1000, nowMs);
  const seconds = Math.max(subjectWait, sourceWait);
  return seconds > 0 ? { may: 'wait', seconds } : { may: 'try' };
}

/** "30 seconds", "2 minutes", "an hour": never less than there is to wait. */
export function waitInWords(seconds: number): string {
  if (seconds <= 1) return 'a second';
  if (seconds < 120) return `${seconds} seconds`;
  const minutes = Math.ceil(seconds / 60);
  return minutes >= 60 ? 'an hour' : `${minutes} minutes`;
}
