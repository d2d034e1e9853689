/*
 * How long a sign-in lasts. Both ends come from OWASP ASVS 5.0, 7.3.1 (inactivity) and 7.3.2 (absolute). The figures are
 * those of NIST SP 800-63B-4, 2.3.3 (AAL3: at most 15 minutes and 12 hours, draft read), the strictest level, with less
 * inactivity still: a station on the floor is shared, and the next pair of hands is never far.
 */

/** Seconds without an act after which nobody is signed in any more. */
export const idleTimeoutS = 10 * 60;

/** Seconds after which a person signs in again, whatever they did meanwhile. */
export const absoluteTimeoutS = 12 * 60 * 60;

/** An act is noted at most this often, in seconds, so that a scan seldom costs a write: idle may end this much early. */
export const activityGrainS = 15;

export type SessionTimes = {
  /** Milliseconds since 1970, UTC. */
  readonly startedAtMs: number;
  /** Milliseconds since 1970, UTC: the last act of the person, not of the program. */
  readonly activeAtMs: number;
};

export type SessionVerdict = 'live' | 'idle-too-long' | 'lasted-too-long';

/** Whether a sign-in still holds. A clock set back does not end it. */
export function judgeSession({ startedAtMs, activeAtMs }: SessionTimes, nowMs: number): SessionVerdict {
  if (nowMs - startedAtMs >= absoluteTimeoutS * 1000) return 'lasted-too-long';
  if (nowMs - activeAtMs >= idleTimeoutS * 1000) return 'idle-too-long';
  return 'live';
}

/** Whether an act at this instant is to be noted. */
export function isActivityDue({ activeAtMs }: SessionTimes, nowMs: number): boolean {
  return nowMs - activeAtMs >= activityGrainS * 1000;
}

/** Milliseconds since 1970, UTC, at which a sign-in ends at the latest. */
export function sessionEndMs({ startedAtMs }: SessionTimes): number {
  return startedAtMs + absoluteTimeoutS * 1000;
}
