import type { Lesson } from '../lesson';
import { lower, retractor, scissors, wideRack } from '../teaching/catalogue';
import { aLoad, aRack, inSlot } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 20, 110), aRack('Rack 2', lower, 310, 90, wideRack)];
const standing = [inSlot(scissors, 'Rack 1', 1), inSlot(scissors, 'Rack 1', 3), inSlot(scissors, 'Rack 1', 5)];

export const holderFitsLesson: Lesson = {
  family: 'pouches',
  why: [
    'A holder is made for pouches up to a height, a length and a thickness.',
    'One that is too big is bent or squeezed in it, or tips out of it over the others.',
  ],
  lookFor: 'The holder reaches well up the pouch, and the pouch slides in without being pressed.',
  bad: {
    view: aLoad({ holders, packages: [...standing, inSlot(retractor, 'Rack 1', 8)] }),
    caption: 'The tall pouch stands in the small rack and rises far above it.',
  },
  good: {
    view: aLoad({ holders, packages: [...standing, inSlot(retractor, 'Rack 2', 2)] }),
    caption: 'It stands in the rack with wide slots, which is made for its size.',
  },
  pictures: [{ of: 'cart' }],
  question: {
    text: 'A pouch goes into a slot only if you push. What does that tell you?',
    right: 'a',
    answers: {
      a: {
        text: 'It belongs in a wider holder.',
        because: 'Pressed between wires its paper is shut and its seal strained.',
      },
      b: { text: 'It is held well.', because: 'Held is not squeezed: where the wires press, no steam gets in.' },
      c: { text: 'It should lie flat instead.', because: 'Flat, it neither takes steam well nor dries.' },
    },
  },
};
