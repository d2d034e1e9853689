import type { Lesson } from '../lesson';
import { lower, scissors, smallTray } from '../teaching/catalogue';
import { aLoad, aRack, inSlot, onShelf } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 320, 120)];
const packages = [
  onShelf(smallTray, lower, 30, 140),
  inSlot(scissors, 'Rack 1', 2),
  inSlot(scissors, 'Rack 1', 4),
  inSlot(scissors, 'Rack 1', 6),
];

export const airRemovalTestLesson: Lesson = {
  family: 'proof',
  why: [
    'Steam cannot go where air is.',
    'The air-removal test shows, in the empty chamber, that the sterilizer draws the air out.',
    'It comes before the first load of the day, and again after a repair.',
  ],
  lookFor: 'Before you push in the first cart: has somebody read the sheet, and written it down?',
  bad: {
    view: aLoad({ holders, packages, changes: { airRemoval: null } }),
    caption: 'A perfect cart, for a sterilizer that nobody has tested today.',
  },
  good: {
    view: aLoad({ holders, packages }),
    caption: 'The same cart. The test of the day has passed.',
  },
  pictures: [{ of: 'card', card: { shows: 'sterilizer' } }, { of: 'cart' }],
  question: {
    text: 'Why does the test run in an empty chamber?',
    right: 'b',
    answers: {
      a: { text: 'So that it dries faster.', because: 'Drying is not what it looks for.' },
      b: {
        text: 'So that air has only one place to gather.',
        because: 'What little air is left is then found in the test pack.',
      },
      c: { text: 'To save packages if it fails.', because: 'True, but a loaded chamber would also hide a fault.' },
    },
  },
};
