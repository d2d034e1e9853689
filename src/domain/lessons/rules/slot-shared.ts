import type { Lesson } from '../lesson';
import { lower, scissors } from '../teaching/catalogue';
import { aLoad, aRack, inSlot } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 160, 120)];
const standing = [1, 3, 5].map((slot) => inSlot(scissors, 'Rack 1', slot));

export const slotSharedLesson: Lesson = {
  family: 'pouches',
  why: [
    'Two pouches in one slot press face on face.',
    'Between them steam does not reach the paper, and what condenses there has no way out.',
  ],
  lookFor: 'Count edges along the rack: one edge to a slot.',
  bad: {
    view: aLoad({ holders, packages: [...standing, inSlot(scissors, 'Rack 1', 5)] }),
    caption: 'Slot 5 holds two pouches while others are empty.',
  },
  good: {
    view: aLoad({ holders, packages: [...standing, inSlot(scissors, 'Rack 1', 7)] }),
    caption: 'Each pouch has a slot of its own.',
  },
  pictures: [{ of: 'holder', holderId: 'Rack 1' }],
  question: {
    text: 'Two thin pouches belong to one case. May they share a slot?',
    right: 'b',
    answers: {
      a: { text: 'Yes, thin ones may.', because: 'Thin or not, the paper between them gets no steam.' },
      b: { text: 'No, a slot each, side by side.', because: 'They stay together, and steam reaches both.' },
      c: { text: 'Yes, paper against paper.', because: 'That shuts off the one side steam can use.' },
    },
  },
};
