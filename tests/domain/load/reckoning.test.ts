import { reckon } from '#domain/load/reckoning';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  aHolder,
  aPackage,
  aView,
  cable,
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

const onCart = aView({
  holders: [aHolder('rs-1', smallRack)],
  packages: [
    aPackage('c1', container, { placement: onShelf(lowerShelf, 100, 30) }),
    aPackage('c2', stacker, { placement: onTopOf('c1', 120, 60) }),
    aPackage('p1', forceps, { placement: inSlot('rs-1', 1) }),
    aPackage('p2', forceps, { placement: inSlot('rs-1', 2) }),
    aPackage('t1', tray),
    aPackage('p3', cable, { isScanned: false }),
  ],
});

describe('reckon', () => {
  it('counts what stands in holders and on other packages to the shelf that carries it', () => {
    const { shelves } = reckon(onCart);
    expect(shelves.map(({ shelfId, listed, scanned }) => ({ shelfId, listed, scanned }))).toEqual([
      { shelfId: lowerShelf.id, listed: 2, scanned: 2 },
      { shelfId: upperShelf.id, listed: 2, scanned: 2 },
    ]);
  });

  it('names what is missing and what has no place', () => {
    const reckoning = reckon(onCart);
    expect(reckoning.missing).toEqual([{ packageId: 'p3', code: 'P3', name: 'Light cable' }]);
    expect(reckoning.unplaced).toEqual([{ packageId: 't1', code: 'T1', name: 'D&C set' }]);
    expect([reckoning.listed, reckoning.scanned, reckoning.counted]).toEqual([6, 5, null]);
    expect(reckoning.isEven).toBe(false);
  });

  it('puts an expected package to the shelf where it is expected', () => {
    const { shelves } = reckon(onCart, new Map([['p3', upperShelf.id]]));
    expect(shelves[1]).toMatchObject({ listed: 3, scanned: 2, difference: '1 on the list not scanned' });
    expect(shelves[1]?.missing.map((one) => one.packageId)).toEqual(['p3']);
  });

  it('says a difference in words, whichever way it goes', () => {
    const wordsFor = (counted: number | null) =>
      reckon({ ...onCart, counts: counted === null ? [] : [{ shelfId: lowerShelf.id, counted }] }).shelves[0]
        ?.difference;
    expect(wordsFor(null)).toBe('count later');
    expect(wordsFor(2)).toBe('all scanned and counted');
    expect(wordsFor(3)).toBe('1 counted but not scanned');
    expect(wordsFor(0)).toBe('2 scanned but not counted');
  });

  it('is even only when everything is scanned, placed and counted, shelf by shelf', () => {
    const packages = onCart.packages.filter((one) => one.packageId !== 't1' && one.packageId !== 'p3');
    const counts = [
      { shelfId: lowerShelf.id, counted: 2 },
      { shelfId: upperShelf.id, counted: 2 },
    ];
    expect(reckon({ ...onCart, packages, counts }).isEven).toBe(true);
    expect(reckon({ ...onCart, packages, counts: counts.slice(1) }).isEven).toBe(false);
    // Scanned and on no shelf: every shelf agrees, the load does not.
    expect(reckon({ ...onCart, packages: [...packages, aPackage('t1', tray)], counts }).isEven).toBe(false);
    // One too many here and one too few there is no agreement, although the sums agree.
    const swapped = [
      { shelfId: lowerShelf.id, counted: 3 },
      { shelfId: upperShelf.id, counted: 1 },
    ];
    const reckoning = reckon({ ...onCart, packages, counts: swapped });
    expect([reckoning.counted, reckoning.scanned]).toEqual([4, 4]);
    expect(reckoning.isEven).toBe(false);
  });

  it('has totals that are the sums of its parts', () => {
    const place = fc.constantFrom(
      null,
      onShelf(lowerShelf, 30, 30),
      onShelf(upperShelf, 30, 30),
      inSlot('rs-1', 3),
      inSlot('of another cart', 1),
      onTopOf('one0', 30, 30),
    );
    const one = fc.record({
      place,
      isScanned: fc.boolean(),
      expectedOn: fc.constantFrom(null, lowerShelf.id, upperShelf.id),
    });
    fc.assert(
      fc.property(fc.array(one, { maxLength: 12 }), fc.array(fc.nat(20), { maxLength: 2 }), (ones, counted) => {
        const view = aView({
          holders: [aHolder('rs-1', smallRack)],
          packages: ones.map(({ place: placement, isScanned }, index) =>
            aPackage(`one${index}`, tray, { isScanned, placement: isScanned ? placement : null }),
          ),
          counts: counted.map((count, index) => ({
            shelfId: [lowerShelf.id, upperShelf.id][index] ?? '',
            counted: count,
          })),
        });
        const expected = new Map(
          ones.flatMap((each, index) => (each.expectedOn ? [[`one${index}`, each.expectedOn]] : [])),
        );
        const reckoning = reckon(view, expected);
        const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
        const missingSomewhere = reckoning.missing.filter((each) => expected.has(each.packageId)).length;
        expect(reckoning.scanned).toBe(
          sum(reckoning.shelves.map((shelf) => shelf.scanned)) + reckoning.unplaced.length,
        );
        expect(reckoning.listed).toBe(reckoning.scanned + reckoning.missing.length);
        expect(sum(reckoning.shelves.map((shelf) => shelf.missing.length))).toBe(missingSomewhere);
        for (const shelf of reckoning.shelves) expect(shelf.listed).toBe(shelf.scanned + shelf.missing.length);
        expect(reckoning.counted).toBe(counted.length === 2 ? sum(counted) : null);
      }),
    );
  });
});
