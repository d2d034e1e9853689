import type { Lesson } from '../lesson';
import { lower, scissors, smallTray, upper } from '../teaching/catalogue';
import { aLoad, aRack, inSlot, onShelf } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 170, 120)];
const packages = [inSlot(scissors, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4), onShelf(smallTray, upper, 190, 140)];

export const countMissingLesson: Lesson = {
  family: 'counting',
  why: [
    'Scans tell about everything that was scanned, and nothing about what was not.',
    'Only a count of what stands there finds the package that nobody scanned.',
    'So an empty shelf is counted too: zero is a number.',
  ],
  lookFor: 'Count with your finger, before you look at any number.',
  bad: {
    view: aLoad({ holders, packages, counts: [{ shelfId: lower, counted: 2 }] }),
    caption: 'The lower shelf is counted, the upper one is not.',
  },
  good: {
    view: aLoad({ holders, packages }),
    caption: 'Both shelves are counted, and the numbers agree.',
  },
  pictures: [{ of: 'cart' }, { of: 'card', card: { shows: 'counts' } }],
  question: {
    text: 'Why does the screen hide the scanned number while you count?',
    right: 'c',
    answers: {
      a: { text: 'To make it harder.', because: 'It makes the count worth something.' },
      b: { text: 'Because it may be wrong.', because: 'It is right; but who knows it stops counting there.' },
      c: { text: 'So that you count what is there.', because: 'Who knows the number tends to find that number.' },
    },
  },
};
