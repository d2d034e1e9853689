import { kg } from '../../units/quantity';
import type { Lesson } from '../lesson';
import { basicSet, cart, lower, upper, named } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const heavySet = { ...basicSet, ...named('Hip set'), massKg: kg(9.6), metalMassKg: kg(8.5) };
const changes = { cart: { ...cart, shelves: cart.shelves.map((shelf) => ({ ...shelf, greatestMassKg: kg(18) })) } };

export const shelfMassLesson: Lesson = {
  family: 'mass-and-water',
  why: [
    'A shelf is made for a mass. Above it, it bends, and what stands on it slides together.',
    'Much metal on one shelf also makes much water there, and it drips on the shelf below.',
  ],
  lookFor: 'Heavy things are spread over the shelves, and the heaviest stand low.',
  bad: {
    view: aLoad({ changes, packages: [onShelf(heavySet, upper, 10, 70), onShelf(heavySet, upper, 300, 70)] }),
    caption: 'Both hip sets are on the upper shelf, the lower one is empty.',
  },
  good: {
    view: aLoad({ changes, packages: [onShelf(heavySet, lower, 10, 70), onShelf(heavySet, upper, 300, 70)] }),
    caption: 'One on each shelf: both carry what they can.',
  },
  pictures: [{ of: 'cart' }, { of: 'card', card: { shows: 'masses' } }],
  question: {
    text: 'The upper shelf is at its limit and one set is left. Where does it go?',
    right: 'a',
    answers: {
      a: { text: 'On the lower shelf.', because: 'Each shelf carries its own limit, and low is steadier.' },
      b: { text: 'Above, in the middle.', because: 'The limit is for the shelf, wherever the set stands.' },
      c: { text: 'On top of another set.', because: 'The shelf carries it all the same, and the lid is shut.' },
    },
  },
};
