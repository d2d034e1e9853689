import type { Lesson } from '../lesson';
import { drillTray, lower, smallTray } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const borrowed = { ...drillTray, ifuReference: null };
const tray = onShelf(smallTray, lower, 30, 140);

export const ifuOnFileLesson: Lesson = {
  family: 'cycle',
  why: [
    'The instructions for use say which cycle, which position and how much room.',
    'Without them everything on this screen is a guess, and a guess is nothing to sign for.',
  ],
  lookFor: 'Loaned trays above all: has anybody entered their instructions?',
  bad: {
    view: aLoad({ packages: [tray, onShelf(borrowed, lower, 290, 140)] }),
    caption: 'The drill tray looks fine. Nobody has its instructions.',
  },
  good: {
    view: aLoad({ packages: [tray, onShelf(drillTray, lower, 290, 140)] }),
    caption: 'The same tray, with its instructions on file.',
  },
  pictures: [
    { of: 'shelf', shelfId: lower },
    { of: 'card', card: { shows: 'label', packageId: '2' } },
  ],
  question: {
    text: 'A loaned tray arrives at night without papers. What do you do?',
    right: 'a',
    answers: {
      a: { text: 'Ask the lead for its instructions.', because: 'A lead can get them, or decide and write down why.' },
      b: { text: 'Run it like our own drill tray.', because: 'It looks alike and may need another cycle.' },
      c: { text: 'Take the longest program.', because: 'Longest is not permitted, only long.' },
    },
  },
};
