import type { Lesson } from '../lesson';
import { forceps, lower, scissors } from '../teaching/catalogue';
import { aLoad, aRack, inSlot, onTheTable } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 170, 120)];
const pouches = [inSlot(scissors, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4)];

export const unscannedLesson: Lesson = {
  family: 'counting',
  why: [
    'If this load fails, every package in it has to be found before it is used.',
    'What was not scanned cannot be found: nobody knows that it was there.',
  ],
  lookFor: 'Listed and scanned show the same number, shelf by shelf.',
  bad: {
    view: aLoad({ holders, packages: [...pouches, onTheTable(forceps, { isScanned: false })] }),
    caption: 'Three on the list, two scanned. Where are the forceps?',
  },
  good: {
    view: aLoad({ holders, packages: [...pouches, inSlot(forceps, 'Rack 1', 6)] }),
    caption: 'All three are scanned and stand in the rack.',
  },
  pictures: [
    { of: 'holder', holderId: 'Rack 1' },
    { of: 'card', card: { shows: 'counts' } },
  ],
  question: {
    text: 'One package of the list is nowhere to be seen. The load is wanted now.',
    right: 'b',
    answers: {
      a: { text: 'Close it, it will turn up.', because: 'It may be on the cart unscanned, or in another load.' },
      b: { text: 'Find it, or take it off the list.', because: 'Then the list says what is really in the load.' },
      c: { text: 'Scan a spare label for it.', because: 'That proves a package that is not there.' },
    },
  },
};
