import { evaluateLoad } from '#domain/load/evaluate-load';
import type { Finding, RuleId } from '#domain/load/finding';
import type {
  CatalogueItem,
  HolderKind,
  LoadHolder,
  LoadPackage,
  LoadView,
  Placement,
  Program,
  Shelf,
  Sterilizer,
} from '#domain/load/model';
import { defaultPolicy, policyParameters, type LoadPolicy } from '#domain/load/policy';
import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, inBasket, inSlot, onLower, onUpper } from '../../support/load-builder';

/*
 * Figures that cannot be, and loads that nobody would build: nothing throws, and nothing is passed over in silence. People's own
 * bad figures are refused before they come this far.
 */

const noSizes = [NaN, Infinity, -Infinity, 0, -1, 100_000] as const;
const noMasses = [NaN, Infinity, -1, 100_000] as const;
const noPositions = [NaN, Infinity, -Infinity, 1e9] as const;

/** A good load with one of everything whose figures are to be spoilt. */
const good = aLoad()
  .withHolder('RS-1', 'RS', { shelf: 'upper', x: 20, y: 40 })
  .withHolder('TB-1', 'TB', { shelf: 'upper', x: 20, y: 450 })
  .withPackage('P-01', inSlot('RS-1', 1))
  .withPackage('P-02', inSlot('RS-1', 3))
  .withPackage('C-14', inBasket('TB-1', 10, 10, { turn: 90 }))
  .withPackage('C-05', onLower(0, 200))
  .withPackage('PCD', onLower(305, 30))
  .build();

function told(view: LoadView, policy: LoadPolicy = defaultPolicy): readonly Finding[] {
  const findings = evaluateLoad(view, policy);
  // Fixes are worked out when they are read: they must not throw either.
  for (const finding of findings) expect(finding.fix?.edits.length).not.toBe(0);
  return findings;
}

function rulesTold(view: LoadView): ReadonlySet<RuleId> {
  return new Set(told(view).map((finding) => finding.ruleId));
}

const changedItem = (code: string, changes: Partial<CatalogueItem>): LoadView => ({
  ...good,
  items: good.items.map((item) => (item.code === code ? { ...item, ...changes } : item)),
});
const changedKind = (code: string, changes: Partial<HolderKind>): LoadView => ({
  ...good,
  holderKinds: good.holderKinds.map((kind) => (kind.code === code ? { ...kind, ...changes } : kind)),
});
const changedHolder = (holderId: string, changes: Partial<LoadHolder>): LoadView => ({
  ...good,
  holders: good.holders.map((holder) => (holder.holderId === holderId ? { ...holder, ...changes } : holder)),
});
const changedShelf = (changes: Partial<Shelf>): LoadView => ({
  ...good,
  cart: { ...good.cart, shelves: good.cart.shelves.map((shelf) => ({ ...shelf, ...changes })) },
});
const changedSterilizer = (changes: Partial<Sterilizer>): LoadView => ({
  ...good,
  sterilizer: { ...good.sterilizer, ...changes },
});
const changedProgram = (changes: Partial<Program>): LoadView => ({ ...good, program: { ...good.program, ...changes } });
const changedPackage = (packageId: string, changes: Partial<LoadPackage>): LoadView => ({
  ...good,
  packages: good.packages.map((one) => (one.packageId === packageId ? { ...one, ...changes } : one)),
});
const changedPlace = (packageId: string, changes: object): LoadView => ({
  ...good,
  packages: good.packages.map((one) =>
    one.packageId === packageId ? { ...one, placement: { ...one.placement, ...changes } as Placement } : one,
  ),
});

/** A figure by its name, whatever its unit: these are wrong in any. */
const figure = (name: string, value: number) => ({ [name]: value });

