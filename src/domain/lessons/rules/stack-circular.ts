import type { Lesson } from '../lesson';
import { drillTray, lower, scissors } from '../teaching/catalogue';
import { aLoad, aRack, inSlot, onShelf, onTopOf } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 310, 120)];
const pouches = [inSlot(scissors, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4)];

export const stackCircularLesson: Lesson = {
  family: 'entries',
  why: [
    'A stack begins on a shelf. If A is entered on B and B on A, neither is anywhere.',
    'What has no place cannot be drawn, judged or counted.',
  ],
  lookFor: 'Scan the shelf first, then what stands on it, then what stands on that.',
  bad: {
    view: aLoad({
      holders,
      packages: [onTopOf('2', drillTray, 30, 130), onTopOf('1', drillTray, 30, 130), ...pouches],
    }),
    caption: 'Each drill tray is said to stand on the other, so neither can be drawn.',
  },
  good: {
    view: aLoad({
      holders,
      packages: [onShelf(drillTray, lower, 30, 130), onTopOf('1', drillTray, 30, 130), ...pouches],
    }),
    caption: 'One stands on the shelf and carries the other, as it may.',
  },
  pictures: [{ of: 'cart' }, { of: 'card', card: { shows: 'places' } }],
  question: {
    text: 'You changed your mind about which tray is below. What do you enter first?',
    right: 'b',
    answers: {
      a: { text: 'The upper one.', because: 'It would stand on something that has no place yet.' },
      b: { text: 'The lower one, on its shelf.', because: 'From there the stack has something to stand on.' },
      c: { text: 'Nothing, both are scanned.', because: 'Scanned is not placed: nobody knows where they are.' },
    },
  },
};
