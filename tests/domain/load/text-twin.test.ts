import type { Finding } from '#domain/load/finding';
import { findingLetter, textTwin } from '#domain/load/text-twin';
import { describe, expect, it } from 'vitest';
import {
  aHolder,
  aPackage,
  aView,
  container,
  forceps,
  inSlot,
  lowerShelf,
  onShelf,
  onTopOf,
  smallRack,
  stacker,
  tray,
  upperShelf,
} from '../../support/building-load';

const load = aView({
  holders: [aHolder('rs-1', smallRack)],
  packages: [
    aPackage('base', container, { placement: onShelf(lowerShelf, 100, 30) }),
    aPackage('top', stacker, { placement: onTopOf('base', 120, 150) }),
    aPackage('p2', forceps, { placement: inSlot('rs-1', 7, 'right') }),
    aPackage('p1', forceps, { placement: inSlot('rs-1', 1) }),
    aPackage('t1', tray),
    aPackage('t2', tray, { isScanned: false }),
  ],
});

function aFinding(title: string, places: Finding['places']): Finding {
  return {
    key: title,
    ruleId: 'facing',
    severity: 'stop',
    title,
    reason: '',
    remedy: '',
    source: { text: '', provenance: 'house-rule' },
    places,
    figure: null,
    fix: null,
  };
}

describe('textTwin', () => {
  it('tells the cart shelf by shelf, holder by holder, slot by slot', () => {
    expect(textTwin(load, [])).toEqual([
      {
        heading: 'Lower shelf',
        lines: [
          'General container set A, middle, at the door, flat.',
          'Eye micro set, on top of General container set A, flat.',
        ],
      },
      {
        heading: 'Upper shelf',
        lines: [
          'Holder RS-1, left, at the door, 2 in 8 slots.',
          'Slot 1: Adson forceps pair, on edge, paper side left.',
          'Slot 7: Adson forceps pair, on edge, paper side right.',
          'Free slots: 2, 3, 4, 5, 6, 8.',
        ],
      },
      { heading: 'Scanned, no place yet', lines: ['D&C set.'] },
      { heading: 'Not scanned yet', lines: ['D&C set.'] },
    ]);
  });

  it('says each finding where it is, with its letter', () => {
    const findings = [
      aFinding('Slot 7 faces the wrong way', [
        { on: 'package', packageId: 'p2' },
        { on: 'holder', holderId: 'rs-1', slot: 7 },
      ]),
      aFinding('The rack is bent', [{ on: 'holder', holderId: 'rs-1', slot: null }]),
      aFinding('Too heavy', [{ on: 'shelf', shelfId: lowerShelf.id }]),
      aFinding('No air-removal test', [{ on: 'load' }]),
    ];
    const parts = textTwin(load, findings);
    const lines = parts.flatMap((part) => part.lines);
    expect(parts[0]).toEqual({ heading: 'The whole load', lines: ['Finding D: No air-removal test.'] });
    expect(lines).toContain(
      'Slot 7: Adson forceps pair, on edge, paper side right. Finding A: Slot 7 faces the wrong way.',
    );
    expect(lines).toContain('Holder RS-1, left, at the door, 2 in 8 slots. Finding B: The rack is bent.');
    expect(lines).toContain('Finding C: Too heavy.');
  });

  it('says that an empty shelf is empty', () => {
    expect(textTwin(aView(), [])).toEqual([
      { heading: 'Lower shelf', lines: ['Empty.'] },
      { heading: 'Upper shelf', lines: ['Empty.'] },
    ]);
  });

  it('names every package exactly once, also in data that make no sense', () => {
    const odd = aView({
      packages: [
        aPackage('a', tray, { placement: onTopOf('b', 0, 0) }),
        aPackage('b', forceps, { placement: onTopOf('a', 0, 0) }),
        aPackage('c', container, { placement: inSlot('rs-9', 1) }),
        aPackage('d', stacker, { placement: onShelf({ ...upperShelf, id: 'x' }, 0, 0) }),
      ],
    });
    const text = textTwin(odd, [])
      .flatMap((part) => part.lines)
      .join('\n');
    for (const name of ['D&C set, on top', 'Adson forceps pair, on top', 'General container set A', 'Eye micro set']) {
      expect(text.split(name).length - 1, name).toBe(1);
    }
  });
});

describe('findingLetter', () => {
  it('goes on after Z as columns of a table do', () => {
    expect([0, 25, 26, 51, 52, 701, 702].map(findingLetter)).toEqual(['A', 'Z', 'AA', 'AZ', 'BA', 'ZZ', 'AAA']);
  });
});
