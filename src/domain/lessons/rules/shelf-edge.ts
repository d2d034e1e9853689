import { mm } from '../../units/quantity';
import type { Lesson } from '../lesson';
import { drillTray, lower, smallTray, sterilizer } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

// A wide chamber, so that the edge of the shelf alone is the matter.
const changes = { sterilizer: { ...sterilizer, chamberWidthMm: mm(760) } };
const tray = onShelf(drillTray, lower, 60, 130);

export const shelfEdgeLesson: Lesson = {
  family: 'space',
  why: [
    'What hangs over the edge scrapes the chamber or catches on the door.',
    'When the cart is pushed it tips and falls, and a wrap that fell is torn or wet.',
  ],
  lookFor: 'From above you see the rim of the shelf all the way round.',
  bad: {
    view: aLoad({ changes, packages: [tray, onShelf(smallTray, lower, 430, 140)] }),
    caption: 'The right tray hangs over the edge of the shelf.',
  },
  good: {
    view: aLoad({ changes, packages: [tray, onShelf(smallTray, lower, 330, 140)] }),
    caption: 'Both trays are wholly on the shelf.',
  },
  pictures: [{ of: 'cart' }],
  question: {
    text: 'A tray is longer than the shelf is wide. What do you try first?',
    right: 'a',
    answers: {
      a: { text: 'Turn it a quarter.', because: 'Lengthwise it lies on the shelf with its whole base.' },
      b: { text: 'Let it overhang on both sides.', because: 'Overhang on both sides meets both walls.' },
      c: { text: 'Put something heavy on it.', because: 'Nothing stands on a tray that does not permit it.' },
    },
  },
};
