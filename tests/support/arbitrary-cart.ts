import type { LoadPackage, LoadView, PaperSide, Pose, Turn } from '#domain/load/model';
import fc from 'fast-check';
import { demonstrationItems } from './demonstration-items';
import { aLoad, counted, inBasket, inSlot, nowhere, onShelf, onTopOf, type Where } from './load-builder';

/* Carts as no careful person would load them, from the demonstration's items: sizes make sense, nothing else has to. */

type Thing = {
  readonly code: string;
  readonly at: 'shelf' | 'slot' | 'basket' | 'package' | 'nowhere';
  readonly shelf: string;
  readonly x: number;
  readonly y: number;
  readonly slot: number;
  readonly pick: number;
  readonly turn: Turn;
  readonly pose: Pose | null;
  readonly paper: PaperSide | null;
  readonly isScanned: boolean;
  readonly expiresOn: string | null;
};

const holderCodes = ['RS', 'RM', 'RL', 'TB'] as const;

const holder = fc.record({
  code: fc.constantFrom(...holderCodes),
  shelf: fc.constantFrom('lower', 'upper'),
  x: fc.integer({ min: -20, max: 400 }),
  y: fc.integer({ min: -20, max: 900 }),
  turn: fc.constantFrom<Turn>(0, 90),
});

const thing: fc.Arbitrary<Thing> = fc.record({
  code: fc.constantFrom(...demonstrationItems.map((item) => item.code)),
  at: fc.constantFrom('shelf', 'shelf', 'slot', 'slot', 'slot', 'basket', 'package', 'nowhere'),
  shelf: fc.constantFrom('lower', 'upper'),
  x: fc.integer({ min: -30, max: 520 }),
  y: fc.integer({ min: -30, max: 1100 }),
  slot: fc.integer({ min: 1, max: 8 }),
  pick: fc.nat({ max: 20 }),
  turn: fc.constantFrom<Turn>(0, 90),
  pose: fc.constantFrom<Pose | null>('flat', 'on-edge', 'tilted', null, null, null),
  paper: fc.constantFrom<PaperSide | null>('left', 'left', 'right', 'up', null),
  isScanned: fc.constantFrom(true, true, true, false),
  expiresOn: fc.constantFrom(null, null, '2026-03-09', '2026-03-10'),
});

/** Nothing is in a slot that its holder does not have: what a slot says nothing about has no mirror image. */
export const cart: fc.Arbitrary<LoadView> = fc
  .record({
    holders: fc.array(holder, { maxLength: 4 }),
    things: fc.array(thing, { maxLength: 14 }),
    program: fc.constantFrom('W4-20', 'W4-30', 'P18-30'),
  })
  .map(({ holders, things, program }) => {
    let load = aLoad().onProgram(program);
    holders.forEach((one, index) => {
      load = load.withHolder(`H${index}`, one.code, one);
    });
    const view = load.build();
    for (const one of things) {
      const packages = load.build().packages;
      load = load.withPackage(one.code, whereOf(one, view, packages), {
        isScanned: one.isScanned,
        expiresOn: one.expiresOn,
      });
    }
    return counted(load.build());
  });

function whereOf(one: Thing, { holders, holderKinds }: LoadView, packages: readonly LoadPackage[]): Where {
  const spot = { turn: one.turn, paper: one.paper, ...(one.pose === null ? {} : { pose: one.pose }) };
  const picked = holders[one.pick % Math.max(holders.length, 1)];
  const kind = holderKinds.find((each) => each.id === picked?.kindId);
  switch (one.at) {
    case 'slot':
      if (!picked || kind?.slots === null || kind === undefined) return nowhere;
      return inSlot(picked.holderId, ((one.slot - 1) % kind.slots) + 1, one.paper, one.pose ?? 'on-edge');
    case 'basket':
      return picked && kind?.form === 'basket' ? inBasket(picked.holderId, one.x, one.y % 250, spot) : nowhere;
    case 'package': {
      const below = packages[one.pick % Math.max(packages.length, 1)];
      return below ? onTopOf(below.packageId, one.x, one.y, spot) : nowhere;
    }
    case 'shelf':
      return onShelf(one.shelf, one.x, one.y, spot);
    case 'nowhere':
      return nowhere;
  }
}

/** The same view with every list in another order. */
export function reordered(view: LoadView): fc.Arbitrary<LoadView> {
  const shuffled = <Value>(values: readonly Value[]) =>
    fc.shuffledSubarray([...values], { minLength: values.length, maxLength: values.length });
  return fc
    .record({
      packages: shuffled(view.packages),
      holders: shuffled(view.holders),
      items: shuffled(view.items),
      holderKinds: shuffled(view.holderKinds),
      counts: shuffled(view.counts),
      qualifiedPrograms: shuffled(view.qualifiedPrograms),
      shelves: shuffled(view.cart.shelves),
    })
    .map(({ shelves, ...lists }) => ({ ...view, ...lists, cart: { ...view.cart, shelves } }));
}
