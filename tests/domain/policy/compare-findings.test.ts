import { compareFindings, type KeptFinding } from '#domain/policy/compare-findings';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

const figure = { measured: 12, limit: 25, unit: 'mm', want: 'at-least', limitFrom: 'default' } as const;

function aFinding(key: string, changes: Partial<KeptFinding> = {}): KeptFinding {
  return {
    key,
    ruleId: 'package-clearance',
    severity: 'stop',
    title: 'Too near',
    reason: 'Steam has to get between.',
    remedy: 'Move one of them.',
    source: { text: 'Common practice, no source.', provenance: 'common-practice' },
    places: [
      { on: 'package', packageId: 'p1' },
      { on: 'package', packageId: 'p2' },
    ],
    figure,
    ...changes,
  };
}

const keysOf = ({ changed, onlyNow, onlyThen, both }: ReturnType<typeof compareFindings>) => ({
  changed: changed.map((pair) => [pair.then.key, pair.now.key]),
  onlyNow: onlyNow.map(({ key }) => key),
  onlyThen: onlyThen.map(({ key }) => key),
  both: both.map((pair) => pair.now.key),
});

describe('two judgements of one load', () => {
  it('have in common what has the same key', () => {
    expect(keysOf(compareFindings([aFinding('a')], [aFinding('a', { title: 'Said otherwise' })]))).toEqual({
      changed: [],
      onlyNow: [],
      onlyThen: [],
      both: ['a'],
    });
  });

  it('differ where only one of them finds something', () => {
    const elsewhere = aFinding('b', { places: [{ on: 'load' }] });
    expect(keysOf(compareFindings([aFinding('a')], [elsewhere]))).toEqual({
      changed: [],
      onlyNow: ['b'],
      onlyThen: ['a'],
      both: [],
    });
  });

  it('judge otherwise where the same rule finds another figure at the same places, named in any order', () => {
    const now = aFinding('b', {
      figure: { ...figure, measured: 14 },
      places: [
        { on: 'package', packageId: 'p2' },
        { on: 'package', packageId: 'p1' },
      ],
    });
    expect(keysOf(compareFindings([aFinding('a')], [now])).changed).toEqual([['a', 'b']]);
  });

  it('judge otherwise where the limit or the weight of the same finding differs', () => {
    const otherLimit = aFinding('a', { figure: { ...figure, limit: 40 } });
    const otherWeight = aFinding('a', { severity: 'advice' });
    const noFigure = aFinding('a', { figure: null });
    for (const now of [otherLimit, otherWeight, noFigure]) {
      expect(keysOf(compareFindings([aFinding('a')], [now]))).toMatchObject({ changed: [['a', 'a']], both: [] });
    }
  });

  it('agree where a figure differs in the last digit of its sum only', () => {
    const now = aFinding('a', { figure: { ...figure, measured: 12 + 1e-12 } });
    expect(keysOf(compareFindings([aFinding('a')], [now])).both).toEqual(['a']);
  });

  it('keep apart two rules at one place, two shelves, and two slots of one holder', () => {
    const apart: readonly (readonly [Partial<KeptFinding>, Partial<KeptFinding>])[] = [
      [{ ruleId: 'overlap' }, { ruleId: 'gap' }],
      [{ places: [{ on: 'shelf', shelfId: 's1' }] }, { places: [{ on: 'shelf', shelfId: 's2' }] }],
      [{ places: [{ on: 'holder', holderId: 'h', slot: 1 }] }, { places: [{ on: 'holder', holderId: 'h', slot: 2 }] }],
      [{ places: [{ on: 'holder', holderId: 'h', slot: null }] }, { places: [{ on: 'load' }] }],
    ];
    for (const [then, now] of apart) {
      expect(keysOf(compareFindings([aFinding('a', then)], [aFinding('b', now)]))).toMatchObject({
        changed: [],
        onlyThen: ['a'],
        onlyNow: ['b'],
      });
    }
  });

  it('put every finding into exactly one of the four, also where one is found twice', () => {
    const arbitrary = fc.array(
      fc
        .record({
          key: fc.constantFrom('a', 'b', 'c'),
          place: fc.constantFrom('p1', 'p2'),
          measured: fc.constantFrom(1, 2),
        })
        .map(({ key, place, measured }) =>
          aFinding(key, { places: [{ on: 'package', packageId: place }], figure: { ...figure, measured } }),
        ),
      { maxLength: 8 },
    );
    fc.assert(
      fc.property(arbitrary, arbitrary, (then, now) => {
        const { changed, both, onlyThen, onlyNow } = compareFindings(then, now);
        const pairs = [...changed, ...both];
        expect(new Set([...pairs.map((pair) => pair.then), ...onlyThen])).toEqual(new Set(then));
        expect(new Set([...pairs.map((pair) => pair.now), ...onlyNow])).toEqual(new Set(now));
        expect(pairs.length + onlyThen.length).toBe(then.length);
        expect(pairs.length + onlyNow.length).toBe(now.length);
      }),
    );
  });
});
