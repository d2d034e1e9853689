import type { Lesson } from '../lesson';
import { lower, scissors } from '../teaching/catalogue';
import { aLoad, aRack, but, inSlot } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 170, 120)];
const pouches = [inSlot(scissors, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4)];
const last = inSlot(scissors, 'Rack 1', 6);

export const packageStateLesson: Lesson = {
  family: 'labels',
  why: [
    'Only what is cleaned, packed and waiting belongs into the sterilizer.',
    'A package that was used, set aside or sterilized before has a way to go first: back to cleaning and packing, or to whoever holds it.',
  ],
  lookFor: 'What the scan says about the package, not how it looks.',
  bad: {
    view: aLoad({ holders, packages: [...pouches, but(last, { state: 'sterile' })] }),
    caption: 'The last pouch is sterile already and stands among those that are not.',
  },
  good: {
    view: aLoad({ holders, packages: pouches }),
    caption: 'It went to storage; the rest waits to be sterilized.',
  },
  pictures: [
    { of: 'holder', holderId: 'Rack 1' },
    { of: 'card', card: { shows: 'states' } },
  ],
  question: {
    text: 'Why not simply run a sterile package a second time?',
    right: 'c',
    answers: {
      a: { text: 'It costs steam.', because: 'That is the smallest of the reasons.' },
      b: { text: 'It would be too sterile.', because: 'There is no such thing.' },
      c: {
        text: 'Its packaging was made for one cycle.',
        because: 'Most makers say so; it is unpacked and packed anew.',
      },
    },
  },
};
