import { affectedShelves, applyEdit, applyEdits, type EditRefusal } from '#domain/load/apply-edit';
import type { LoadEdit } from '#domain/load/finding';
import type { LoadView, Placement } from '#domain/load/model';
import { mm } from '#domain/units/quantity';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { anEdit, aLoad } from '../../support/arbitrary-load';
import {
  aHolder,
  aPackage,
  aView,
  basket,
  cable,
  container,
  forceps,
  inBasket,
  inSlot,
  longDrying,
  lowerShelf,
  mediumRack,
  onShelf,
  onTopOf,
  smallRack,
  stacker,
  tray,
  upperShelf,
} from '../../support/building-load';

const load = aView({
  holders: [aHolder('rs-1', smallRack), aHolder('tb-1', basket, { yMm: mm(600) })],
  packages: [
    aPackage('base', container, { placement: onShelf(lowerShelf, 100, 100) }),
    aPackage('middle', stacker, { placement: onTopOf('base', 120, 150) }),
    aPackage('top', stacker, { placement: onTopOf('middle', 120, 150) }),
    aPackage('p1', forceps, { placement: inSlot('rs-1', 1) }),
    aPackage('p2', forceps, { placement: inSlot('rs-1', 2) }),
    aPackage('loose', cable),
    aPackage('t1', tray, { isScanned: false }),
  ],
  counts: [
    { shelfId: lowerShelf.id, counted: 3 },
    { shelfId: upperShelf.id, counted: 2 },
  ],
});

function after(view: LoadView, ...edits: readonly LoadEdit[]): LoadView {
  const result = applyEdits(view, edits);
  if (!result.ok) throw new Error(result.refusal.sentence);
  return result.value;
}

const placementOf = (view: LoadView, id: string) => view.packages.find((one) => one.packageId === id)?.placement;
const place = (packageId: string, placement: Placement): LoadEdit => ({ edit: 'place', packageId, placement });

