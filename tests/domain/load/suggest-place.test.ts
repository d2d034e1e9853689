import { applyEdit } from '#domain/load/apply-edit';
import { evaluateLoad } from '#domain/load/evaluate-load';
import type { LoadView } from '#domain/load/model';
import { defaultPolicy, type LoadPolicy } from '#domain/load/policy';
import { findPlace, nextFreeSlot, suggestHolderSpot, suggestPlace } from '#domain/load/suggest-place';
import { kg, mm } from '#domain/units/quantity';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { aLoad } from '../../support/arbitrary-load';
import {
  aHolder,
  anItem,
  aPackage,
  aShelf,
  aView,
  basin,
  cable,
  challengePack,
  container,
  drapes,
  forceps,
  inSlot,
  items,
  largeRack,
  lowerShelf,
  mediumRack,
  onShelf,
  smallRack,
  speculum,
  stacker,
  tray,
  upperShelf,
} from '../../support/building-load';

const racks = [
  aHolder('rs-1', smallRack),
  aHolder('rm-1', mediumRack, { xMm: mm(300) }),
  aHolder('rl-1', largeRack, { yMm: mm(600) }),
];

const suggest = (view: LoadView, subject: Parameters<typeof suggestPlace>[1], policy = defaultPolicy) =>
  suggestPlace(view, subject, policy);

