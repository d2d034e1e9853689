import { holderWords, paperWords, placementWords, placeWords } from '#domain/load/describe-place';
import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import {
  aHolder,
  aPackage,
  aView,
  basket,
  basin,
  container,
  drapes,
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
  holders: [aHolder('rs-1', smallRack), aHolder('tb-1', basket, { yMm: mm(600) })],
  packages: [
    aPackage('base', container, { placement: onShelf(lowerShelf, 100, 100) }),
    aPackage('top', stacker, { placement: onTopOf('base', 120, 150) }),
  ],
});

describe('placeWords', () => {
  it('names holder and slot', () => {
    expect(placeWords(load, inSlot('rs-1', 5))).toBe('Holder RS-1, slot 5');
  });

  it('says left and right as seen from the door, by the middle of the thing', () => {
    // The shelf is 560 x 1150 mm.
    expect(placeWords(load, onShelf(lowerShelf, 20, 20), forceps)).toBe('Lower shelf, left, at the door');
    expect(placeWords(load, onShelf(upperShelf, 480, 900), forceps)).toBe('Upper shelf, right, at the back');
    // Its corner is in the left third, its middle, at 240 mm, is not.
    expect(placeWords(load, onShelf(upperShelf, 150, 400), drapes)).toBe('Upper shelf, in the middle');
    expect(placeWords(load, onShelf(upperShelf, 150, 400))).toBe('Upper shelf, left, halfway in');
    expect(placeWords(load, onShelf(upperShelf, 150, 20), drapes)).toBe('Upper shelf, middle, at the door');
  });

  it('says what a stack stands on', () => {
    expect(placeWords(load, onTopOf('base', 120, 150))).toBe('Lower shelf, on top of General container set A');
    expect(placeWords(load, onTopOf('top', 120, 150))).toBe('Lower shelf, on top of Eye micro set');
  });

  it('says where in a basket', () => {
    expect(placeWords(load, inBasket('tb-1', 10, 10))).toBe('Basket TB-1, left, at the door');
  });

  it('stays readable where the place is not on this cart', () => {
    expect(placeWords(load, inSlot('rs-9', 5))).toBe('A holder that is not on this cart, slot 5');
    expect(placeWords(load, onTopOf('nobody', 0, 0))).toBe('On top of a package that is not on this load');
    expect(placeWords(load, onShelf({ ...lowerShelf, id: 'x' }, 0, 0))).toBe('On a shelf of another cart');
  });
});

describe('placementWords', () => {
  it('adds the facing of a pouch', () => {
    expect(placementWords(load, inSlot('rs-1', 5), forceps)).toBe('Holder RS-1, slot 5, paper side left');
  });

  it('adds the pose of anything that does not simply lie flat', () => {
    const tilted = onShelf(lowerShelf, 20, 20, { pose: 'tilted' });
    expect(placementWords(load, tilted, basin)).toBe('Lower shelf, middle, at the door, tilted to drain');
    expect(placementWords(load, onShelf(lowerShelf, 100, 20), container)).toBe('Lower shelf, middle, at the door');
  });
});

describe('words for holders and paper', () => {
  it('puts the kind of thing before a name that does not say it', () => {
    expect(holderWords({ name: 'RS-1' }, smallRack)).toBe('Holder RS-1');
    expect(holderWords({ name: 'Holder 2' }, smallRack)).toBe('Holder 2');
    expect(holderWords({ name: 'TB-2' }, basket)).toBe('Basket TB-2');
  });

  it('says where the paper side looks', () => {
    expect(paperWords('left')).toBe('Paper side left');
  });
});
