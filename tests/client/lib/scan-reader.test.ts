import { describe, expect, it } from 'vitest';
import { createScanReader, mostCharacters, type ScanKey } from '../../../src/lib/scan-reader';

function keysOf(text: string, gapMs: number, startMs = 0): ScanKey[] {
  return Array.from(text, (key, at) => ({ key, isCtrl: false, isRepeat: false, atMs: startMs + at * gapMs }));
}

const enter = (atMs: number): ScanKey => ({ key: 'Enter', isCtrl: false, isRepeat: false, atMs });

function readAll(keys: readonly ScanKey[]) {
  const reader = createScanReader();
  return keys.map((key) => reader.read(key));
}

describe('the pace of a scanner', () => {
  it.each([0, 2, 10, 60])('is a scan with %i ms between the keys', (gapMs) => {
    const verdicts = readAll([...keysOf('P204', gapMs), enter(4 * gapMs)]);
    expect(verdicts.at(-1)).toEqual({ kind: 'scan', text: 'P204' });
  });

  it.each([61, 80, 120])('is typing with %i ms between the keys', (gapMs) => {
    const verdicts = readAll([...keysOf('P204', gapMs), enter(4 * gapMs)]);
    expect(verdicts.map(({ kind }) => kind)).toEqual(['first', 'first', 'first', 'first', 'typed']);
  });

  it('takes three characters and leaves two', () => {
    expect(readAll([...keysOf('123', 5), enter(15)]).at(-1)).toEqual({ kind: 'scan', text: '123' });
    expect(readAll([...keysOf('12', 5), enter(10)]).at(-1)).toEqual({ kind: 'too-short' });
  });

  it('loses nothing of a scan that stutters, as radio scanners and busy tablets make it', () => {
    const reader = createScanReader();
    const atMs = [0, 5, 10, 190, 195, 200, 380, 385];
    const keys = Array.from('P2043178', (key, at) => ({ key, isCtrl: false, isRepeat: false, atMs: atMs[at] ?? 0 }));
    const verdicts = [...keys, enter(390)].map((key) => reader.read(key));
    expect(verdicts.at(-1)).toEqual({ kind: 'scan', text: 'P2043178' });
    // The late characters may be a hand's: they are left to whatever has the focus.
    expect(verdicts.map(({ kind }) => kind).slice(3, 7)).toEqual(['first', 'inside', 'inside', 'first']);
  });

  it('keeps only what followed the last pause', () => {
    const verdicts = readAll([...keysOf('xx', 5), ...keysOf('P20', 5, 500), enter(515)]);
    expect(verdicts.at(-1)).toEqual({ kind: 'scan', text: 'P20' });
  });

  it('does not take Enter that comes after a pause for the end of a scan', () => {
    expect(readAll([...keysOf('P204', 5), enter(500)]).at(-1)).toEqual({ kind: 'typed' });
  });

  it('hears two scans in a row', () => {
    const verdicts = readAll([...keysOf('P20', 5), enter(15), ...keysOf('P21', 5, 20), enter(35)]);
    expect(verdicts.filter(({ kind }) => kind === 'scan')).toEqual([
      { kind: 'scan', text: 'P20' },
      { kind: 'scan', text: 'P21' },
    ]);
  });

  it('is not met by a key that is held down', () => {
    const held = keysOf('aaaa', 30).map((key) => ({ ...key, isRepeat: true }));
    expect(readAll([...held, enter(120)]).at(-1)).toEqual({ kind: 'typed' });
  });

  it('cuts what never ends', () => {
    const text = 'x'.repeat(mostCharacters + 500);
    const verdict = readAll([...keysOf(text, 0), enter(0)]).at(-1);
    expect(verdict).toEqual({ kind: 'scan', text: 'x'.repeat(mostCharacters) });
  });
});

describe('the keys of a scanner', () => {
  it('ends at Tab too', () => {
    const tab: ScanKey = { key: 'Tab', isCtrl: false, isRepeat: false, atMs: 15 };
    expect(readAll([...keysOf('P20', 5), tab]).at(-1)).toEqual({ kind: 'scan', text: 'P20' });
  });

  it('swallows the second half of a double line end, and no Enter later than that', () => {
    const verdicts = readAll([...keysOf('P20', 5), enter(15), enter(18), enter(400)]);
    expect(verdicts.slice(-2)).toEqual([{ kind: 'tail' }, { kind: 'typed' }]);
  });

  it('goes on over Shift', () => {
    const shift: ScanKey = { key: 'Shift', isCtrl: false, isRepeat: false, atMs: 6 };
    const [first, ...rest] = keysOf('P20', 5);
    if (!first) throw new Error('no keys');
    expect(readAll([first, shift, ...rest, enter(15)]).at(-1)).toEqual({ kind: 'scan', text: 'P20' });
  });

  it('takes Ctrl and ] for the GS between fields', () => {
    const gs: ScanKey = { key: ']', isCtrl: true, isRepeat: false, atMs: 15 };
    const verdicts = readAll([...keysOf('10A', 5), gs, ...keysOf('21B', 5, 20), enter(35)]);
    expect(verdicts.at(-1)).toEqual({ kind: 'scan', text: '10A\u001d21B' });
  });

  it('begins with GS where the symbol does', () => {
    const gs: ScanKey = { key: ']', isCtrl: true, isRepeat: false, atMs: 0 };
    expect(readAll([gs, ...keysOf('01095', 5, 5), enter(30)]).at(-1)).toEqual({ kind: 'scan', text: '\u001d01095' });
  });

  it('ends at Ctrl and M, which is a line end', () => {
    const carriageReturn: ScanKey = { key: 'm', isCtrl: true, isRepeat: false, atMs: 15 };
    expect(readAll([...keysOf('P20', 5), carriageReturn]).at(-1)).toEqual({ kind: 'scan', text: 'P20' });
  });

  it('leaves a lone shortcut alone', () => {
    expect(readAll([{ key: 'p', isCtrl: true, isRepeat: false, atMs: 0 }])).toEqual([{ kind: 'typed' }]);
  });

  it('forgets at a key that no symbol holds', () => {
    const arrow: ScanKey = { key: 'ArrowLeft', isCtrl: false, isRepeat: false, atMs: 10 };
    expect(readAll([...keysOf('P2', 5), arrow, ...keysOf('04', 5, 15), enter(25)]).at(-1)).toEqual({
      kind: 'too-short',
    });
  });
});
