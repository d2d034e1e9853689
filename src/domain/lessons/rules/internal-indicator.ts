import type { Lesson } from '../lesson';
import { lower, smallTray } from '../teaching/catalogue';
import { aLoad, but, onShelf } from '../teaching/load';

const [left, right] = [onShelf(smallTray, lower, 30, 140), onShelf(smallTray, lower, 290, 140)];

export const internalIndicatorLesson: Lesson = {
  family: 'proof',
  why: [
    'The internal CI shows that steam came into this very package.',
    'It is read in the operating room as the package is opened. Without it, nobody there can tell.',
  ],
  lookFor: 'It goes in at packing, where steam reaches last, not on top.',
  bad: {
    view: aLoad({ packages: [left, but(right, { hasInternalIndicator: false })] }),
    caption: 'The right tray was packed without one. From outside nothing shows it.',
  },
  good: {
    view: aLoad({ packages: [left, right] }),
    caption: 'Both were packed with one.',
  },
  pictures: [
    { of: 'shelf', shelfId: lower },
    { of: 'card', card: { shows: 'label', packageId: '2' } },
  ],
  question: {
    text: 'A tray was packed without an internal CI and is already on the cart. What now?',
    right: 'a',
    answers: {
      a: {
        text: 'Take it off and have it packed again.',
        because: 'Nothing that is added later speaks for the inside.',
      },
      b: { text: 'Put a strip under the outer wrap.', because: 'That is still outside the contents.' },
      c: { text: 'Rely on the challenge device.', because: 'It speaks for the load, not for this package.' },
    },
  },
};
