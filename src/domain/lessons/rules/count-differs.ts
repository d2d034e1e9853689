import type { Lesson } from '../lesson';
import { lower, scissors, smallTray, upper } from '../teaching/catalogue';
import { aLoad, aRack, inSlot, onShelf } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 170, 120)];
const scanned = [inSlot(scissors, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4), onShelf(smallTray, upper, 190, 140)];

export const countDiffersLesson: Lesson = {
  family: 'counting',
  why: [
    'Three numbers have to agree: listed, scanned, counted.',
    'If you counted one more than was scanned, a package is on the cart that nobody can prove. If one less, one is not where the map says.',
  ],
  lookFor: 'When numbers differ, look at the shelf first and at the screen second.',
  bad: {
    view: aLoad({
      holders,
      packages: scanned,
      counts: [
        { shelfId: lower, counted: 3 },
        { shelfId: upper, counted: 1 },
      ],
    }),
    caption: 'Three pouches stand on the lower shelf. Two were scanned.',
  },
  good: {
    view: aLoad({ holders, packages: [...scanned, inSlot(scissors, 'Rack 1', 6)] }),
    caption: 'The third was found and scanned. Now the numbers agree.',
  },
  pictures: [{ of: 'cart' }, { of: 'card', card: { shows: 'counts' } }],
  question: {
    text: 'You count seven, the screen says six were scanned. What now?',
    right: 'a',
    answers: {
      a: { text: 'Find the one that was not scanned.', because: 'One of the seven is not proved to be in the load.' },
      b: { text: 'Count again until it is six.', because: 'Count again, yes; but believe your eyes.' },
      c: { text: 'Enter six, it is only one.', because: 'That one is the package nobody will find.' },
    },
  },
};
