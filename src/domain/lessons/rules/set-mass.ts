import { kg } from '../../units/quantity';
import type { Lesson } from '../lesson';
import { basicSet, lower, named } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const heavySet = {
  ...basicSet,
  ...named('Bone set'),
  massKg: kg(12.8),
  metalMassKg: kg(11.6),
};
const halfSet = (part: 'A' | 'B') => ({
  ...basicSet,
  ...named(`Bone set ${part}`),
});

export const setMassLesson: Lesson = {
  family: 'mass-and-water',
  why: [
    'Steam turns to water on metal: more metal, more water, and it has to dry in the same time.',
    'A heavy set also hurts the back that lifts it.',
    'The limit is in the set’s instructions, or is your house rule.',
  ],
  lookFor: 'Read the mass on the count sheet, and trust your arms: heavy is a finding.',
  bad: {
    view: aLoad({ packages: [onShelf(heavySet, lower, 10, 70)] }),
    caption: 'One container holds the whole bone set.',
  },
  good: {
    view: aLoad({ packages: [onShelf(halfSet('A'), lower, 10, 70), onShelf(halfSet('B'), lower, 300, 70)] }),
    caption: 'The same instruments, in two containers.',
  },
  pictures: [
    { of: 'shelf', shelfId: lower },
    { of: 'card', card: { shows: 'masses' } },
  ],
  question: {
    text: 'A set is too heavy and surgery waits for it. What is the right call?',
    right: 'c',
    answers: {
      a: { text: 'Run it and feel for dampness.', because: 'Water inside a closed container cannot be felt.' },
      b: { text: 'Run it twice.', because: 'The second cycle makes as much water as the first.' },
      c: { text: 'Have it split into two.', because: 'Two lighter sets dry; a wet one starts again.' },
    },
  },
};
