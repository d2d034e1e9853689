import { fitsHolder, freeSlots, insideOf, paperForSlot } from '#domain/load/free-slots';
import { layOut } from '#domain/load/layout';
import type { LoadView } from '#domain/load/model';
import { defaultPolicy } from '#domain/load/policy';
import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import {
  aHolder,
  aPackage,
  aView,
  basket,
  cable,
  container,
  forceps,
  inSlot,
  largeRack,
  mediumRack,
  smallRack,
  speculum,
} from '../../support/building-load';

const holders = [
  aHolder('rs-1', smallRack),
  aHolder('rs-2', smallRack, { yMm: mm(420) }),
  aHolder('rl-1', largeRack, { xMm: mm(300) }),
];

function rackIn(view: LoadView, holderId: string) {
  const layout = layOut(view);
  const holder = layout.holderOf.get(holderId);
  if (!holder) throw new Error('the example has no such holder');
  return { layout, holder };
}

const withPackages = (...packages: LoadView['packages']) => aView({ holders, packages });

describe('fitsHolder', () => {
  it('goes by the measures of the pouch on edge', () => {
    // Forceps 250 x 75 x 10; cable 400 x 200 x 25; speculum 330 x 200 x 45. Small rack takes 130 x 340 x 18, medium
    // 210 x 410 x 30, large 210 x 460 x 55 (height x length x thickness).
    expect([smallRack, mediumRack, largeRack].map((kind) => fitsHolder(forceps, kind))).toEqual([true, true, true]);
    expect([smallRack, mediumRack, largeRack].map((kind) => fitsHolder(cable, kind))).toEqual([false, true, true]);
    expect([smallRack, mediumRack, largeRack].map((kind) => fitsHolder(speculum, kind))).toEqual([false, false, true]);
  });

  it('keeps everything but pouches out of racks, and pouches out of what has no slots', () => {
    expect(fitsHolder(container, largeRack)).toBe(false);
    expect(fitsHolder(forceps, basket)).toBe(false);
  });
});

describe('freeSlots', () => {
  it('counts the slots of an empty rack from 1', () => {
    const { layout, holder } = rackIn(withPackages(), 'rs-1');
    expect(freeSlots(layout, holder, forceps, defaultPolicy)).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
  });

  it('leaves out slots that are taken, in this rack only', () => {
    const view = withPackages(
      aPackage('p1', forceps, { placement: inSlot('rs-1', 1) }),
      aPackage('p2', forceps, { placement: inSlot('rs-1', 4) }),
      aPackage('p3', forceps, { placement: inSlot('rs-2', 2) }),
    );
    const { layout, holder } = rackIn(view, 'rs-1');
    expect(freeSlots(layout, holder, forceps, defaultPolicy)).toEqual([2, 3, 5, 6, 7, 8]);
  });

  it('leaves out a slot where the gap to a neighbour would be too small', () => {
    // Large rack, pitch 70 mm. A pouch of 55 mm beside one of 55 mm leaves 15 mm; it asks for 20.
    const thick = { ...speculum, heightMm: mm(55), clearanceMm: mm(20) };
    const view = { ...withPackages(aPackage('p1', thick, { placement: inSlot('rl-1', 1) })), items: [thick] };
    const { layout, holder } = rackIn(view, 'rl-1');
    expect(freeSlots(layout, holder, thick, defaultPolicy)).toEqual([3]);
  });

  it('goes by what the neighbour asks for as well', () => {
    const shy = { ...speculum, code: 'P-99', id: 'item-shy', clearanceMm: mm(40) };
    const view = { ...withPackages(aPackage('p1', shy, { placement: inSlot('rl-1', 1) })), items: [shy] };
    const { layout, holder } = rackIn(view, 'rl-1');
    expect(freeSlots(layout, holder, speculum, defaultPolicy)).toEqual([3]);
  });
});

describe('paperForSlot', () => {
  const paperIn = (
    view: LoadView,
    holderId: string,
    slot: number,
    facing: 'one-way' | 'alternating' = 'one-way',
    item = forceps,
  ) => {
    const { layout, holder } = rackIn(view, holderId);
    const search = { layout, item, policy: { ...defaultPolicy, facing } };
    return paperForSlot(search, holder, slot);
  };
  const aPouchAt = (id: string, holderId: string, slot: number, paper: 'left' | 'right') =>
    aPackage(id, forceps, { placement: inSlot(holderId, slot, paper) });

  it('begins to the left', () => {
    expect(paperIn(withPackages(), 'rs-1', 1)).toBe('left');
    expect(paperIn(withPackages(), 'rs-1', 1, 'alternating')).toBe('left');
  });

  it('goes by the instructions of the pouch before the house rule', () => {
    const shy = { ...forceps, facing: 'alternating' } as const;
    const view = withPackages(aPouchAt('p1', 'rs-1', 1, 'left'));
    expect(paperIn(view, 'rs-1', 2, 'one-way', shy)).toBe('right');
    expect(paperIn(view, 'rs-1', 2, 'alternating', { ...forceps, facing: 'one-way' })).toBe('left');
  });

  it('goes one way with most others on the shelf, in another rack too', () => {
    const view = withPackages(
      aPouchAt('p1', 'rs-1', 1, 'right'),
      aPouchAt('p2', 'rs-1', 2, 'right'),
      aPouchAt('p3', 'rs-1', 3, 'left'),
    );
    expect(paperIn(view, 'rs-1', 4)).toBe('right');
    expect(paperIn(view, 'rs-2', 1)).toBe('right');
  });

  it('looks the same way in a rack turned by a quarter when its neighbours there do', () => {
    const turned = aHolder('rs-3', smallRack, { yMm: mm(700), turn: 90 });
    const view = { ...withPackages(aPouchAt('p1', 'rs-3', 1, 'right'), aPouchAt('p2', 'rs-1', 1, 'left')) };
    const all = { ...view, holders: [...holders, turned] };
    expect(paperIn(all, 'rs-3', 2)).toBe('right');
    expect(paperIn(all, 'rs-1', 2)).toBe('left');
  });

  it('alternates with the nearest neighbour, paper to paper and film to film', () => {
    const view = withPackages(aPouchAt('p1', 'rs-1', 4, 'right'));
    expect([2, 3, 5, 6].map((slot) => paperIn(view, 'rs-1', slot, 'alternating'))).toEqual([
      'right',
      'left',
      'left',
      'right',
    ]);
  });
});

describe('insideOf', () => {
  it('finds what stands in a holder and nothing else', () => {
    const view = withPackages(
      aPackage('p1', forceps, { placement: inSlot('rs-1', 1) }),
      aPackage('p2', forceps, { placement: inSlot('rs-2', 1) }),
    );
    expect(insideOf(layOut(view), 'rs-2').map((body) => body.packageId)).toEqual(['p2']);
  });
});