describe('a figure that cannot be is a finding of the load', () => {
  it('that is good with good figures', () => {
    expect(told(good)).toEqual([]);
  });

  it.each(['lengthMm', 'widthMm', 'heightMm'])('%s of an item', (name) => {
    for (const value of noSizes) {
      for (const code of ['P-01', 'C-14', 'C-05', 'PCD']) {
        expect([code, value, rulesTold(changedItem(code, figure(name, value))).has('size-makes-no-sense')]).toEqual([
          code,
          value,
          true,
        ]);
      }
    }
  });

  it.each([
    ['mass of an item', noMasses, (value: number) => changedItem('C-05', figure('massKg', value))],
    ['metal of an item', noMasses, (value: number) => changedItem('C-05', figure('metalMassKg', value))],
    ['mass limit of an item', [NaN, -1], (value: number) => changedItem('C-05', figure('massLimitKg', value))],
    ['clearance of a pouch', [NaN, Infinity, -1], (value: number) => changedItem('P-01', figure('clearanceMm', value))],
    ['clearance of a set', [NaN, Infinity, -1], (value: number) => changedItem('C-05', figure('clearanceMm', value))],
    [
      'filter of a container',
      noPositions,
      (value: number) =>
        changedItem('C-05', {
          filterZones: [{ face: 'lid', xMm: mm(value), yMm: mm(10), lengthMm: mm(50), widthMm: mm(50) }],
        }),
    ],
    ['width of shelves', noSizes, (value: number) => changedShelf(figure('widthMm', value))],
    ['depth of shelves', noSizes, (value: number) => changedShelf(figure('depthMm', value))],
    ['clear height of shelves', noSizes, (value: number) => changedShelf(figure('clearHeightMm', value))],
    ['mass limit of shelves', [NaN, -1], (value: number) => changedShelf(figure('greatestMassKg', value))],
    ['width of the chamber', noSizes, (value: number) => changedSterilizer(figure('chamberWidthMm', value))],
    ['depth of the chamber', noSizes, (value: number) => changedSterilizer(figure('chamberDepthMm', value))],
    ['drain', [NaN, Infinity, 1e9], (value: number) => changedSterilizer(figure('drainXMm', value))],
    [
      'mass limit of the sterilizer',
      [NaN, -1],
      (value: number) => changedSterilizer(figure('greatestLoadMassKg', value)),
    ],
    ['mass limit of the program', [NaN, -1], (value: number) => changedProgram(figure('greatestLoadMassKg', value))],
    ['temperature', [NaN, Infinity, 0, -1], (value: number) => changedProgram(figure('temperatureC', value))],
    ['exposure', [NaN, 0, -1], (value: number) => changedProgram(figure('exposureS', value))],
    ['drying', [NaN, -1], (value: number) => changedProgram(figure('dryS', value))],
    ['frame of a rack', noSizes, (value: number) => changedKind('RS', figure('acrossMm', value))],
    ['length of a basket', noSizes, (value: number) => changedKind('TB', figure('alongMm', value))],
    ['pitch of a rack', noSizes, (value: number) => changedKind('RS', figure('pitchMm', value))],
    ['mass of a holder', noMasses, (value: number) => changedKind('RS', figure('massKg', value))],
    ['slots of a rack', [NaN, 0, -1], (value: number) => changedKind('RS', figure('slots', value))],
    [
      'greatest thickness of a rack',
      [NaN, -1, 0],
      (value: number) => changedKind('RS', figure('greatestThicknessMm', value)),
    ],
    ['place of a holder', noPositions, (value: number) => changedHolder('RS-1', figure('xMm', value))],
    ['place of a package', noPositions, (value: number) => changedPlace('C-05', figure('xMm', value))],
    ['place in a basket', noPositions, (value: number) => changedPlace('C-14', figure('yMm', value))],
    [
      'number of a slot',
      [NaN, Infinity, 0, -1, 1.5, 9],
      (value: number) => changedPlace('P-01', figure('slot', value)),
    ],
  ] satisfies readonly (readonly [string, readonly number[], (value: number) => LoadView])[])(
    '%s',
    (_what, values, spoilt) => {
      for (const value of values) expect([value, told(spoilt(value)).length > 0]).toEqual([value, true]);
    },
  );

  it('a count', () => {
    for (const value of [NaN, Infinity, -1, 0.5]) {
      const counts = good.counts.map((count) => ({ ...count, counted: value }));
      expect([value, told({ ...good, counts }).length > 0]).toEqual([value, true]);
    }
  });
});

