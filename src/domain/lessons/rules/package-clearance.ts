import type { Lesson } from '../lesson';
import { basicSet, lower } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const set = onShelf(basicSet, lower, 10, 70);

export const packageClearanceLesson: Lesson = {
  family: 'space',
  why: [
    'Steam comes and water leaves through the gaps between packages.',
    'Where two stand close the gap stays wet, and both sides with it.',
    'How much gap is asked for stands in the instructions, or is your house rule.',
  ],
  lookFor: 'A flat hand passes between any two packages.',
  bad: {
    view: aLoad({ packages: [set, onShelf(basicSet, lower, 278, 70)] }),
    caption: 'Two sets almost touch along their whole length.',
  },
  good: {
    view: aLoad({ packages: [set, onShelf(basicSet, lower, 300, 70)] }),
    caption: 'Moved apart, they let steam pass between them.',
  },
  pictures: [{ of: 'shelf', shelfId: lower }],
  question: {
    text: 'One more set would fit if you push all of them together. Do you?',
    right: 'a',
    answers: {
      a: { text: 'No, it goes on the next load.', because: 'One set later is less than three sets wet.' },
      b: { text: 'Yes, the cycle is long enough.', because: 'Time does not help where steam cannot pass.' },
      c: { text: 'Yes, with paper between them.', because: 'Paper fills the very gap that steam needs.' },
    },
  },
};
