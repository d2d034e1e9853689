import type { Lesson } from '../lesson';
import { basicSet, lower, smallTray } from '../teaching/catalogue';
import { aLoad, onShelf, onTopOf } from '../teaching/load';

const set = onShelf(basicSet, lower, 20, 70);

export const lidFilterCoveredLesson: Lesson = {
  family: 'stacks',
  why: [
    'A rigid container breathes through its filters: steam in, air and water out.',
    'A tray on the lid shuts them, even one that covers only a part.',
    'Then the set inside may not be sterile, or comes out wet.',
  ],
  lookFor: 'Look down on each lid: every filter is free, also from what hangs over it.',
  bad: {
    view: aLoad({ packages: [set, onTopOf('1', smallTray, 50, 120)] }),
    caption: 'The tray may stand on this set, but here it covers the filters.',
  },
  good: {
    view: aLoad({ packages: [set, onShelf(smallTray, lower, 320, 140)] }),
    caption: 'It stands beside the set, and both filters breathe.',
  },
  pictures: [{ of: 'shelf', shelfId: lower }],
  question: {
    text: 'Half a filter is covered by a light pouch. Is that enough steam?',
    right: 'b',
    answers: {
      a: { text: 'Yes, half is open.', because: 'The set was tested with all of its filter open.' },
      b: { text: 'No, take the pouch off.', because: 'Every part of a filter has to stay open.' },
      c: { text: 'Yes, a pouch weighs nothing.', because: 'It is not the weight that shuts a filter.' },
    },
  },
};
