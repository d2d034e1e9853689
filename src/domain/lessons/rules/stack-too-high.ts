import type { Lesson } from '../lesson';
import { drillTray, lower } from '../teaching/catalogue';
import { aLoad, onShelf, onTopOf } from '../teaching/load';

const two = [onShelf(drillTray, lower, 30, 130), onTopOf('1', drillTray, 30, 130)];

export const stackTooHighLesson: Lesson = {
  family: 'stacks',
  why: [
    'Makers who permit a stack tested it up to a height.',
    'Above it, the lowest tray gets the water of all the others and the least steam.',
  ],
  lookFor: 'The number of layers is the one in the instructions, or fewer.',
  bad: {
    view: aLoad({ packages: [...two, onTopOf('2', drillTray, 30, 130)] }),
    caption: 'Three drill trays stand on each other; two were tested.',
  },
  good: {
    view: aLoad({ packages: [...two, onShelf(drillTray, lower, 290, 130)] }),
    caption: 'Two are stacked as permitted, the third stands beside them.',
  },
  pictures: [{ of: 'cart' }],
  question: {
    text: 'The instructions permit two layers. There is height for four. How many?',
    right: 'a',
    answers: {
      a: { text: 'Two.', because: 'The test counts, not the height of the shelf.' },
      b: { text: 'Three, with a spacer.', because: 'A spacer helps air, but nobody tested three.' },
      c: { text: 'Four, they are light.', because: 'Light trays drip on those below as well.' },
    },
  },
};
