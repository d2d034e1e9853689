import type { Lesson } from '../lesson';
import { drillTray, lower, smallTray, upper } from '../teaching/catalogue';
import { aLoad, onShelf, withShelf } from '../teaching/load';

const changes = { cart: withShelf(upper, { isUsable: false }) };
const tray = onShelf(smallTray, lower, 30, 140);

export const shelfUsableLesson: Lesson = {
  family: 'entries',
  why: [
    'A bent or loose shelf tips what stands on it, or lets it slide against the chamber wall.',
    'Whoever took it out of use has seen why.',
  ],
  lookFor: 'Shake an empty shelf once. What rattles or leans is told to somebody.',
  bad: {
    view: aLoad({ changes, packages: [tray, onShelf(drillTray, upper, 190, 140)] }),
    caption: 'The upper shelf is out of use, and a tray stands on it.',
  },
  good: {
    view: aLoad({ changes, packages: [tray, onShelf(drillTray, lower, 290, 140)] }),
    caption: 'The tray has moved below; the upper shelf stays empty.',
  },
  pictures: [{ of: 'cart' }],
  question: {
    text: 'You notice a bent shelf while loading. What do you do?',
    right: 'b',
    answers: {
      a: { text: 'Put only light things on it.', because: 'Light things slide too.' },
      b: { text: 'Clear it and tell the lead.', because: 'Then it is taken out of use for everybody.' },
      c: { text: 'Bend it straight and go on.', because: 'It bends again, hot and loaded, inside the chamber.' },
    },
  },
};
