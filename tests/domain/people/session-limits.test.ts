import { expect, test } from 'vitest';
import {
  absoluteTimeoutS,
  activityGrainS,
  idleTimeoutS,
  isActivityDue,
  judgeSession,
  sessionEndMs,
} from '../../../src/domain/people/session-limits';

const startedAtMs = Date.UTC(2026, 2, 3, 13, 30);

test('keeps within 15 idle minutes and 12 hours, the strictest limits of NIST SP 800-63B-4 (2.3.3)', () => {
  expect(idleTimeoutS).toBeLessThanOrEqual(15 * 60);
  expect(absoluteTimeoutS).toBeLessThanOrEqual(12 * 3600);
});

test('holds until ten idle minutes are over, to the millisecond', () => {
  const times = { startedAtMs, activeAtMs: startedAtMs + 5_000 };
  expect(judgeSession(times, times.activeAtMs + 599_999)).toBe('live');
  expect(judgeSession(times, times.activeAtMs + 600_000)).toBe('idle-too-long');
});

test('ends after twelve hours, however busy the person was', () => {
  const endMs = startedAtMs + 43_200_000;
  expect(judgeSession({ startedAtMs, activeAtMs: endMs - 1 }, endMs - 1)).toBe('live');
  expect(judgeSession({ startedAtMs, activeAtMs: endMs - 1 }, endMs)).toBe('lasted-too-long');
  expect(sessionEndMs({ startedAtMs, activeAtMs: startedAtMs })).toBe(endMs);
});

test('is not ended by a clock that was set back', () => {
  expect(judgeSession({ startedAtMs, activeAtMs: startedAtMs }, startedAtMs - 3_600_000)).toBe('live');
});

test('notes an act only when the last one noted is some seconds old', () => {
  const times = { startedAtMs, activeAtMs: startedAtMs };
  expect(activityGrainS).toBeLessThan(60);
  expect(isActivityDue(times, startedAtMs + 14_999)).toBe(false);
  expect(isActivityDue(times, startedAtMs + 15_000)).toBe(true);
});
