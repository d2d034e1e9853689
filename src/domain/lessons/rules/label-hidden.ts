import type { Lesson } from '../lesson';
import { forceps, lower, scissors } from '../teaching/catalogue';
import { aLoad, aRack, inSlot, onShelf } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 40, 120)];

export const labelHiddenLesson: Lesson = {
  family: 'pouches',
  why: [
    'A pouch is proved to be in the load by its label.',
    'Bunched together, labels cannot be read without pulling pouches out, and then one is missed or scanned twice.',
  ],
  lookFor: 'You can read every label from where you stand, or tip its pouch forward to read it.',
  bad: {
    view: aLoad({
      holders,
      packages: [inSlot(scissors, 'Rack 1', 2), onShelf(forceps, lower, 400, 140), onShelf(forceps, lower, 430, 140)],
    }),
    caption: 'Two loose pouches stand so close that the first label is covered.',
  },
  good: {
    view: aLoad({
      holders,
      packages: [2, 4, 6].map((slot) => inSlot(slot === 2 ? scissors : forceps, 'Rack 1', slot)),
    }),
    caption: 'In the rack each can be tipped by itself and read.',
  },
  pictures: [{ of: 'shelf', shelfId: lower }],
  alongside: ['pouch-in-holder'],
  question: {
    text: 'You cannot read a label in a bunch of pouches. What is the safe way?',
    right: 'c',
    answers: {
      a: { text: 'Count the bunch and enter the number.', because: 'A number proves no label: which ones were they?' },
      b: { text: 'Scan the front label for all.', because: 'One label stands for one pouch.' },
      c: { text: 'Give each its own slot.', because: 'Then each label can be seen and scanned once.' },
    },
  },
};
