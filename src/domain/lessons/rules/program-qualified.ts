import type { Lesson } from '../lesson';
import { dry20, dry40, lower, smallTray } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const packages = [onShelf(smallTray, lower, 30, 140), onShelf(smallTray, lower, 290, 140)];
const qualifiedPrograms = [dry20];

export const programQualifiedLesson: Lesson = {
  family: 'cycle',
  why: [
    'A panel offers every program its maker built in.',
    'Your department has shown for some of them that they work in this very sterilizer. Only those prove anything.',
  ],
  lookFor: 'Choose from the list on this screen, then check that the panel shows the same.',
  bad: {
    view: aLoad({ packages, changes: { program: dry40, qualifiedPrograms } }),
    caption: 'A good cart, in a program this sterilizer is not qualified for.',
  },
  good: {
    view: aLoad({ packages, changes: { program: dry20, qualifiedPrograms } }),
    caption: 'The same cart, in a program it is qualified for.',
  },
  pictures: [{ of: 'card', card: { shows: 'program' } }, { of: 'cart' }],
  question: {
    text: 'The panel has the program you need, the list here has not. Why?',
    right: 'b',
    answers: {
      a: { text: 'The list is out of date.', because: 'Ask, but do not run it before somebody has said so.' },
      b: { text: 'It was not qualified in this sterilizer.', because: 'Until it is, nothing is known about it here.' },
      c: { text: 'The panel is newer, so it is right.', because: 'A panel says what can run, not what was proven.' },
    },
  },
};
