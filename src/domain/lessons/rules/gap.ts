import type { Lesson } from '../lesson';
import { clamps, lower } from '../teaching/catalogue';
import { aLoad, aRack, inSlot } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 170, 120)];
const inSlots = (slots: readonly number[]) =>
  aLoad({ holders, packages: slots.map((slot) => inSlot(clamps, 'Rack 1', slot)) });

export const gapLesson: Lesson = {
  family: 'pouches',
  why: [
    'Thick pouches fill more than their slot and come close to their neighbours.',
    'Where two almost touch, steam cannot reach the paper between them and water cannot leave.',
  ],
  lookFor: 'You can see through between any two pouches, all the way down.',
  bad: { view: inSlots([2, 3, 6]), caption: 'Two thick pouches in slots next to each other.' },
  good: { view: inSlots([2, 4, 6]), caption: 'A free slot between them gives each its room.' },
  pictures: [{ of: 'shelf', shelfId: lower }],
  question: {
    text: 'A rack has eight slots and your pouches are thick. How many go in?',
    right: 'b',
    answers: {
      a: { text: 'Eight, one for each slot.', because: 'A slot of their own is not enough room for thick ones.' },
      b: { text: 'As many as keep their gap.', because: 'The gap is what steam needs; the slots only hold.' },
      c: { text: 'Nine, they hold each other.', because: 'What is wedged gets no steam and stays wet.' },
    },
  },
};
