import { filmLooks, filterRects, layOut, slotMiddle, type Body } from '#domain/load/layout';
import type { PaperSide, Turn } from '#domain/load/model';
import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import {
  aLoad,
  holderKinds,
  inBasket,
  inSlot,
  nowhere,
  onLower,
  onShelf,
  onTopOf,
  onUpper,
  type LoadBuilder,
} from '../../support/load-builder';

function bodyIn(load: LoadBuilder, packageId: string): Body {
  const body = layOut(load.build()).bodyOf.get(packageId);
  if (!body) throw new Error(`${packageId} has no place`);
  return body;
}

function boxIn(load: LoadBuilder, packageId: string): readonly number[] {
  const { left, front, bottom, right, back, top } = bodyIn(load, packageId).box;
  return [left, front, bottom, right, back, top];
}

function whyNowhere(load: LoadBuilder): readonly string[] {
  const { nowhere, bodies } = layOut(load.build());
  return [...[...nowhere].map(([id, why]) => `${id}: ${why}`), ...bodies.map((body) => `${body.packageId}: placed`)];
}

describe('where things stand, in mm from the left end of the shelf at the door', () => {
  it('on a shelf at their corner, in their pose and turn', () => {
    const load = aLoad()
      .withPackage('C-01', onLower(10, 20))
      .withPackage('W-03', onUpper(10, 20, { turn: 90 }))
      .withPackage('P-02', onUpper(300, 400, { pose: 'on-edge' }));
    expect(boxIn(load, 'C-01')).toEqual([10, 20, 0, 290, 600, 150]);
    expect(boxIn(load, 'W-03')).toEqual([10, 20, 0, 510, 280, 90]);
    expect(boxIn(load, 'P-02')).toEqual([300, 400, 0, 312, 730, 90]);
  });

  it('in a rack centred on the slot and along the holder', () => {
    // RS is 240 across with 8 slots of 28: 8 free at each side, so slot 1 is centred at 22 and slot 3 at 78.
    const rack = aLoad().withHolder('RS-1', 'RS', { x: 100, y: 200 });
    expect(boxIn(rack.withPackage('P-02', inSlot('RS-1', 1)), 'P-02')).toEqual([116, 210, 0, 128, 540, 90]);
    expect(boxIn(rack.withPackage('P-02', inSlot('RS-1', 3)), 'P-02')).toEqual([172, 210, 0, 184, 540, 90]);
    const lying = rack.withPackage('P-02', inSlot('RS-1', 3, 'up', 'flat'));
    expect(boxIn(lying, 'P-02')).toEqual([133, 210, 0, 223, 540, 12]);
  });

  it('in a rack that is turned with slot 1 nearest the door', () => {
    const rack = aLoad().withHolder('RS-1', 'RS', { x: 100, y: 200, turn: 90 });
    expect(boxIn(rack.withPackage('P-02', inSlot('RS-1', 1)), 'P-02')).toEqual([110, 216, 0, 440, 228, 90]);
    expect(boxIn(rack.withPackage('P-02', inSlot('RS-1', 8)), 'P-02')).toEqual([110, 412, 0, 440, 424, 90]);
  });

  it('in a basket by the frame of the basket, which turns with it to the left', () => {
    const at = (turn: Turn) =>
      aLoad()
        .withHolder('TB-1', 'TB', { x: 10, y: 20, turn })
        .withPackage('P-16', inBasket('TB-1', 30, 40, { pose: 'flat' }));
    expect(boxIn(at(0), 'P-16')).toEqual([40, 60, 0, 115, 260, 8]);
    // 250 along - 40 - 200 long = 10 from the left, and 30 from the door.
    expect(boxIn(at(90), 'P-16')).toEqual([20, 50, 0, 220, 125, 8]);
  });

  it('on another thing at its top, however high the stack', () => {
    const load = aLoad()
      .withPackage('C-14', onTopOf('C-15', 5, 6))
      .withPackage('C-15', onTopOf('C-01', 0, 0))
      .withPackage('C-01', onLower(0, 0));
    expect(boxIn(load, 'C-15')[2]).toBe(150);
    expect(boxIn(load, 'C-14').slice(0, 3)).toEqual([5, 6, 250]);
    expect(bodyIn(load, 'C-14').below?.below?.packageId).toBe('C-01');
  });

  it('is the same from whatever order the packages come in', () => {
    const view = aLoad()
      .withPackage('C-14', onTopOf('C-01', 0, 0))
      .withPackage('C-01', onLower(0, 0))
      .build();
    expect(layOut({ ...view, packages: [...view.packages].reverse() })).toEqual(layOut(view));
  });

  it('shelves come from the lowest up with what is on them', () => {
    const load = aLoad().withHolder('RS-1', 'RS', { x: 0, y: 0 }).withPackage('C-01', onLower(0, 0));
    const shelves = layOut(load.build()).shelves.map(({ shelf, bodies, holders }) => [
      shelf.id,
      bodies.map((body) => body.packageId),
      holders.map(({ holder }) => holder.holderId),
    ]);
    expect(shelves).toEqual([
      ['lower', ['C-01'], []],
      ['upper', [], ['RS-1']],
    ]);
  });
});

