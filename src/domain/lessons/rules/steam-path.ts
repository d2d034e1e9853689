import { kg, mm, percent } from '../../units/quantity';
import type { Lesson } from '../lesson';
import { drillTray, smallTray, upper, named } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const wideTray = {
  ...drillTray,
  ...named('Wide tray'),
  lengthMm: mm(540),
  widthMm: mm(272),
  massKg: kg(5),
  metalMassKg: kg(4.5),
};

export const steamPathLesson: Lesson = {
  family: 'space',
  why: [
    'Air is heavier than steam and leaves downwards, through the shelves.',
    'A shelf that is covered from edge to edge is a lid on everything below it.',
    'How much may be covered is your house rule; there is no published figure for shelves.',
  ],
  lookFor: 'Looking down, you see wires between the packages on every shelf.',
  bad: {
    view: aLoad({ packages: [onShelf(wideTray, upper, 4, 10), onShelf(wideTray, upper, 304, 10)] }),
    caption: 'Two wide trays cover almost the whole upper shelf.',
  },
  good: {
    view: aLoad({ packages: [onShelf(wideTray, upper, 4, 10), onShelf(smallTray, upper, 330, 140)] }),
    caption: 'The second wide tray waits; the shelf lets air and steam through.',
  },
  pictures: [{ of: 'shelf', shelfId: upper }],
  policy: { greatestShelfCoverPercent: percent(80) },
  question: {
    text: 'You have two wide trays and a free shelf below. Where do they go?',
    right: 'b',
    answers: {
      a: { text: 'Both above, where they dry best.', because: 'Then nothing below them gets its steam.' },
      b: { text: 'One on each shelf.', because: 'Each shelf keeps a way through.' },
      c: { text: 'Both below, out of the way.', because: 'Side by side they cover that shelf as well.' },
    },
  },
};