describe('applyEdit', () => {
  it('puts a scanned package where it is wanted', () => {
    expect(placementOf(after(load, place('loose', inSlot('rs-1', 3, 'right'))), 'loose')).toEqual(
      inSlot('rs-1', 3, 'right'),
    );
  });

  it('takes what is merely wrong, for the rules to find', () => {
    const wrong: LoadEdit[] = [
      place('loose', inSlot('rs-1', 1)),
      place('loose', inSlot('rs-1', 99)),
      place('loose', onShelf(lowerShelf, -40, 2000)),
      { edit: 'set-pose', packageId: 'base', pose: 'on-edge' },
    ];
    for (const edit of wrong) expect(applyEdit(load, edit).ok, edit.edit).toBe(true);
  });

  const refused: readonly [string, LoadEdit, EditRefusal][] = [
    ['an unknown package', place('nobody', onShelf(lowerShelf, 0, 0)), 'load.package-not-here'],
    ['an unknown package to be taken off', { edit: 'take-off', packageId: 'nobody' }, 'load.package-not-here'],
    ['a package that is not scanned', place('t1', onShelf(lowerShelf, 0, 0)), 'load.package-not-scanned'],
    [
      'a shelf of another cart',
      place('loose', { ...onShelf(lowerShelf, 0, 0), shelfId: 'x' } as Placement),
      'load.shelf-not-here',
    ],
    ['a holder that is not on the cart', place('loose', inSlot('rm-9', 1)), 'load.holder-not-here'],
    ['slot 0', place('loose', inSlot('rs-1', 0)), 'load.no-such-slot'],
    ['half a slot', place('loose', inSlot('rs-1', 1.5)), 'load.no-such-slot'],
    ['a place loose in a rack', place('loose', inBasket('rs-1', 0, 0)), 'load.not-a-basket'],
    ['a basket that is not on the cart', place('loose', inBasket('tb-9', 0, 0)), 'load.holder-not-here'],
    ['a package on itself', place('base', onTopOf('base', 0, 0)), 'load.stands-on-itself'],
    ['a base on what it carries', place('base', onTopOf('top', 0, 0)), 'load.stands-on-itself'],
    ['a package on one that is not here', place('loose', onTopOf('nobody', 0, 0)), 'load.package-not-here'],
    ['a package on one without a place', place('base', onTopOf('loose', 0, 0)), 'load.nothing-to-stand-on'],
    ['the paper side of a container', { edit: 'turn-paper', packageId: 'base', paper: 'up' }, 'load.no-paper-side'],
    ['paper up on edge', { edit: 'turn-paper', packageId: 'p1', paper: 'up' }, 'load.paper-side-not-possible'],
    ['turning what has no place', { edit: 'turn-paper', packageId: 'loose', paper: 'left' }, 'load.package-not-placed'],
    ['a pose for what has no place', { edit: 'set-pose', packageId: 'loose', pose: 'flat' }, 'load.package-not-placed'],
    ['taking off a holder that is not on', { edit: 'take-holder-off', holderId: 'rm-9' }, 'load.holder-not-here'],
    [
      'placing a holder nobody knows',
      { edit: 'place-holder', holderId: 'rm-9', shelfId: lowerShelf.id, xMm: mm(0), yMm: mm(0), turn: 0 },
      'load.holder-not-here',
    ],
    [
      'a holder on a shelf of another cart',
      { edit: 'place-holder', holderId: 'rs-1', shelfId: 'x', xMm: mm(0), yMm: mm(0), turn: 0 },
      'load.shelf-not-here',
    ],
    ['a program it is not qualified for', { edit: 'change-program', programId: 'p18' }, 'load.program-not-qualified'],
  ];

  it.each(refused)('refuses %s in a plain sentence', (_what, edit, code) => {
    const before = structuredClone(load);
    const result = applyEdit(load, edit);
    expect(result.ok).toBe(false);
    if (result.ok) return;
    expect(result.refusal.code).toBe(code);
    expect(result.refusal.sentence).toMatch(/^[A-Z].*\.$/);
    expect(load).toEqual(before);
  });

  it('carries a stack with its base, to another shelf too', () => {
    const moved = after(load, place('base', onShelf(upperShelf, 130, 300)));
    expect(placementOf(moved, 'middle')).toEqual(onTopOf('base', 150, 350));
    expect(placementOf(moved, 'top')).toEqual(onTopOf('middle', 150, 350));
  });

  it('turns a stack as one piece with its base, and back again to where it was', () => {
    // By hand: the base is 280 x 580 at (100, 100). The package on it is 200 x 300 and stands 20 from its left side and
    // 50 from its front. Turned to the left, the front side of the base becomes its right side: 580 - 50 - 300 = 230 from
    // the left, and 20 from the front.
    const turned = after(load, place('base', onShelf(lowerShelf, 100, 100, { turn: 90 })));
    expect(placementOf(turned, 'middle')).toEqual(onTopOf('base', 330, 120, 90));
    expect(placementOf(turned, 'top')).toEqual(onTopOf('middle', 330, 120, 90));
    const back = after(turned, place('base', onShelf(lowerShelf, 100, 100)));
    expect(back.packages).toEqual(load.packages);
  });

  it('leaves what stood on a package without a place when its base goes into a holder', () => {
    const moved = after(load, place('base', inBasket('tb-1', 0, 0)));
    expect([placementOf(moved, 'middle'), placementOf(moved, 'top')]).toEqual([null, null]);
    expect(moved.packages).toHaveLength(load.packages.length);
  });

  it('takes a package off the load, and leaves what stood on it scanned and without a place', () => {
    const off = after(load, { edit: 'take-off', packageId: 'middle' });
    expect(off.packages.map((one) => one.packageId)).toEqual(['base', 'top', 'p1', 'p2', 'loose', 't1']);
    expect(off.packages.find((one) => one.packageId === 'top')).toMatchObject({ isScanned: true, placement: null });
  });

  it('takes a package off the list that was never scanned', () => {
    expect(placementOf(after(load, { edit: 'take-off', packageId: 't1' }), 't1')).toBeUndefined();
  });

  it('leaves the pouches of a holder without a place when it is taken off', () => {
    const off = after(load, { edit: 'take-holder-off', holderId: 'rs-1' });
    expect(off.holders.map((holder) => holder.holderId)).toEqual(['tb-1']);
    expect([placementOf(off, 'p1'), placementOf(off, 'p2')]).toEqual([null, null]);
  });

  it('moves a holder with what is in it', () => {
    const edit: LoadEdit = {
      edit: 'place-holder',
      holderId: 'rs-1',
      shelfId: lowerShelf.id,
      xMm: mm(9),
      yMm: mm(9),
      turn: 90,
    };
    const moved = after(load, edit);
    expect(moved.holders[0]).toMatchObject({ holderId: 'rs-1', shelfId: lowerShelf.id, xMm: 9, yMm: 9, turn: 90 });
    expect(placementOf(moved, 'p1')).toEqual(inSlot('rs-1', 1));
    expect(affectedShelves(load, moved)).toEqual([lowerShelf.id, upperShelf.id]);
  });

  it('puts a spare holder on the cart when it is told of it', () => {
    const spare = { holderId: 'rm-9', name: 'RM-9', placeCode: 'H-RM-9', kindId: mediumRack.id };
    const edit: LoadEdit = {
      edit: 'place-holder',
      holderId: 'rm-9',
      shelfId: lowerShelf.id,
      xMm: mm(9),
      yMm: mm(9),
      turn: 0,
    };
    const result = applyEdit(load, edit, [spare]);
    expect(result.ok && result.value.holders.at(-1)).toEqual({
      ...spare,
      shelfId: lowerShelf.id,
      xMm: 9,
      yMm: 9,
      turn: 0,
    });
  });

  it('lays a pouch down and stands it up again with its paper side where it was', () => {
    const flat = after(load, { edit: 'set-pose', packageId: 'p1', pose: 'flat' });
    expect(placementOf(flat, 'p1')).toMatchObject({ pose: 'flat', paper: 'up' });
    expect(placementOf(after(flat, { edit: 'set-pose', packageId: 'p1', pose: 'on-edge' }), 'p1')).toEqual(
      inSlot('rs-1', 1),
    );
  });

  it('turns the paper side of a pouch', () => {
    const turned = after(load, { edit: 'turn-paper', packageId: 'p1', paper: 'right' });
    expect(placementOf(turned, 'p1')).toEqual(inSlot('rs-1', 1, 'right'));
  });

  it('keeps no paper side for a thing that has none', () => {
    const placed = after(load, place('base', onShelf(lowerShelf, 100, 100, { paper: 'up' })));
    expect(placementOf(placed, 'base')).toEqual(onShelf(lowerShelf, 100, 100));
  });

  it('changes to another program the sterilizer is qualified for', () => {
    expect(after(load, { edit: 'change-program', programId: longDrying.id }).program).toEqual(longDrying);
  });

  it('drops the counts of the shelves it changed, and only those', () => {
    expect(after(load, { edit: 'take-off', packageId: 'p1' }).counts).toEqual([{ shelfId: lowerShelf.id, counted: 3 }]);
    expect(after(load, place('p1', inSlot('rs-1', 8))).counts).toEqual(load.counts);
    expect(after(load, place('p1', onShelf(lowerShelf, 20, 20))).counts).toEqual([]);
    expect(after(load, { edit: 'take-off', packageId: 't1' }).counts).toEqual(load.counts);
  });
});