describe('suggestPlace', () => {
  it('puts a pouch into the kind of holder it belongs in', () => {
    const view = aView({ holders: racks });
    expect(suggest(view, forceps)?.placement).toEqual(inSlot('rs-1', 1));
    expect(suggest(view, cable)?.placement).toEqual(inSlot('rm-1', 1));
    expect(suggest(view, speculum)?.placement).toEqual(inSlot('rl-1', 1));
  });

  it('puts a pouch into another holder that fits when its own kind is full or missing, and says so', () => {
    const suggestion = suggest(aView({ holders: racks.slice(1) }), forceps);
    expect(suggestion?.placement).toEqual(inSlot('rm-1', 1));
    expect(suggestion?.why).toBe('It fits this holder, and none of its own kind has a slot left.');
    // Too tall for the small rack, too thick for the medium one.
    expect(suggest(aView({ holders: racks.slice(0, 2) }), speculum)).toBeNull();
  });

  it('fills the rack that is begun before an empty one', () => {
    const view = aView({
      holders: [aHolder('rs-0', smallRack, { yMm: mm(600) }), aHolder('rs-1', smallRack)],
      packages: [aPackage('p1', forceps, { placement: inSlot('rs-1', 1) })],
    });
    expect(suggest(view, forceps)?.placement).toEqual(inSlot('rs-1', 2));
  });

  it('leaves a pouch without a place where no holder is', () => {
    expect(suggest(aView(), forceps)).toBeNull();
  });

  it('keeps heavy and rigid things low and textiles high', () => {
    expect(suggest(aView(), container)?.placement).toMatchObject({ at: 'shelf', shelfId: lowerShelf.id });
    expect(suggest(aView(), basin)?.placement).toMatchObject({ shelfId: lowerShelf.id, pose: 'tilted' });
    expect(suggest(aView(), drapes)?.placement).toMatchObject({ shelfId: upperShelf.id, pose: 'on-edge' });
  });

  it('goes up when the lower shelf carries no more', () => {
    const shelves = [aShelf({ greatestMassKg: kg(10) }), upperShelf];
    const packages = [aPackage('t1', tray, { placement: onShelf(lowerShelf, 30, 30) })];
    const view = aView({ cart: { ...aView().cart, shelves }, packages });
    // 3.2 + 8.9 kg is over 10 kg.
    expect(suggest(view, container)?.placement).toMatchObject({ shelfId: upperShelf.id });
  });

  it('leaves out a shelf that is out of use', () => {
    const view = aView({ cart: { ...aView().cart, shelves: [aShelf({ isUsable: false }), upperShelf] } });
    expect(suggest(view, container)?.placement).toMatchObject({ shelfId: upperShelf.id });
  });

  it('never puts metal over a textile pack on the shelf below', () => {
    const drapesLow = aPackage('x1', drapes, { placement: onShelf(lowerShelf, 30, 30, { pose: 'on-edge' }) });
    const shelves = [aShelf({ isUsable: false }), upperShelf];
    const view = aView({ cart: { ...aView().cart, shelves }, packages: [drapesLow] });
    const placement = suggest(view, tray)?.placement;
    if (placement?.at !== 'shelf') throw new Error('the tray should find a spot on the upper shelf');
    // The drapes stand on edge: 240 mm thick by 380 mm deep from (30, 30).
    expect(placement.yMm >= 30 + 380 || placement.xMm >= 30 + 240).toBe(true);
  });

  it('puts a challenge device as near to the drain as there is room', () => {
    const placement = suggest(aView(), challengePack)?.placement;
    if (placement?.at !== 'shelf') throw new Error('there is room for it');
    // Drain at (280, 150); the pack is 130 x 130 mm.
    const fromDrain = Math.hypot(placement.xMm + 65 - 280, placement.yMm + 65 - 150);
    expect(placement.shelfId).toBe(lowerShelf.id);
    expect(fromDrain).toBeLessThan(240);
  });

  it('stands a thing on another only where its instructions permit it and no shelf has room', () => {
    const full = anItem({ code: 'FULL', lengthMm: mm(1090), widthMm: mm(500) });
    const base = aPackage(
      'c1',
      { ...container, lengthMm: mm(1090), widthMm: mm(500) },
      { placement: onShelf(lowerShelf, 30, 30) },
    );
    const big = { ...container, lengthMm: mm(1090), widthMm: mm(500) };
    const view = aView({
      items: [...items.filter((item) => item !== container), big, full],
      packages: [base, aPackage('f1', full, { placement: onShelf(upperShelf, 30, 30) })],
    });
    expect(suggest(view, stacker)?.placement).toMatchObject({ at: 'package', belowPackageId: 'c1' });
    expect(suggest(view, tray)).toBeNull();
  });

  it('has no answer rather than one that a rule forbids: the only place left would cover an open lid filter', () => {
    const full = anItem({ code: 'FULL', lengthMm: mm(1090), widthMm: mm(500) });
    const base = { ...container, lengthMm: mm(1090), widthMm: mm(500) };
    const packages = [
      aPackage('c1', base, { placement: onShelf(lowerShelf, 30, 30) }),
      aPackage('f1', full, { placement: onShelf(upperShelf, 30, 30) }),
    ];
    const withLid = (filterZones: typeof base.filterZones) =>
      suggest(aView({ items: [stacker, full, { ...base, filterZones }], packages }), stacker)?.placement.at;
    const wholeLid = { face: 'lid', xMm: mm(100), yMm: mm(100), lengthMm: mm(800), widthMm: mm(300) } as const;
    expect(withLid([])).toBe('package');
    expect(withLid([wholeLid])).toBeUndefined();
    expect(withLid([{ ...wholeLid, face: 'base' }])).toBe('package');
  });

  it('takes a place that a lead would have to accept only when there is no better', () => {
    // Chamber no wider than its shelf: what stands at the edge is too near to the wall, and racks stand where they stand.
    const sterilizer = { ...aView().sterilizer, chamberWidthMm: mm(560) };
    const near = aHolder('rs-0', smallRack, { xMm: mm(2) });
    // Slot 1 is 19 mm from the wall, slot 2 is 47 mm.
    expect(suggest(aView({ sterilizer, holders: [near] }), forceps)?.placement).toEqual(inSlot('rs-0', 2));
    const inTheWay = Array.from({ length: 7 }, (_, index) =>
      aPackage(`in${index}`, forceps, { placement: inSlot('rs-0', index + 2) }),
    );
    expect(suggest(aView({ sterilizer, holders: [near], packages: inTheWay }), forceps)?.placement).toEqual(
      inSlot('rs-0', 1),
    );
  });

  it('looks only on the shelf it is told, for a pouch in the holders on it', () => {
    const view = aView({
      holders: [aHolder('rs-1', smallRack), aHolder('rs-2', smallRack, { shelfId: lowerShelf.id })],
    });
    const within = { kind: 'shelf', shelfId: lowerShelf.id } as const;
    expect(suggestPlace(view, forceps, defaultPolicy, within)?.placement).toEqual(inSlot('rs-2', 1));
    expect(suggestPlace(view, drapes, defaultPolicy, within)?.placement).toMatchObject({ shelfId: lowerShelf.id });
  });

  it('has no answer for a package that is not on the load', () => {
    expect(suggest(aView(), 'nobody')).toBeNull();
  });

  it('does not count the place a package leaves as taken', () => {
    const only = aPackage('p1', forceps, { placement: inSlot('rs-1', 1) });
    expect(suggest(aView({ holders: racks, packages: [only] }), 'p1')?.placement).toEqual(inSlot('rs-1', 1));
  });

  it('turns the paper side as the house rule says', () => {
    const packages = [aPackage('p1', forceps, { placement: inSlot('rs-1', 1, 'right') })];
    const view = aView({ holders: racks, packages });
    const paperUnder = (facing: LoadPolicy['facing']) =>
      suggest(view, forceps, { ...defaultPolicy, facing })?.placement.paper;
    expect([paperUnder('one-way'), paperUnder('alternating')]).toEqual(['right', 'left']);
  });
});

