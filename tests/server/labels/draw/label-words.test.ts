import { describe, expect, test } from 'vitest';
import {
  dayWords,
  expiryWords,
  momentWords,
  oneLine,
  reprintWords,
} from '../../../../server/features/labels/draw/label-words';

describe('the words of a label', () => {
  test('write a day so that it cannot be taken for a month', () => {
    expect(dayWords('2026-03-04')).toBe('4 Mar 2026');
    expect(dayWords('2026-12-31')).toBe('31 Dec 2026');
  });

  test('write a moment on the clock of the facility, also in the hour that comes twice', () => {
    expect(momentWords('2026-10-25T00:30:00Z', 'Europe/Berlin')).toBe('25 Oct 2026 02:30');
    expect(momentWords('2026-10-25T01:30:00Z', 'Europe/Berlin')).toBe('25 Oct 2026 02:30');
    expect(momentWords('2026-03-17T23:59:59Z', 'UTC')).toBe('17 Mar 2026 23:59');
  });

  test('say how long a package keeps', () => {
    expect(expiryWords({ rule: 'event-related' }).join(' ')).toBe('Use while whole and dry');
    expect(expiryWords({ rule: 'dated', on: '2026-09-17' }).join(' ')).toBe('Use by 2026-09-17');
  });

  test('count reprints from the second printing', () => {
    expect([1, 2, 12].map(reprintWords)).toEqual([null, 'Reprint 2', 'Reprint 12']);
  });

  test('stay on one line', () => {
    expect(oneLine('  Set\r\n one\u0000\ttwo\u2028three\ud800 ')).toBe('Set one two three');
  });

  test('write an accent and its letter as one character', () => {
    expect(oneLine('Sa\u0308ge')).toBe('Säge');
  });
});
