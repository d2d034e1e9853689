import { footprintOf } from '#domain/geometry/footprint';
import { layOut } from '#domain/load/layout';
import type { CatalogueItem, LoadView } from '#domain/load/model';
import { placeCandidates, type WithinPlace } from '#domain/load/place-candidates';
import { defaultPolicy } from '#domain/load/policy';
import { mm } from '#domain/units/quantity';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { aLoad } from '../../support/arbitrary-load';
import {
  aHolder,
  aPackage,
  aView,
  basket,
  challengePack,
  container,
  drapes,
  forceps,
  inBasket,
  items,
  lowerShelf,
  smallRack,
  stacker,
  tray,
  upperShelf,
} from '../../support/building-load';

function candidates(view: LoadView, item: CatalogueItem, within: WithinPlace | null = null) {
  return [...placeCandidates({ view, layout: layOut(view), policy: defaultPolicy, item, within })];
}

describe('placeCandidates', () => {
  it('offers shelves in order, lowest first for metal and highest first for textiles', () => {
    const shelfIds = (item: CatalogueItem) => [
      ...new Set(candidates(aView(), item).map(({ placement }) => placement.at === 'shelf' && placement.shelfId)),
    ];
    expect(shelfIds(container)).toEqual([lowerShelf.id, upperShelf.id]);
    expect(shelfIds(drapes)).toEqual([upperShelf.id, lowerShelf.id]);
  });

  it('packs from the door and the left, in the turn that takes least depth', () => {
    // 500 x 260 mm on a shelf of 560 mm, walls far enough: across, in the corner.
    expect(candidates(aView(), tray)[0]?.placement).toMatchObject({ xMm: 0, yMm: 0, turn: 90 });
  });

  it('offers no shelf under which a thing does not fit', () => {
    const tall = { ...tray, heightMm: mm(300) };
    expect(
      new Set(candidates(aView(), tall).map(({ placement }) => 'shelfId' in placement && placement.shelfId)),
    ).toEqual(new Set([lowerShelf.id]));
  });

  it('offers stacks after shelves, in the middle of what may carry them', () => {
    const base = aPackage('c1', container, {
      placement: { at: 'shelf', shelfId: lowerShelf.id, xMm: mm(0), yMm: mm(0), turn: 0, pose: 'flat', paper: null },
    });
    const last = candidates(aView({ packages: [base] }), stacker).filter(({ placement }) => placement.at === 'package');
    // 200 x 300 on 280 x 580: 40 from the left, 140 from the front; turned, 300 is wider than 280.
    expect(last.map(({ placement }) => placement)).toEqual([
      { at: 'package', belowPackageId: 'c1', xMm: 40, yMm: 140, turn: 0, pose: 'flat', paper: null },
    ]);
    expect(candidates(aView({ packages: [base] }), tray).every(({ placement }) => placement.at === 'shelf')).toBe(true);
  });

  it('offers a free spot in a basket when that is the place, clear of what is in it', () => {
    const view = aView({
      holders: [aHolder('tb-1', basket)],
      packages: [aPackage('d1', challengePack, { placement: inBasket('tb-1', 0, 0) })],
    });
    const [first] = candidates(view, challengePack, { kind: 'holder', holderId: 'tb-1' });
    // 130 x 130 in a basket of 480 x 250, 25 mm apart.
    expect(first?.placement).toMatchObject({ at: 'basket', holderId: 'tb-1', xMm: 155, yMm: 0 });
  });

  it('offers nothing in a holder that is not there or takes no such thing', () => {
    const view = aView({ holders: [aHolder('rs-1', smallRack)] });
    expect(candidates(view, forceps, { kind: 'holder', holderId: 'rs-9' })).toEqual([]);
    expect(candidates(view, tray, { kind: 'holder', holderId: 'rs-1' })).toEqual([]);
  });

  it('offers only spots that lie wholly on their shelf, under the next one and clear of everything on it', () => {
    fc.assert(
      fc.property(aLoad, fc.constantFrom(...items), (view, item) => {
        const layout = layOut(view);
        for (const { placement } of placeCandidates({ view, layout, policy: defaultPolicy, item, within: null })) {
          if (placement.at !== 'shelf') continue;
          const on = layout.shelves.find(({ shelf }) => shelf.id === placement.shelfId);
          if (!on) throw new Error('a shelf that is not on the cart');
          const size = footprintOf(item, placement.pose, placement.turn);
          const [right, back] = [placement.xMm + size.widthMm, placement.yMm + size.depthMm];
          expect(placement.xMm).toBeGreaterThanOrEqual(0);
          expect(placement.yMm).toBeGreaterThanOrEqual(0);
          expect(right).toBeLessThanOrEqual(on.shelf.widthMm);
          expect(back).toBeLessThanOrEqual(on.shelf.depthMm);
          expect(size.heightMm).toBeLessThanOrEqual(on.shelf.clearHeightMm);
          for (const { box } of on.bodies) {
            const isClear =
              right <= box.left || placement.xMm >= box.right || back <= box.front || placement.yMm >= box.back;
            expect(isClear).toBe(true);
          }
        }
      }),
    );
  });

  it('offers slots only to pouches and shelves only to the rest', () => {
    const view = aView({ holders: [aHolder('rs-1', smallRack, { shelfId: upperShelf.id })] });
    expect(new Set(candidates(view, forceps).map(({ placement }) => placement.at))).toEqual(new Set(['slot']));
    expect(new Set(candidates(view, tray).map(({ placement }) => placement.at))).toEqual(new Set(['shelf']));
  });
});
