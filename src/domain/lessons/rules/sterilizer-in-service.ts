import type { Lesson } from '../lesson';
import { lower, smallTray, sterilizer } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const packages = [onShelf(smallTray, lower, 30, 140), onShelf(smallTray, lower, 290, 140)];
const repaired = { ...sterilizer, serviceState: 'awaiting-requalification' as const };

export const sterilizerInServiceLesson: Lesson = {
  family: 'proof',
  why: [
    'After a failure or a larger repair a sterilizer may look well and still not remove air or heat evenly.',
    'Test cycles with indicators come first. Until they are all good, nothing from it may be used.',
  ],
  lookFor: 'A door that opens is not a release: look for the word of who tested it.',
  bad: {
    view: aLoad({ packages, changes: { sterilizer: repaired } }),
    caption: 'A good cart, for a sterilizer that still waits for its test cycles.',
  },
  good: {
    view: aLoad({ packages }),
    caption: 'The same cart, for one that is in service.',
  },
  pictures: [{ of: 'card', card: { shows: 'sterilizer' } }, { of: 'cart' }],
  question: {
    text: 'The pump was replaced an hour ago and the panel says ready. May you load?',
    right: 'c',
    answers: {
      a: { text: 'Yes, the panel says so.', because: 'The panel knows its pump runs, not that air comes out.' },
      b: { text: 'Yes, with an extra CI.', because: 'One CI is not the row of test cycles that is asked for.' },
      c: { text: 'No, use another one.', because: 'Its test cycles have to be done and good first.' },
    },
  },
};
