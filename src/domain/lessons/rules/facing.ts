import type { Lesson } from '../lesson';
import { lower, scissors } from '../teaching/catalogue';
import { aLoad, aRack, inSlot } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 160, 120)];

function rackOfSix(turned: number | null) {
  const packages = [1, 2, 3, 4, 5, 6].map((slot) =>
    inSlot(scissors, 'Rack 1', slot, slot === turned ? 'right' : 'left'),
  );
  return aLoad({ holders, packages });
}

export const facingLesson: Lesson = {
  family: 'pouches',
  why: [
    'Steam passes through paper, never through film.',
    'A pouch turned among the others can shut off its own paper or its neighbour’s.',
    'Makers’ instructions differ about which way is right, so your house rule decides. These carts follow “all one way”.',
  ],
  lookFor: 'From one side you see only film, from the other only paper.',
  bad: { view: rackOfSix(4), caption: 'Slot 4 shows its paper where all others show film.' },
  good: { view: rackOfSix(null), caption: 'All six show film on the same side.' },
  pictures: [{ of: 'holder', holderId: 'Rack 1' }],
  policy: { facing: 'one-way' },
  question: {
    text: 'Your department says “all one way”. A colleague says “paper to paper”. What holds?',
    right: 'a',
    answers: {
      a: {
        text: 'The house rule, until it is changed.',
        because: 'It follows the instructions of the pouches you use.',
      },
      b: { text: 'Whoever has more years.', because: 'The pouch’s instructions decide, not the person.' },
      c: { text: 'It does not matter.', because: 'Film against paper in the wrong way closes that paper.' },
    },
  },
};