describe('where paper and film look', () => {
  const on = (turn: Turn, paper: PaperSide) =>
    bodyIn(aLoad().withPackage('P-02', onUpper(0, 0, { turn, paper })), 'P-02');

  it('left and right on edge, towards the door and away from it when turned', () => {
    expect([on(0, 'left').paperLooks, filmLooks(on(0, 'left'))]).toEqual(['left', 'right']);
    expect([on(90, 'left').paperLooks, filmLooks(on(90, 'left'))]).toEqual(['front', 'back']);
    expect([on(90, 'right').paperLooks, on(90, 'right').thinAxis]).toEqual(['back', 'y']);
  });

  it('turns with a basket: two quarters are about face', () => {
    const load = aLoad()
      .withHolder('TB-1', 'TB', { x: 0, y: 0, turn: 90 })
      .withPackage('P-16', inBasket('TB-1', 0, 0, { turn: 90, paper: 'left' }));
    expect(bodyIn(load, 'P-16').paperLooks).toBe('right');
  });

  it('up and down lying flat; unknown where it cannot be so or nobody said', () => {
    const flat = (paper: PaperSide | null) =>
      bodyIn(aLoad().withPackage('P-02', onUpper(0, 0, { pose: 'flat', paper })), 'P-02');
    expect([flat('up').paperLooks, filmLooks(flat('up'))]).toEqual(['up', 'down']);
    expect(flat('left').paperLooks).toBeNull();
    expect(filmLooks(flat(null))).toBeNull();
    expect(on(0, 'up').paperLooks).toBeNull();
    const set = bodyIn(aLoad().withPackage('W-03', onUpper(0, 0, { paper: 'left' })), 'W-03');
    expect([set.paperLooks, set.thinAxis]).toEqual([null, null]);
  });
});

describe('lid filters on the shelf', () => {
  const offCentre = aLoad().withItemChanged('C-01', {
    filterZones: [
      { face: 'lid', xMm: mm(10), yMm: mm(20), lengthMm: mm(100), widthMm: mm(50) },
      { face: 'base', xMm: mm(0), yMm: mm(0), lengthMm: mm(10), widthMm: mm(10) },
    ],
  });

  it('lie along its length: with the length across, as in the frame of the item', () => {
    const body = bodyIn(offCentre.withPackage('C-01', onLower(-10, 100, { turn: 90 })), 'C-01');
    expect(filterRects(body, 'lid')).toEqual([{ left: 0, right: 100, front: 120, back: 170 }]);
  });

  it('with the length away from the door, turned by a quarter to the left', () => {
    const body = bodyIn(offCentre.withPackage('C-01', onLower(0, 100)), 'C-01');
    // 280 wide: 280 - 20 - 50 = 210 from its left side, 10 from its near end.
    expect(filterRects(body, 'lid')).toEqual([{ left: 210, right: 260, front: 110, back: 210 }]);
    expect(filterRects(body, 'base')).toHaveLength(1);
  });

  it('are nowhere on a container that is not lying flat', () => {
    expect(
      filterRects(bodyIn(offCentre.withPackage('C-01', onLower(0, 0, { pose: 'on-edge' })), 'C-01'), 'lid'),
    ).toEqual([]);
  });
});

