import type { Lesson } from '../lesson';
import { drapes, lower, smallTray } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const tray = onShelf(smallTray, lower, 20, 120);

export const textileOnEdgeLesson: Lesson = {
  family: 'poses',
  why: [
    'Air has to fall out between the folds before steam can come in.',
    'Lying flat, the layers press each other shut. On edge the folds stand upright and stay open.',
  ],
  lookFor: 'The folds of a textile pack run up and down.',
  bad: {
    view: aLoad({ packages: [tray, onShelf(drapes, lower, 290, 100, { pose: 'flat' })] }),
    caption: 'The pack lies flat, layer on layer.',
  },
  good: {
    view: aLoad({ packages: [tray, onShelf(drapes, lower, 320, 100)] }),
    caption: 'It stands on edge, its folds upright.',
  },
  pictures: [{ of: 'cart' }],
  question: {
    text: 'A textile pack is too high on edge for the shelf. What do you do?',
    right: 'a',
    answers: {
      a: { text: 'Put it on a shelf with more height.', because: 'It keeps its folds upright and its room above.' },
      b: { text: 'Lay it flat just this once.', because: 'The layers do not know it is only once.' },
      c: { text: 'Press it in, it is soft.', because: 'Pressed folds are shut folds.' },
    },
  },
};
