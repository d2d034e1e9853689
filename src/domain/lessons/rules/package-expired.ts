import type { Lesson } from '../lesson';
import { lower, scissors } from '../teaching/catalogue';
import { aLoad, aRack, but, inSlot } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 170, 120)];
const pouches = [inSlot(scissors, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4)];
const last = inSlot(scissors, 'Rack 1', 6);

export const packageExpiredLesson: Lesson = {
  family: 'labels',
  why: [
    'Paper and seals age. Up to the day on the label they are warranted to let steam in and keep germs out.',
    'After that day nobody answers for them, sterilized again or not.',
  ],
  lookFor: 'The day on the label, above all on what came from the back of a drawer.',
  bad: {
    view: aLoad({ holders, packages: [...pouches, but(last, { expiresOn: '2026-03-01' })] }),
    caption: 'It is 10 March. The last pouch expired on the first.',
  },
  good: {
    view: aLoad({ holders, packages: [...pouches, but(last, { expiresOn: '2027-03-01' })] }),
    caption: 'Packed again in a new pouch, with a new day.',
  },
  pictures: [
    { of: 'holder', holderId: 'Rack 1' },
    { of: 'card', card: { shows: 'label', packageId: '3' } },
  ],
  question: {
    text: 'A pouch expired yesterday and looks perfect. What do you do?',
    right: 'a',
    answers: {
      a: { text: 'Have it packed again.', because: 'What ages cannot be seen from outside.' },
      b: { text: 'Sterilize it as it is.', because: 'Steam does not make paper and seal young again.' },
      c: { text: 'Stick a new day on it.', because: 'The day belongs to the packaging, not to the label.' },
    },
  },
};
