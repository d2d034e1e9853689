import type { Lesson } from '../lesson';
import { forceps, lower, scissors } from '../teaching/catalogue';
import { aLoad, aRack, inSlot, onShelf } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 40, 120)];
const standing = [inSlot(scissors, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4)];

export const pouchInHolderLesson: Lesson = {
  family: 'pouches',
  why: [
    'A pouch that nothing holds tips over as soon as the cart moves.',
    'Then it lies flat, or against its neighbour, and neither of them dries.',
    'A rack keeps it up from the first push to the last.',
  ],
  lookFor: 'Touch the upper edge of a pouch. If it can fall over, it wants a holder.',
  bad: {
    view: aLoad({ holders, packages: [...standing, onShelf(forceps, lower, 430, 140)] }),
    caption: 'One pouch stands by itself on the shelf. It will not stay so.',
  },
  good: {
    view: aLoad({ holders, packages: [...standing, inSlot(forceps, 'Rack 1', 6)] }),
    caption: 'The rack holds it upright on both sides.',
  },
  pictures: [{ of: 'shelf', shelfId: lower }],
  question: {
    text: 'The racks are full and two pouches are left. What helps?',
    right: 'c',
    answers: {
      a: { text: 'Lean them against the rack.', because: 'They slide down and lie against the pouches in it.' },
      b: { text: 'Put them between two sets.', because: 'Sets hold them by closing them off from steam.' },
      c: { text: 'Another rack, or the next load.', because: 'What is held stays on edge; what waits spoils nothing.' },
    },
  },
};
