import type { Lesson } from '../lesson';
import { forceps, lower, scissors } from '../teaching/catalogue';
import { aLoad, aRack, but, inSlot } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 170, 120)];
const pouches = [inSlot(scissors, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4)];
const last = inSlot(forceps, 'Rack 1', 6);

export const labelKnownLesson: Lesson = {
  family: 'labels',
  why: [
    'A package is found again by its label: in storage, at the case, in a recall.',
    'One that nobody can name can be checked against no instructions, and is lost when it matters.',
  ],
  lookFor: 'Every package has a label of this department, with a code that scans.',
  bad: {
    view: aLoad({ holders, packages: [...pouches, but(last, { code: '' })] }),
    caption: 'The last pouch is on the list and has no code.',
  },
  good: {
    view: aLoad({ holders, packages: [...pouches, last] }),
    caption: 'It has been given a label of its own.',
  },
  pictures: [
    { of: 'holder', holderId: 'Rack 1' },
    { of: 'card', card: { shows: 'codes' } },
  ],
  question: {
    text: 'A pouch in the rack has no label. You know what is in it. What now?',
    right: 'b',
    answers: {
      a: { text: 'Write its name on it and go on.', because: 'A name is not one package among fifty like it.' },
      b: { text: 'Take it off and print a label.', because: 'With a code of its own it can be proved and found.' },
      c: { text: 'Scan its neighbour twice.', because: 'Then one is counted that nobody can find.' },
    },
  },
};
