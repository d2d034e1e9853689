import type { Lesson } from '../lesson';
import { drillTray, lower, smallTray } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const tray = onShelf(smallTray, lower, 40, 140);

export const overlapLesson: Lesson = {
  family: 'space',
  why: [
    'Two things cannot be in one place. If the map shows them so, one of two things is true.',
    'Either they are squeezed together on the cart, or the map does not show the cart.',
  ],
  lookFor: 'Compare the drawing with the shelf: same things, same order, same gaps.',
  bad: {
    view: aLoad({ packages: [tray, onShelf(drillTray, lower, 190, 180)] }),
    caption: 'The drill tray is entered partly inside the suture tray.',
  },
  good: {
    view: aLoad({ packages: [tray, onShelf(drillTray, lower, 290, 140)] }),
    caption: 'Each has its own place, on the map as on the shelf.',
  },
  pictures: [{ of: 'shelf', shelfId: lower }],
  question: {
    text: 'The map shows an overlap, but on the cart all is well. What do you do?',
    right: 'b',
    answers: {
      a: { text: 'Go on, the cart is right.', because: 'The map is what is kept and what others look at.' },
      b: { text: 'Move it on the map.', because: 'Then what is kept is what stood there.' },
      c: { text: 'Push the trays together.', because: 'Do not change a good cart to fit a wrong drawing.' },
    },
  },
};
