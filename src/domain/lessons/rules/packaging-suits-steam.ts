import type { Lesson } from '../lesson';
import { basin, lower, smallTray } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const bare = { ...basin, packaging: 'none' as const };
const tray = onShelf(smallTray, lower, 20, 140);

export const packagingSuitsSteamLesson: Lesson = {
  family: 'cycle',
  why: [
    'What is not wrapped is no longer sterile when the door opens.',
    'It also drips on the wrapped things beside it.',
    'A pouch is for small and light things; the rest wants a wrap or a container.',
  ],
  lookFor: 'Everything on a cart of wrapped goods has a wrap, a pouch or a lid.',
  bad: {
    view: aLoad({ packages: [tray, onShelf(bare, lower, 270, 130)] }),
    caption: 'The basin has no wrap, in a program for wrapped goods.',
  },
  good: {
    view: aLoad({ packages: [tray, onShelf(basin, lower, 270, 130)] }),
    caption: 'The same basin, wrapped and tilted.',
  },
  pictures: [{ of: 'cart' }, { of: 'card', card: { shows: 'label', packageId: '2' } }],
  question: {
    text: 'Somebody needs one bare basin, soon. May it ride along with wrapped trays?',
    right: 'c',
    answers: {
      a: { text: 'Yes, on the top shelf.', because: 'From there it drips on everything below.' },
      b: { text: 'Yes, on the lowest shelf.', because: 'It drips on nobody, and still comes out unprotected.' },
      c: { text: 'No, it is wrapped first.', because: 'Only a wrap keeps it sterile after the cycle.' },
    },
  },
};