describe('suggestPlace and the rules', () => {
  const policies = fc.record({
    facing: fc.constantFrom('one-way', 'alternating', 'not-set'),
    packageClearanceMm: fc.constantFrom(0, 25, 60).map(mm),
    wallClearanceMm: fc.constantFrom(0, 25, 80).map(mm),
    pouchGapMm: fc.constantFrom(0, 10, 20).map(mm),
  });
  const within = fc.constantFrom(
    null,
    { kind: 'shelf', shelfId: lowerShelf.id } as const,
    { kind: 'shelf', shelfId: upperShelf.id } as const,
    { kind: 'holder', holderId: 'rs-1' } as const,
    { kind: 'holder', holderId: 'tb-1' } as const,
  );

  it('never adds a finding that holds the load, whatever is on the cart already', () => {
    const stopsOf = (view: LoadView, policy: LoadPolicy) =>
      evaluateLoad(view, policy)
        // What is counted, and that it had no place, changes with any place whatever.
        .filter(({ ruleId, severity }) => severity === 'stop' && ruleId !== 'unplaced' && !ruleId.startsWith('count-'))
        .map((finding) => finding.key);
    let suggested = 0;
    fc.assert(
      fc.property(aLoad, policies, within, fc.constantFrom(...items), (view, changes, place, item) => {
        const policy = { ...defaultPolicy, ...changes };
        const before = { ...view, packages: [...view.packages, aPackage('new', item)] };
        const frozen = structuredClone(before);
        const suggestion = suggestPlace(before, 'new', policy, place);
        expect(before).toEqual(frozen);
        if (!suggestion) return;
        suggested += 1;
        const after = applyEdit(before, { edit: 'place', packageId: 'new', placement: suggestion.placement });
        if (!after.ok) throw new Error(after.refusal.sentence);
        const known = new Set(stopsOf(before, policy));
        expect(stopsOf(after.value, policy).filter((key) => !known.has(key))).toEqual([]);
      }),
    );
    // A suggestion that never comes would pass as well.
    expect(suggested).toBeGreaterThan(25);
  }, 60_000);

  it('shows the load it was judged as', () => {
    const view = aView({ holders: racks, packages: [aPackage('p1', forceps)] });
    const found = findPlace(view, 'p1', defaultPolicy);
    expect(found?.after.packages[0]?.placement).toEqual(found?.suggestion.placement);
    expect([...(found?.trouble ?? ['none'])]).toEqual([]);
  });
});

describe('nextFreeSlot', () => {
  it('is the first that is free and fits', () => {
    const packages = [
      aPackage('p1', forceps, { placement: inSlot('rs-1', 1) }),
      aPackage('p2', forceps, { placement: inSlot('rs-1', 2) }),
    ];
    const view = aView({ holders: racks, packages });
    expect(nextFreeSlot(view, 'rs-1', forceps)).toBe(3);
    expect(nextFreeSlot(view, 'rs-1', cable)).toBeNull();
    expect(nextFreeSlot(view, 'rs-9', forceps)).toBeNull();
  });
});

describe('suggestHolderSpot', () => {
  it('puts a holder on the highest shelf, at the door and to the left', () => {
    // The chamber is 100 mm wider and deeper than the shelf: 50 mm free at each wall, which is more than the 25 asked for.
    expect(suggestHolderSpot(aView(), smallRack, null)).toEqual({ shelfId: upperShelf.id, xMm: 0, yMm: 0, turn: 0 });
  });

  it('keeps to the shelf it is told, beside what stands there', () => {
    const view = aView({ packages: [aPackage('t1', tray, { placement: onShelf(lowerShelf, 0, 0) })] });
    // The tray is 260 x 500 and asks for 25 mm: the rack of 240 x 350 goes to its right.
    expect(suggestHolderSpot(view, smallRack, lowerShelf.id)).toEqual({
      shelfId: lowerShelf.id,
      xMm: 285,
      yMm: 0,
      turn: 0,
    });
  });

  it('stands racks apart from each other', () => {
    const view = aView({ holders: [aHolder('rs-1', smallRack, { xMm: mm(0), yMm: mm(0) })] });
    expect(suggestHolderSpot(view, smallRack, upperShelf.id)).toMatchObject({ xMm: 250, yMm: 0 });
  });

  it('has no answer where the shelf is full, out of use, too low or not on the cart', () => {
    const full = anItem({ code: 'FULL', lengthMm: mm(1100), widthMm: mm(520) });
    const packages = [aPackage('f1', full, { placement: onShelf(upperShelf, 20, 20) })];
    const view = aView({ items: [full], packages });
    expect(suggestHolderSpot(view, smallRack, upperShelf.id)).toBeNull();
    expect(suggestHolderSpot(view, smallRack, null)).toMatchObject({ shelfId: lowerShelf.id });
    const changed = (shelf: ReturnType<typeof aShelf>) => aView({ cart: { ...aView().cart, shelves: [shelf] } });
    expect(suggestHolderSpot(changed(aShelf({ isUsable: false })), smallRack, null)).toBeNull();
    expect(suggestHolderSpot(changed(aShelf({ clearHeightMm: mm(100) })), smallRack, null)).toBeNull();
    expect(suggestHolderSpot(aView(), smallRack, 'x')).toBeNull();
  });
});
