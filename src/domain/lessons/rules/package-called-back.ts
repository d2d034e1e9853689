import type { Lesson } from '../lesson';
import { lower, scissors } from '../teaching/catalogue';
import { aLoad, aRack, but, inSlot } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 170, 120)];
const pouches = [inSlot(scissors, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4)];
const last = inSlot(scissors, 'Rack 1', 6);

export const packageCalledBackLesson: Lesson = {
  family: 'labels',
  why: [
    'In a recall every package is looked for until it is found and accounted for.',
    'One that slips into a new load is lost twice: to the recall, and to whoever opens it.',
  ],
  lookFor: 'The words “called back” after a scan. Stop there, whatever the hour.',
  bad: {
    view: aLoad({ holders, packages: [...pouches, but(last, { state: 'recalled' })] }),
    caption: 'The last pouch has been called back and is about to run again.',
  },
  good: {
    view: aLoad({ holders, packages: pouches }),
    caption: 'It went to the lead; the load goes without it.',
  },
  pictures: [
    { of: 'holder', holderId: 'Rack 1' },
    { of: 'card', card: { shows: 'states' } },
  ],
  question: {
    text: 'You find a called-back pouch among those to be sterilized. What comes first?',
    right: 'b',
    answers: {
      a: {
        text: 'Sterilize it: that makes it safe.',
        because: 'The recall asks where it was, not only whether it is clean.',
      },
      b: { text: 'Bring it to the lead.', because: 'There it is counted as found.' },
      c: { text: 'Throw it away.', because: 'Then the recall looks for it for ever.' },
    },
  },
};