describe('what has no place is listed with the reason, and not drawn', () => {
  const load = aLoad().withHolder('RS-1', 'RS', { x: 0, y: 0 }).withHolder('TB-1', 'TB', { x: 0, y: 500 });

  it.each([
    ['not placed', load.withPackage('P-01', nowhere), 'not-placed'],
    ['on a shelf of another cart', load.withPackage('P-01', onShelf('no such', 0, 0)), 'shelf-not-here'],
    ['in a holder that is not on the cart', load.withPackage('P-01', inSlot('no such', 1)), 'holder-not-here'],
    ['loose in a rack', load.withPackage('P-01', inBasket('RS-1', 0, 0)), 'not-a-basket'],
    ['in a slot of a basket', load.withPackage('P-01', inSlot('TB-1', 1)), 'holder-without-slots'],
    ['in slot 9 of 8', load.withPackage('P-01', inSlot('RS-1', 9)), 'no-such-slot'],
    ['in slot 0', load.withPackage('P-01', inSlot('RS-1', 0)), 'no-such-slot'],
    ['between two slots', load.withPackage('P-01', inSlot('RS-1', 1.5)), 'no-such-slot'],
    ['on a package that is not here', load.withPackage('P-01', onTopOf('no such', 0, 0)), 'nothing-below'],
    ['at a place that is no number', load.withPackage('P-01', onLower(NaN, 0)), 'position-makes-no-sense'],
    [
      'of no size',
      load.withItemChanged('P-01', { heightMm: mm(0) }).withPackage('P-01', onLower(0, 0)),
      'size-makes-no-sense',
    ],
    ['on itself', load.withPackage('P-01', onTopOf('P-01', 0, 0)), 'circular'],
  ])('%s', (_name, one, why) => {
    expect(whyNowhere(one)).toEqual([`P-01: ${why}`]);
  });

  it('of an item that nobody knows', () => {
    const unknown = aLoad().withPackage('P-01', onLower(0, 0)).with({ items: [] });
    expect(whyNowhere(unknown)).toEqual(['P-01: item-not-known']);
  });

  it('a circle names its members, and what stands on it has no base', () => {
    const circle = aLoad()
      .withPackage('C-14', onTopOf('C-15', 0, 0))
      .withPackage('C-15', onTopOf('C-01', 0, 0))
      .withPackage('C-01', onTopOf('C-15', 0, 0))
      .withPackage('W-08', onLower(0, 0));
    expect(whyNowhere(circle)).toEqual(['C-01: circular', 'C-15: circular', 'C-14: base-is-nowhere', 'W-08: placed']);
  });

  it('a stack of ten thousand is laid out without running out of stack', () => {
    const view = aLoad().withPackage('C-14', onLower(0, 0)).build();
    const packages = view.packages.flatMap((base) =>
      Array.from({ length: 10_000 }, (_, index) => {
        const on = { xMm: mm(0), yMm: mm(0), turn: 0, pose: 'flat', paper: null } as const;
        const placement =
          index === 0 ? base.placement : ({ at: 'package', belowPackageId: `p${index - 1}`, ...on } as const);
        return { ...base, packageId: `p${index}`, placement };
      }),
    );
    expect(layOut({ ...view, packages }).bodyOf.get('p9999')?.box.bottom).toBe(9_999 * 60);
  });
});

describe('slotMiddle', () => {
  it('spreads the slots evenly about the middle of the holder', () => {
    const [small] = holderKinds;
    expect(small && [1, 4, 5, 8].map((slot) => slotMiddle(small, slot))).toEqual([22, 106, 134, 218]);
  });
});