describe('a reference to what is not there is a finding', () => {
  it.each([
    ['an item', changedPackage('C-05', { itemId: 'no such item' }), 'label-known'],
    ['a shelf', changedPlace('C-05', { shelfId: 'no such shelf' }), 'unplaced'],
    ['a holder', changedPlace('P-01', { holderId: 'no such holder' }), 'unplaced'],
    ['a package to stand on', changedPackage('C-05', { placement: null }), 'unplaced'],
    ['a kind of holder', changedHolder('RS-1', { kindId: 'no such kind' }), 'holder-usable'],
    ['a shelf under a holder', changedHolder('RS-1', { shelfId: 'no such shelf' }), 'holder-usable'],
    ['slots of a rack', changedKind('RS', { slots: null, pitchMm: null }), 'slot-unknown'],
  ] satisfies readonly (readonly [string, LoadView, RuleId])[])('%s', (_what, view, rule) => {
    expect(rulesTold(view)).toContain(rule);
  });

  it('an empty cart without shelves, programs, items and holders throws nothing', () => {
    const bare = { ...good, cart: { ...good.cart, shelves: [] }, qualifiedPrograms: [], items: [], holderKinds: [] };
    expect(rulesTold(bare)).toContain('label-known');
  });
});

describe('house rules that no edge would let through', () => {
  it('throw nothing', () => {
    for (const parameter of policyParameters) {
      if (parameter.form === 'choice') continue;
      for (const value of [NaN, Infinity, -Infinity, -1e9, 1e9]) {
        const policy = { ...defaultPolicy, [parameter.id]: value };
        expect(() => told(good, policy)).not.toThrow();
      }
    }
  });
});

describe('a load of 5,000 packages', () => {
  const [template] = aLoad().withPackage('W-08', onUpper(0, 0)).build().packages;

  function five(placementOf: (index: number) => Placement | null, load = aLoad()): LoadView {
    if (!template) throw new Error('no package');
    const packages = Array.from({ length: 5_000 }, (_, index) => ({
      ...template,
      packageId: `p${index}`,
      code: `label ${index}`,
      placement: placementOf(index),
    }));
    return load.with({ packages }).uncounted().build();
  }

  function judged(view: LoadView): ReadonlySet<RuleId> {
    return new Set(evaluateLoad(view, defaultPolicy).map((finding) => finding.ruleId));
  }

  const flat = { turn: 0, pose: 'flat', paper: null } as const;

  it.each([
    ['all on the table', five(() => null), 'unplaced'],
    [
      'spread over a shelf',
      five((index) => ({
        at: 'shelf',
        shelfId: 'upper',
        xMm: mm((index % 70) * 8),
        yMm: mm(Math.floor(index / 70) * 16),
        ...flat,
      })),
      'overlap',
    ],
    [
      'in the slots of one rack',
      five(
        (index) => ({ at: 'slot', holderId: 'RS-1', slot: (index % 8) + 1, pose: 'on-edge', paper: 'left' }),
        aLoad().withHolder('RS-1', 'RS', { x: 20, y: 40 }),
      ),
      'slot-shared',
    ],
    [
      'one on top of another',
      five((index) =>
        index === 0
          ? { at: 'shelf', shelfId: 'upper', xMm: mm(0), yMm: mm(0), ...flat }
          : { at: 'package', belowPackageId: `p${index - 1}`, xMm: mm(0), yMm: mm(0), ...flat },
      ),
      'stack-not-permitted',
    ],
    [
      'in circles of ten',
      five((index) => {
        const below = index % 10 === 9 ? index - 9 : index + 1;
        return { at: 'package', belowPackageId: `p${below}`, xMm: mm(0), yMm: mm(0), ...flat };
      }),
      'stack-circular',
    ],
  ] satisfies readonly (readonly [string, LoadView, RuleId])[])(
    '%s',
    (_what, view, rule) => {
      expect(judged(view)).toContain(rule);
    },
    60_000,
  );
});
