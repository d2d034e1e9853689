import type { Lesson } from '../lesson';
import { boneScrews, challengeDevice, lower, scissors, upper } from '../teaching/catalogue';
import { aLoad, aRack, inSlot, onShelf } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 170, 230)];
const pouches = [inSlot(boneScrews, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4), inSlot(scissors, 'Rack 1', 6)];

export const challengeDevicePlacedLesson: Lesson = {
  family: 'proof',
  why: [
    'The challenge device carries the indicators that speak for the whole load.',
    'They can do so only from the place that is hardest to sterilize: often low, over the drain.',
    'Your sterilizer’s qualification names the place.',
  ],
  lookFor: 'With an implant on the cart, the device stands on the lowest shelf over the drain.',
  bad: {
    view: aLoad({ holders, packages: [...pouches, onShelf(challengeDevice, upper, 230, 200)] }),
    caption: 'The device stands on the upper shelf, the easiest place to reach.',
  },
  good: {
    view: aLoad({ holders, packages: [...pouches, onShelf(challengeDevice, lower, 230, 10)] }),
    caption: 'It stands below, over the drain.',
  },
  pictures: [{ of: 'cart' }],
  question: {
    text: 'A device on the top shelf passed. What does that show about the lower shelf?',
    right: 'a',
    answers: {
      a: { text: 'Little.', because: 'Above it is easier; below, air may have stayed.' },
      b: { text: 'That it was fine too.', because: 'Only the hardest place speaks for the others.' },
      c: { text: 'That the lower shelf was hotter.', because: 'Where air stays it is cooler, and that is below.' },
    },
  },
};
