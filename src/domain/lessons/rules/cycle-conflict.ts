import { seconds } from '../../units/quantity';
import type { Lesson } from '../lesson';
import { drillTray, dry20, dry40, lower, smallTray } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

/** Its instructions ask for 40 minutes of drying. */
const slowToDry = {
  ...drillTray,
  cycleNeeds: drillTray.cycleNeeds.map((need) => ({ ...need, leastDryS: seconds(2400) })),
};
const packages = [onShelf(smallTray, lower, 30, 140), onShelf(slowToDry, lower, 290, 140)];

export const cycleConflictLesson: Lesson = {
  family: 'cycle',
  why: [
    'Each item was tested with the cycles its instructions name: type, temperature, exposure, drying.',
    'One program runs for all packages on the cart, so it has to be one that every one of them permits.',
    'The longest drying that any of them asks for wins.',
  ],
  lookFor: 'The package that asks for most decides: find it before you choose the program.',
  bad: {
    view: aLoad({ packages, changes: { program: dry20 } }),
    caption: 'The drill tray asks for 40 minutes of drying; the program gives 20.',
  },
  good: {
    view: aLoad({ packages, changes: { program: dry40 } }),
    caption: 'The longer program suits both trays.',
  },
  pictures: [
    { of: 'shelf', shelfId: lower },
    { of: 'card', card: { shows: 'program' } },
  ],
  question: {
    text: 'One item permits 4 minutes, another 4 or 18. Which exposure do you choose?',
    right: 'b',
    answers: {
      a: { text: 'Eleven, in the middle.', because: 'Nobody tested eleven: settings are chosen, not mixed.' },
      b: { text: 'Four minutes.', because: 'It is the setting that both instructions name.' },
      c: { text: 'Eighteen, to be safe.', because: 'Longer can harm an item that does not name it.' },
    },
  },
};
