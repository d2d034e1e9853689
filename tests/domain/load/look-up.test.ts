import { hasPaperSide, idsAbove, nameOf, shelfIdOf, shelvesUpward } from '#domain/load/look-up';
import { describe, expect, it } from 'vitest';
import {
  aHolder,
  aPackage,
  aView,
  container,
  forceps,
  inBasket,
  inSlot,
  lowerShelf,
  onShelf,
  onTopOf,
  smallRack,
  stacker,
  upperShelf,
} from '../../support/building-load';

const load = aView({
  holders: [aHolder('rs-1', smallRack)],
  packages: [
    aPackage('base', container, { placement: onShelf(lowerShelf, 100, 100) }),
    aPackage('middle', stacker, { placement: onTopOf('base', 120, 150) }),
    aPackage('top', stacker, { placement: onTopOf('middle', 120, 150) }),
    aPackage('one', stacker, { placement: onTopOf('other', 0, 0) }),
    aPackage('other', stacker, { placement: onTopOf('one', 0, 0) }),
  ],
});

describe('shelfIdOf', () => {
  it('follows holders and stacks down to their shelf', () => {
    expect(shelfIdOf(load, onShelf(lowerShelf, 0, 0))).toBe(lowerShelf.id);
    expect(shelfIdOf(load, inSlot('rs-1', 3))).toBe(upperShelf.id);
    expect(shelfIdOf(load, inBasket('rs-1', 0, 0))).toBe(upperShelf.id);
    expect(shelfIdOf(load, onTopOf('top', 0, 0))).toBe(lowerShelf.id);
  });

  it('has no answer for a thing in no place, on nothing, or in a circle', () => {
    expect(shelfIdOf(load, null)).toBeUndefined();
    expect(shelfIdOf(load, inSlot('rs-9', 1))).toBeUndefined();
    expect(shelfIdOf(load, onTopOf('nobody', 0, 0))).toBeUndefined();
    expect(shelfIdOf(load, onShelf({ ...lowerShelf, id: 'of another cart' }, 0, 0))).toBeUndefined();
    expect(shelfIdOf(load, onTopOf('one', 0, 0))).toBeUndefined();
  });
});

describe('idsAbove', () => {
  it('finds everything that stands on a package, however high', () => {
    expect([...idsAbove(load, ['base'])]).toEqual(['middle', 'top']);
    expect([...idsAbove(load, ['top'])]).toEqual([]);
  });

  it('comes to an end in a circle', () => {
    expect([...idsAbove(load, ['one'])].sort()).toEqual(['one', 'other']);
  });
});

describe('names and order', () => {
  it('falls back on the code where the catalogue entry is missing', () => {
    expect(nameOf(load, aPackage('p1', forceps))).toBe('Adson forceps pair');
    expect(nameOf({ ...load, items: [] }, aPackage('p1', forceps))).toBe('P1');
  });

  it('gives the shelves from the lowest up, whatever order they are kept in', () => {
    const cart = { ...load.cart, shelves: [upperShelf, lowerShelf] };
    expect(shelvesUpward({ ...load, cart }).map((shelf) => shelf.id)).toEqual([lowerShelf.id, upperShelf.id]);
  });

  it('knows that only a pouch has a paper side', () => {
    expect([hasPaperSide(forceps), hasPaperSide(container), hasPaperSide(undefined)]).toEqual([true, false, false]);
  });
});
