import fc from 'fast-check';
import { expect, test } from 'vitest';
import { judgeTry, waitAfter, waitInWords } from '../../../src/domain/people/sign-in-throttle';

const nowMs = Date.UTC(2026, 2, 3, 13, 30);
const quiet = { failuresInARow: 0, lastFailureMs: null, sourceFailuresMs: [] };

test('lets the first five failures pass, then doubles the wait from 30 seconds up to an hour', () => {
  expect([0, 1, 4, 5, 6, 7, 8, 11, 12, 40].map(waitAfter)).toEqual([0, 0, 0, 30, 60, 120, 240, 1920, 3600, 3600]);
});

test('keeps to 30 seconds up to an hour, the span NIST SP 800-63B-4, 3.2.2 names', () => {
  fc.assert(
    fc.property(fc.integer({ min: 5, max: 99 }), (failures) => {
      expect(waitAfter(failures)).toBeGreaterThanOrEqual(30);
      expect(waitAfter(failures)).toBeLessThanOrEqual(3600);
      expect(waitAfter(failures + 1)).toBeGreaterThanOrEqual(waitAfter(failures));
    }),
  );
});

test('tells how many seconds are left of the wait, and none when it is over', () => {
  const tries = { ...quiet, failuresInARow: 6, lastFailureMs: nowMs };
  expect(judgeTry(tries, nowMs)).toEqual({ may: 'wait', seconds: 60 });
  expect(judgeTry(tries, nowMs + 59_001)).toEqual({ may: 'wait', seconds: 1 });
  expect(judgeTry(tries, nowMs + 60_000)).toEqual({ may: 'try' });
});

test('stops for good at 100 failures in a row, the most NIST SP 800-63B-4, 3.2.2 allows', () => {
  const dayLater = nowMs + 24 * 3_600_000;
  expect(judgeTry({ ...quiet, failuresInARow: 99, lastFailureMs: nowMs }, dayLater)).toEqual({ may: 'try' });
  expect(judgeTry({ ...quiet, failuresInARow: 100, lastFailureMs: nowMs }, dayLater)).toEqual({
    may: 'not-until-reset',
  });
});

test('lets an address wait after 60 failures in a quarter of an hour, whatever the names', () => {
  const failures = Array.from({ length: 60 }, (_, index) => nowMs - 600_000 + index * 1_000);
  expect(judgeTry({ ...quiet, sourceFailuresMs: failures.slice(1) }, nowMs)).toEqual({ may: 'try' });
  // The oldest of the sixty leaves the window 900 s after it was made: 300 s from now.
  expect(judgeTry({ ...quiet, sourceFailuresMs: failures }, nowMs)).toEqual({ may: 'wait', seconds: 300 });
  expect(judgeTry({ ...quiet, sourceFailuresMs: failures }, nowMs + 300_000)).toEqual({ may: 'try' });
});

test('says the wait in words, never shorter than it is', () => {
  expect([1, 30, 119, 120, 121, 1920, 3541, 3600].map(waitInWords)).toEqual([
    'a second',
    '30 seconds',
    '119 seconds',
    '2 minutes',
    '3 minutes',
    '32 minutes',
    'an hour',
    'an hour',
  ]);
});
