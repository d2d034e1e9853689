import type { Lesson } from '../lesson';
import { basicSet, lower, smallTray } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const set = onShelf(basicSet, lower, 20, 60);

export const trayFlatLesson: Lesson = {
  family: 'poses',
  why: [
    'On its side a tray’s instruments slide into one heap, and steam does not get through a heap.',
    'They may also pierce the wrap from inside.',
    'Flat, they lie as they were laid, and water leaves through the holes below.',
  ],
  lookFor: 'Trays and containers lie parallel to the shelf.',
  bad: {
    view: aLoad({ packages: [set, onShelf(smallTray, lower, 380, 120, { pose: 'on-edge' })] }),
    caption: 'The wrapped tray stands on edge to save room.',
  },
  good: {
    view: aLoad({ packages: [set, onShelf(smallTray, lower, 340, 120)] }),
    caption: 'It lies flat, and the shelf has room for it.',
  },
  pictures: [{ of: 'cart' }],
  question: {
    text: 'A wrapped tray does not fit flat any more. What now?',
    right: 'b',
    answers: {
      a: { text: 'Stand it up, as pouches do.', because: 'Pouches are flat things; a tray’s contents slide.' },
      b: { text: 'Another shelf, or another load.', because: 'Flat with room around it, it comes out dry.' },
      c: { text: 'Tilt it against the set.', because: 'Tilted, its contents slide and it leans on the set.' },
    },
  },
};
