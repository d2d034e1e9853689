import { describe, expect, it } from 'vitest';
import { demonstrationHolderKinds } from '../../../seeds/demonstration-equipment-plan';
import {
  checkCart,
  checkHolderKind,
  checkPlaceCode,
  checkShelfAgainstFirst,
  checkSterilizer,
  checkSterilizerReferences,
} from '../../../src/domain/catalogue/check-equipment';
import type {
  CartFields,
  HolderKindFields,
  ShelfLine,
  SterilizerFields,
} from '../../../src/domain/catalogue/equipment-fields';
import { kg, mm } from '../../../src/domain/units/quantity';

function theRack(changes: Partial<HolderKindFields> = {}): HolderKindFields {
  const rack = demonstrationHolderKinds.find((kind) => kind.code === 'RS');
  if (!rack) throw new Error('The demonstration has no RS.');
  return { ...rack, ...changes };
}

const sterilizer: SterilizerFields = {
  code: 'ST-1',
  number: '1',
  name: 'Sterilizer 1',
  sizeClass: 'large',
  chamberWidthMm: mm(620),
  chamberDepthMm: mm(1250),
  chamberHeightMm: mm(700),
  drainXMm: mm(280),
  drainYMm: mm(90),
  greatestLoadMassKg: kg(100),
  needsAirRemovalTest: true,
  serviceState: 'in-service',
  steamLine: 'A',
  hasAirDetector: false,
  qualifiedPrograms: ['W4-20'],
  otherPrograms: ['W3-16'],
};

describe('a kind of holder', () => {
  it('may be a rack whose slots fill it to the edge', () => {
    expect(checkHolderKind(theRack({ acrossMm: mm(196) }))).toEqual([]);
  });

  it.each<[string, Partial<HolderKindFields>, string]>([
    ['a rack without slots', { slots: null }, 'slots'],
    ['a rack without pitch', { pitchMm: null }, 'pitchMm'],
    ['a rack that says nothing of thickness', { greatestThicknessMm: null }, 'greatestThicknessMm'],
    ['slots wider than the rack', { acrossMm: mm(195) }, 'acrossMm'],
    ['a pouch thicker than the pitch', { greatestThicknessMm: mm(29) }, 'greatestThicknessMm'],
    ['a basket with slots', { form: 'basket' }, 'slots'],
  ])('is refused: %s', (_what, changes, field) => {
    expect(checkHolderKind(theRack(changes)).map((problem) => problem.field)).toEqual([field]);
  });
});

describe('a sterilizer', () => {
  it('holds together', () => {
    expect(checkSterilizer(sterilizer)).toEqual([]);
  });

  it('cannot be qualified for a program and not', () => {
    expect(checkSterilizer({ ...sterilizer, otherPrograms: ['W4-20'] })).toEqual([
      { field: 'otherPrograms', sentence: 'W4-20 cannot be both qualified and not qualified.' },
    ]);
  });

  it('has its drain inside', () => {
    const problems = checkSterilizer({ ...sterilizer, drainXMm: mm(621), drainYMm: mm(-1251) });
    expect(problems.map((problem) => problem.field)).toEqual(['drainXMm', 'drainYMm']);
  });

  it('names programs that are there', () => {
    expect(checkSterilizerReferences(sterilizer, new Set(['W4-20', 'W3-16']))).toEqual([]);
    expect(checkSterilizerReferences(sterilizer, new Set(['W4-20']))).toEqual([
      { field: 'otherPrograms', sentence: 'There is no program with the code W3-16.' },
    ]);
  });
});

const shelf = {
  level: 1,
  name: 'Lower shelf',
  widthMm: mm(560),
  depthMm: mm(1150),
  clearHeightMm: mm(340),
  surface: 'wire',
  greatestMassKg: kg(60),
  isUsable: true,
} as const;

describe('a cart', () => {
  const cart: CartFields = {
    code: 'C1',
    name: 'Cart 1',
    sizeClass: 'large',
    isUsable: true,
    note: '',
    shelves: [shelf],
  };

  it('has one shelf on a level', () => {
    expect(checkCart({ ...cart, shelves: [shelf, { ...shelf, level: 2 }] })).toEqual([]);
    expect(checkCart({ ...cart, shelves: [shelf, shelf] })).toEqual([
      { field: 'shelves', sentence: 'There are two shelves on level 1.' },
    ]);
  });

  it('says the same of itself on each of its lines', () => {
    const first: ShelfLine = {
      ...shelf,
      cartCode: 'C1',
      cartName: 'Cart 1',
      sizeClass: 'large',
      isCartUsable: true,
      cartNote: '',
      placeCode: null,
    };
    expect(checkShelfAgainstFirst({ ...first, level: 2, widthMm: mm(500) }, first)).toEqual([]);
    expect(checkShelfAgainstFirst({ ...first, level: 2, cartName: 'Cart one', isCartUsable: false }, first)).toEqual([
      { field: 'cartName', sentence: 'Another line of cart C1 says something else here.' },
      { field: 'isCartUsable', sentence: 'Another line of cart C1 says something else here.' },
    ]);
  });
});

describe('a place code', () => {
  it('is nobody’s to type', () => {
    expect(checkPlaceCode({ placeCode: null }, undefined)).toEqual([]);
    expect(checkPlaceCode({ placeCode: 'H-00012-31' }, { placeCode: 'H-00012-31' })).toEqual([]);
    expect(checkPlaceCode({ placeCode: 'H-00012-31' }, undefined)[0]?.sentence).toContain('given by Paperside');
    expect(checkPlaceCode({ placeCode: 'H-00013-28' }, { placeCode: 'H-00012-31' })[0]?.sentence).toContain(
      'H-00012-31, and stays that',
    );
  });
});
