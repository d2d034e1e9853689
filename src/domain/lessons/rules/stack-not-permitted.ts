import type { Lesson } from '../lesson';
import { drillTray, lower, smallTray } from '../teaching/catalogue';
import { aLoad, onShelf, onTopOf } from '../teaching/load';

const tray = onShelf(smallTray, lower, 30, 130);

export const stackNotPermittedLesson: Lesson = {
  family: 'stacks',
  why: [
    'A thing on top keeps steam from what is below, and drips on it while it dries.',
    'Some makers have tested stacks and say which. Where the instructions are silent, nobody has.',
  ],
  lookFor: 'Each tray has the shelf under it, unless its instructions name what it may stand on.',
  bad: {
    view: aLoad({ packages: [tray, onTopOf('1', drillTray, 20, 130)] }),
    caption: 'The drill tray stands on a wrapped tray that its instructions do not name.',
  },
  good: {
    view: aLoad({ packages: [tray, onShelf(drillTray, lower, 290, 130)] }),
    caption: 'Both have the shelf under them.',
  },
  pictures: [{ of: 'cart' }],
  question: {
    text: 'Two trays look alike. One maker permits stacking, the other says nothing.',
    right: 'c',
    answers: {
      a: { text: 'Stack both, they look alike.', because: 'Looking alike is no test with steam.' },
      b: { text: 'Stack with the strong one below.', because: 'Strength is not the question: steam and water are.' },
      c: { text: 'Stack only what is named.', because: 'Silence means that nobody has shown it works.' },
    },
  },
};
