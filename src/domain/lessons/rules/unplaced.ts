import type { Lesson } from '../lesson';
import { forceps, lower, scissors } from '../teaching/catalogue';
import { aLoad, aRack, inSlot, onTheTable } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 170, 120)];
const pouches = [inSlot(scissors, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4)];

export const unplacedLesson: Lesson = {
  family: 'counting',
  why: [
    'A scan without a place says that a package is somewhere.',
    'Whether it stands on edge, apart and free can only be judged where it stands.',
  ],
  lookFor: 'Nothing is left under “Still on the table” when you begin to count.',
  bad: {
    view: aLoad({ holders, packages: [...pouches, onTheTable(forceps)] }),
    caption: 'The forceps are scanned, and nobody has said where they are.',
  },
  good: {
    view: aLoad({ holders, packages: [...pouches, inSlot(forceps, 'Rack 1', 6)] }),
    caption: 'Holder scanned, then pouch: now they have a place.',
  },
  pictures: [
    { of: 'holder', holderId: 'Rack 1' },
    { of: 'card', card: { shows: 'places' } },
  ],
  question: {
    text: 'What is the quickest way to give ten pouches their places?',
    right: 'a',
    answers: {
      a: { text: 'Scan the holder, then the pouches.', because: 'Each goes into the next free slot as you fill it.' },
      b: { text: 'Scan all, and place them later.', because: 'Later you have to find each of them again.' },
      c: { text: 'Leave them without a place.', because: 'Then nothing about them can be checked.' },
    },
  },
};
