import type { CatalogueItem, Cart } from '../../load/model';
import { mm } from '../../units/quantity';
import type { Lesson } from '../lesson';
import { basicSet, cart, lower, named, upper } from '../teaching/catalogue';
import { aLoad, onShelf } from '../teaching/load';

const baseSet: CatalogueItem = {
  ...basicSet,
  ...named('Set with base filter'),
  filterZones: [{ face: 'base', xMm: mm(120), yMm: mm(50), lengthMm: mm(180), widthMm: mm(160) }],
};

const solidUpper: Cart = {
  ...cart,
  shelves: cart.shelves.map((shelf) => (shelf.id === upper ? { ...shelf, surface: 'solid' } : shelf)),
};

export const baseFilterShutLesson: Lesson = {
  family: 'stacks',
  why: [
    'Some containers have filters in the base: air leaves through them, and water drains.',
    'On a solid shelf they can lie shut, unless feet keep them clear.',
    'Whether yours has feet that do is in its instructions for use.',
  ],
  lookFor: 'Know which containers have a base filter, and put them on wire.',
  bad: {
    view: aLoad({ packages: [onShelf(baseSet, upper, 80, 70)], changes: { cart: solidUpper } }),
    caption: 'The upper shelf is a solid sheet: the base filter lies on it.',
  },
  good: {
    view: aLoad({ packages: [onShelf(baseSet, lower, 80, 70)], changes: { cart: solidUpper } }),
    caption: 'On the wire shelf air and water get out below.',
  },
  pictures: [{ of: 'cart' }],
  question: {
    text: 'A container with a base filter has to go on a solid shelf. What now?',
    right: 'a',
    answers: {
      a: {
        text: 'Look up whether its feet keep the filter clear.',
        because: 'Only its instructions for use can say so.',
      },
      b: { text: 'Turn it upside down.', because: 'Then its lid filters lie shut and its set slides about.' },
      c: { text: 'Lay a towel under it.', because: 'A towel shuts the filter as well, and holds the water.' },
    },
  },
};
