import type { Lesson } from '../lesson';
import { basin, lower, smallTray } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const tray = onShelf(smallTray, lower, 20, 120);

export const basinDrainsLesson: Lesson = {
  family: 'poses',
  why: [
    'Steam turns to water on cold metal. In a basin that stands level the water has nowhere to go.',
    'Under an upturned rim air is caught, and where air is, steam is not.',
    'Tilted or on edge, air falls out and water runs off.',
  ],
  lookFor: 'Ask of each bowl: if I poured water in, would it run out?',
  bad: {
    view: aLoad({ packages: [tray, onShelf(basin, lower, 270, 120, { pose: 'flat' })] }),
    caption: 'The basin stands level and keeps its water.',
  },
  good: {
    view: aLoad({ packages: [tray, onShelf(basin, lower, 270, 120)] }),
    caption: 'Tilted to drain, it lets air and water out.',
  },
  pictures: [{ of: 'cart' }],
  question: {
    text: 'Three basins fit into each other. How do they go in?',
    right: 'c',
    answers: {
      a: { text: 'Nested tightly, to save room.', because: 'Steam does not get between them, and they stay wet.' },
      b: { text: 'Nested, all of them level.', because: 'Level, each one keeps a puddle.' },
      c: { text: 'Apart, tilted, openings one way.', because: 'Each gets steam and drains, as the makers ask.' },
    },
  },
};
