import { kg, mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, aShelf, inSlot, onLower, onShelf, onTopOf, onUpper } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rule = 'metal-over-textile';
/** 180 mm across and 380 mm deep, standing on edge. */
const linen = aLoad().withPackage('W-12', onLower(0, 0));

describe('metal stays below textiles', () => {
  it('says nothing of metal lower, beside, or above only something else', () => {
    expect(titlesOf(rule, aLoad().withPackage('W-12', onUpper(0, 0)).withPackage('C-08', onLower(0, 0)))).toEqual([]);
    expect(titlesOf(rule, linen.withPackage('C-08', onLower(205, 0)))).toEqual([]);
    expect(titlesOf(rule, linen.withPackage('C-08', onUpper(180, 0)))).toEqual([]);
    expect(titlesOf(rule, linen.withPackage('W-03', onUpper(0, 380)))).toEqual([]);
  });

  it('finds metal on the shelf above it, in one finding for the textile pack', () => {
    const load = linen.withPackage('C-08', onUpper(170, 0)).withPackage('W-03', onUpper(0, 370, { turn: 90 }));
    expect(findingsOf(rule, load)).toMatchObject([
      {
        severity: 'stop',
        title: 'Drape pack reusable is below metal: Total knee tray 1 and D&C set',
        places: [
          { on: 'package', packageId: 'W-12' },
          { on: 'package', packageId: 'C-08' },
          { on: 'package', packageId: 'W-03' },
        ],
      },
    ]);
  });

  it('finds metal standing on it, directly or on something else', () => {
    expect(titlesOf(rule, linen.withPackage('W-08', onTopOf('W-12', 0, 0)))).toHaveLength(1);
    const between = linen
      .withItemChanged('W-11', { metalMassKg: kg(0) })
      .withPackage('W-11', onTopOf('W-12', 0, 0))
      .withPackage('W-08', onTopOf('W-11', 0, 0));
    expect(titlesOf(rule, between)).toEqual(['Drape pack reusable is below metal: Laceration tray']);
  });

  it('lets so little metal pass as the house lets', () => {
    const rack = linen.withHolder('RM-1', 'RM', { x: 0, y: 0 }).withPackage('P-13', inSlot('RM-1', 2));
    expect(titlesOf(rule, rack)).toEqual([]);
    expect(titlesOf(rule, rack, { metalOverTextileKg: kg(0.3) })).toHaveLength(1);
    expect(titlesOf(rule, rack.withItemChanged('P-13', { metalMassKg: kg(0) }), { metalOverTextileKg: kg(0) })).toEqual(
      [],
    );
  });

  it('another textile pack above it is no metal', () => {
    expect(titlesOf(rule, linen.withPackage('W-12', onUpper(0, 0)))).toEqual([]);
  });

  it('takes shelves of different widths to stand centred over each other', () => {
    const { cart } = aLoad().build();
    const narrow = aShelf('upper', 2, 270, { widthMm: mm(360) });
    const shelves = cart.shelves.map((shelf) => (shelf.id === 'upper' ? narrow : shelf));
    // The narrow shelf starts 100 mm further in: x = 90 there is x = 190 below, past the linen's 180.
    const at = (x: number) =>
      aLoad()
        .with({ cart: { ...cart, shelves } })
        .withPackage('W-12', onLower(0, 0))
        .withPackage('W-08', onShelf('upper', x, 0));
    expect(titlesOf(rule, at(90))).toEqual([]);
    expect(titlesOf(rule, at(70))).toHaveLength(1);
  });

  it('puts the textile pack above the metal', () => {
    expect(fixesOf(rule, linen.withPackage('C-08', onUpper(0, 0)))).toEqual([
      'Move Drape pack reusable to Lower shelf, right, at the door',
    ]);
  });
});
