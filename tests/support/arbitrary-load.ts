import type { LoadEdit } from '#domain/load/finding';
import type { LoadView, Placement } from '#domain/load/model';
import { mm } from '#domain/units/quantity';
import fc from 'fast-check';
import {
  aHolder,
  aPackage,
  aView,
  basket,
  inBasket,
  inSlot,
  items,
  longDrying,
  lowerShelf,
  mediumRack,
  onShelf,
  onTopOf,
  smallRack,
  upperShelf,
} from './building-load';

/* Loads and edits of every kind, sensible or not, over a cart that is always the same. */

const packageIds = Array.from({ length: 8 }, (_, index) => `one${index}`);
const holderIds = ['rs-1', 'rm-1', 'tb-1'];
const position = fc.integer({ min: -50, max: 1200 });
const pose = fc.constantFrom('flat', 'on-edge', 'tilted');
const paper = fc.constantFrom('left', 'right', 'up', 'down', null);
const turn = fc.constantFrom(0, 90);
const shelf = fc.constantFrom(lowerShelf, upperShelf);

const aPlacement = (belowIds: readonly string[]): fc.Arbitrary<Placement> => {
  const free = fc.record({ x: position, y: position, pose, paper, turn });
  const any: fc.Arbitrary<Placement>[] = [
    fc.tuple(shelf, free).map(([on, { x, y, ...more }]) => onShelf(on, x, y, more)),
    fc
      .tuple(fc.constantFrom(...holderIds), fc.integer({ min: 0, max: 9 }), pose, paper)
      .map(([id, slot, how, side]) => inSlot(id, slot, side, how)),
    fc.tuple(fc.constantFrom(...holderIds), position, position).map(([id, x, y]) => inBasket(id, x, y)),
  ];
  if (belowIds.length > 0) {
    any.push(
      fc.tuple(fc.constantFrom(...belowIds), position, position, turn).map(([id, x, y, how]) => onTopOf(id, x, y, how)),
    );
  }
  return fc.oneof(...any);
};

/** Packages stand only on packages before them that have a place, so that nothing hangs in the air to begin with. */
export const aLoad: fc.Arbitrary<LoadView> = fc
  .tuple(
    ...packageIds.map((packageId, index) =>
      fc.record({
        packageId: fc.constant(packageId),
        item: fc.constantFrom(...items),
        isScanned: fc.boolean(),
        placement: fc.option(aPlacement(packageIds.slice(0, index)), { nil: null }),
      }),
    ),
  )
  .map((ones) => {
    const placed = new Set<string>();
    const packages = ones.map(({ packageId, item, isScanned, placement }) => {
      const isHanging = placement?.at === 'package' && !placed.has(placement.belowPackageId);
      const isPlaced = isScanned && placement !== null && !isHanging;
      if (isPlaced) placed.add(packageId);
      return aPackage(packageId, item, { isScanned, placement: isPlaced ? placement : null });
    });
    const holders = [
      aHolder('rs-1', smallRack),
      aHolder('rm-1', mediumRack, { shelfId: lowerShelf.id }),
      aHolder('tb-1', basket, { yMm: mm(700) }),
    ];
    return aView({ holders, packages, counts: [{ shelfId: lowerShelf.id, counted: 3 }] });
  });

const packageId = fc.constantFrom(...packageIds, 'nobody');
const holderId = fc.constantFrom(...holderIds, 'rm-9');

export const anEdit: fc.Arbitrary<LoadEdit> = fc.oneof(
  {
    weight: 5,
    arbitrary: fc.record({ edit: fc.constant('place'), packageId, placement: aPlacement([...packageIds, 'nobody']) }),
  },
  fc.record({ edit: fc.constant('turn-paper'), packageId, paper: paper.map((side) => side ?? 'left') }),
  fc.record({ edit: fc.constant('set-pose'), packageId, pose }),
  fc.record({ edit: fc.constant('take-off'), packageId }),
  fc.record({
    edit: fc.constant('place-holder'),
    holderId,
    shelfId: fc.constantFrom(lowerShelf.id, upperShelf.id, 'shelf-of-another-cart'),
    xMm: position.map(mm),
    yMm: position.map(mm),
    turn,
  }),
  fc.record({ edit: fc.constant('take-holder-off'), holderId }),
  fc.record({ edit: fc.constant('change-program'), programId: fc.constantFrom(longDrying.id, 'p18') }),
);
