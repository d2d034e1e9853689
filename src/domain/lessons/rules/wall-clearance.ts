import { mm } from '../../units/quantity';
import type { Lesson } from '../lesson';
import { drillTray, lower, smallTray, sterilizer } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

// A narrow chamber: 10 mm between the shelf and each wall.
const changes = { sterilizer: { ...sterilizer, chamberWidthMm: mm(600) } };
const tray = onShelf(drillTray, lower, 300, 130);

export const wallClearanceLesson: Lesson = {
  family: 'space',
  why: [
    'The chamber walls are wet and hot: water runs down them.',
    'A wrap that touches one soaks it up or scorches, and steam cannot pass there.',
    'How much room to keep is your house rule.',
  ],
  lookFor: 'With the cart in the chamber, light passes between load and wall on both sides.',
  bad: {
    view: aLoad({ changes, packages: [onShelf(smallTray, lower, 3, 140), tray] }),
    caption: 'The left tray stands at the very edge, close to the wall.',
  },
  good: {
    view: aLoad({ changes, packages: [onShelf(smallTray, lower, 50, 140), tray] }),
    caption: 'It keeps out of the hatched strip along the wall.',
  },
  pictures: [{ of: 'shelf', shelfId: lower }],
  question: {
    text: 'After the cycle one side of a wrap is wet. Where do you look first?',
    right: 'c',
    answers: {
      a: { text: 'At the label.', because: 'The label tells what it is, not where it stood.' },
      b: { text: 'At the wrap’s age.', because: 'Old wrap may fail, but not on one side only.' },
      c: { text: 'At where it stood.', because: 'One wet side points to a wall or a neighbour.' },
    },
  },
};
