import type { Lesson } from '../lesson';
import { lower, smallTray } from '../teaching/catalogue';
import { aLoad, but, onShelf } from '../teaching/load';

const [left, right] = [onShelf(smallTray, lower, 30, 140), onShelf(smallTray, lower, 290, 140)];

export const externalIndicatorLesson: Lesson = {
  family: 'proof',
  why: [
    'The external CI tells at a glance whether a package has been through the sterilizer.',
    'Without it, one that has not can end up on the sterile shelf.',
    'It shows exposure, not sterility.',
  ],
  lookFor: 'Tape or a mark on every wrap and container; on a pouch, an internal CI that shows through will do.',
  bad: {
    view: aLoad({ packages: [left, but(right, { hasExternalIndicator: false })] }),
    caption: 'The right tray looks packed. It has no external CI.',
  },
  good: {
    view: aLoad({ packages: [left, right] }),
    caption: 'Both trays carry one.',
  },
  pictures: [
    { of: 'shelf', shelfId: lower },
    { of: 'card', card: { shows: 'label', packageId: '2' } },
  ],
  question: {
    text: 'After the cycle the external CI has turned. What do you know?',
    right: 'c',
    answers: {
      a: { text: 'The contents are sterile.', because: 'It was outside: it cannot know what happened inside.' },
      b: { text: 'The exposure was long enough.', because: 'Some turn early; time is read from the cycle’s chart.' },
      c: { text: 'It has been in the sterilizer.', because: 'That is all it tells, and it is worth having.' },
    },
  },
};
