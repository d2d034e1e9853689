import { kilogramsPerMinute } from '../../units/quantity';
import type { Lesson } from '../lesson';
import { basicSet, dry20, dry40, lower, upper } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const packages = [
  onShelf(basicSet, lower, 10, 70),
  onShelf(basicSet, lower, 300, 70),
  onShelf(basicSet, upper, 10, 70),
  onShelf(basicSet, upper, 300, 70),
];

export const waterLesson: Lesson = {
  family: 'mass-and-water',
  why: [
    'To heat metal, steam turns to water on it. How much can be reckoned from the metal’s mass.',
    'The drying has to take this water away again. If it is too short, packages come out wet.',
    'What a minute of drying removes, your department learns from its own loads.',
  ],
  lookFor: 'Much metal and a short drying time on the same load card.',
  bad: {
    view: aLoad({ packages, changes: { program: dry20 } }),
    caption: 'Four sets of metal with 20 minutes of drying.',
  },
  good: {
    view: aLoad({ packages, changes: { program: dry40 } }),
    caption: 'The same four sets with 40 minutes.',
  },
  pictures: [{ of: 'cart' }, { of: 'card', card: { shows: 'program' } }],
  policy: { waterPerDryMinute: kilogramsPerMinute(0.02) },
  question: {
    text: 'Which load makes the most water?',
    right: 'a',
    answers: {
      a: { text: 'The one with the most metal.', because: 'Steam gives its heat to metal and becomes water there.' },
      b: { text: 'The one with the most packages.', because: 'Forty light pouches may hold less metal than two sets.' },
      c: { text: 'The one with the longest exposure.', because: 'Once the metal is hot, hardly any more water forms.' },
    },
  },
};
