import { mm } from '../../units/quantity';
import type { Lesson } from '../lesson';
import { forceps, lower, scissors } from '../teaching/catalogue';
import { aLoad, aRack, inSlot } from '../teaching/load';

const slipped = { ...forceps, heightMm: mm(10_000) };
const holders = [aRack('Rack 1', lower, 170, 120)];
const pouches = [inSlot(scissors, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4)];

export const sizeMakesNoSenseLesson: Lesson = {
  family: 'entries',
  why: [
    'Every gap, weight and figure on this screen is reckoned from sizes that somebody typed.',
    'One slipped digit, and each answer about room and water is wrong without looking wrong.',
  ],
  lookFor: 'A size no package can have: compare it with your hand.',
  bad: {
    view: aLoad({ holders, packages: [...pouches, inSlot(slipped, 'Rack 1', 6)] }),
    caption: 'The pouch of forceps is entered as ten metres high, so it cannot be drawn.',
  },
  good: {
    view: aLoad({ holders, packages: [...pouches, inSlot(forceps, 'Rack 1', 6)] }),
    caption: 'Ten millimetres: the entry is mended, the pouch is drawn.',
  },
  pictures: [
    { of: 'holder', holderId: 'Rack 1' },
    { of: 'card', card: { shows: 'size', packageId: '3' } },
  ],
  question: {
    text: 'The screen says a size cannot be. The pouch in your hand is normal. What now?',
    right: 'a',
    answers: {
      a: { text: 'Have the entry mended.', because: 'The pouch is right and its entry is not.' },
      b: { text: 'Have the pouch packed again.', because: 'Nothing is wrong with the pouch.' },
      c: { text: 'Let it stay with a reason.', because: 'A wrong size makes every check of it wrong.' },
    },
  },
};