describe('applyEdits', () => {
  it('applies all or nothing', () => {
    const before = structuredClone(load);
    const result = applyEdits(load, [place('loose', inSlot('rs-1', 3)), place('nobody', inSlot('rs-1', 4))]);
    expect(!result.ok && result.refusal.code).toBe('load.package-not-here');
    expect(load).toEqual(before);
  });

  it('keeps the counts of a shelf that holds the same packages at the end as at the start', () => {
    const there = place('p1', onShelf(lowerShelf, 20, 20));
    const andBack = place('p1', inSlot('rs-1', 1));
    expect(after(load, there, andBack)).toEqual(load);
    expect(after(load, andBack, there).counts).toEqual([]);
  });

  it('never loses a package, whatever is done: only what is taken off is gone', () => {
    fc.assert(
      fc.property(aLoad, fc.array(anEdit, { maxLength: 12 }), (view, edits) => {
        const frozen = structuredClone(view);
        let now = view;
        const takenOff = new Set<string>();
        for (const edit of edits) {
          const result = applyEdit(now, edit);
          if (!result.ok) continue;
          if (edit.edit === 'take-off') takenOff.add(edit.packageId);
          now = result.value;
        }
        const ids = (load: LoadView) => load.packages.map((one) => one.packageId).sort();
        expect(ids(now)).toEqual(ids(view).filter((id) => !takenOff.has(id)));
        for (const one of now.packages) {
          const was = view.packages.find((each) => each.packageId === one.packageId);
          expect({ ...one, placement: null }).toEqual({ ...was, placement: null });
        }
        expect(view).toEqual(frozen);
      }),
    );
  });

  it('never leaves a package standing on one that has no place or is not there', () => {
    fc.assert(
      fc.property(aLoad, fc.array(anEdit, { maxLength: 12 }), (view, edits) => {
        let now = view;
        for (const edit of edits) {
          const result = applyEdit(now, edit);
          if (result.ok) now = result.value;
        }
        for (const one of now.packages) {
          if (one.placement?.at !== 'package') continue;
          const { belowPackageId } = one.placement;
          expect(now.packages.find((each) => each.packageId === belowPackageId)?.placement).toBeTruthy();
        }
      }),
    );
  });
});
