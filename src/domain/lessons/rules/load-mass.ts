import { kg } from '../../units/quantity';
import type { Lesson } from '../lesson';
import { basicSet, dry20, dry40, lower, upper } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const limited = { ...dry20, greatestLoadMassKg: kg(16) };
const changes = { program: limited, qualifiedPrograms: [limited, dry40] };
const two = [onShelf(basicSet, lower, 10, 70), onShelf(basicSet, lower, 300, 70)];

export const loadMassLesson: Lesson = {
  family: 'mass-and-water',
  why: [
    'Your sterilizer was tested with a load up to a certain mass.',
    'More than that heats more slowly and dries less, and no one has shown how much.',
  ],
  lookFor: 'The sum of the masses stands beside the limit before you close the load.',
  bad: {
    view: aLoad({ changes, packages: [...two, onShelf(basicSet, upper, 10, 70)] }),
    caption: 'Three sets: more than this program was tested with.',
  },
  good: {
    view: aLoad({ changes, packages: two }),
    caption: 'Two sets now, the third in the next load.',
  },
  pictures: [{ of: 'cart' }, { of: 'card', card: { shows: 'masses' } }],
  question: {
    text: 'The load is two kilograms over its limit. There is still room. What holds?',
    right: 'b',
    answers: {
      a: { text: 'Room counts: it may go.', because: 'Room is for steam; mass decides heat and water.' },
      b: { text: 'The limit: something comes off.', because: 'It is the most that was shown to come out dry.' },
      c: { text: 'Add five minutes of exposure.', because: 'Exposure times are set by instructions, not by feeling.' },
    },
  },
};
