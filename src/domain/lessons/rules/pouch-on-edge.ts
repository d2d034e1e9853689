import type { Lesson } from '../lesson';
import { forceps, lower, scissors } from '../teaching/catalogue';
import { aLoad, aRack, inSlot, onShelf } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 40, 120)];
const standing = [inSlot(scissors, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4), inSlot(scissors, 'Rack 1', 6)];

export const pouchOnEdgeLesson: Lesson = {
  family: 'pouches',
  why: [
    'Steam goes in and water comes out through the paper side only.',
    'A pouch that lies flat shuts its paper on whatever is below or above it, and water stays on the film as in a dish.',
    'On edge, both faces are free and water runs off.',
  ],
  lookFor: 'Look along the shelf from the door: you want to see edges, not faces.',
  bad: {
    view: aLoad({
      holders,
      packages: [...standing, onShelf(forceps, lower, 400, 140, { pose: 'flat', paper: 'down' })],
    }),
    caption: 'One pouch lies flat beside the rack.',
  },
  good: {
    view: aLoad({ holders, packages: [...standing, inSlot(forceps, 'Rack 1', 8)] }),
    caption: 'It stands in the last free slot, on edge like the rest.',
  },
  pictures: [{ of: 'shelf', shelfId: lower }],
  question: {
    text: 'Every slot is taken and one pouch is left. What do you do?',
    right: 'b',
    answers: {
      a: { text: 'Lay it on top of the rack.', because: 'There it shuts the pouches below it off, and itself too.' },
      b: { text: 'Keep it for the next load.', because: 'It waits a while. Nothing gets wet because of it.' },
      c: {
        text: 'Lay it flat with the paper down.',
        because: 'Paper down on the shelf, it can neither take steam nor dry.',
      },
    },
  },
};
