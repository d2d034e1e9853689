import { kg, mm } from '../../units/quantity';
import type { Lesson } from '../lesson';
import { basicSet, cart, lower, named, smallTray, upper } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const tallSet = {
  ...basicSet,
  ...named('Tall set'),
  heightMm: mm(230),
  massKg: kg(8),
  metalMassKg: kg(7),
};
/** Little height below, more above. */
const changes = {
  cart: {
    ...cart,
    shelves: cart.shelves.map((shelf) => ({ ...shelf, clearHeightMm: mm(shelf.id === lower ? 190 : 290) })),
  },
};

export const headroomLesson: Lesson = {
  family: 'space',
  why: [
    'What is higher than its shelf is crushed as the cart goes in, or it lifts the shelf above.',
    'Even if it slips in, it shuts off the way of steam over its lid.',
  ],
  lookFor: 'There is air above the highest thing on every shelf.',
  bad: {
    view: aLoad({
      changes,
      packages: [onShelf(tallSet, lower, 20, 70), onShelf(smallTray, upper, 320, 140)],
    }),
    caption: 'The tall set runs into the shelf above it.',
  },
  good: {
    view: aLoad({
      changes,
      packages: [onShelf(tallSet, upper, 20, 70), onShelf(smallTray, lower, 320, 140)],
    }),
    caption: 'It stands on the shelf with more height, with air above its lid.',
  },
  pictures: [{ of: 'cart' }],
  question: {
    text: 'A set just touches the shelf above. The cart still goes in. Is that fine?',
    right: 'c',
    answers: {
      a: { text: 'Yes, it goes in.', because: 'Going in is not the same as getting steam.' },
      b: { text: 'Yes, if its filters are below.', because: 'It may be jammed and torn on the way out.' },
      c: { text: 'No, it needs air above.', because: 'Steam has to reach the lid, and the shelf must not press.' },
    },
  },
};
