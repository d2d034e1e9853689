import { formatPackageCode } from '../../label/package-code';
import type { Lesson } from '../lesson';
import { lower, scissors } from '../teaching/catalogue';
import { aLoad, aRack, but, inSlot } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 170, 120)];
const code = formatPackageCode('pouch', 40_000_060);
const [first, second] = [but(inSlot(scissors, 'Rack 1', 2), { code }), inSlot(scissors, 'Rack 1', 5)];

export const labelOnceLesson: Lesson = {
  family: 'labels',
  why: [
    'A label stands for one package.',
    'If two carry the same one, a scan of either proves neither, and in a recall you look for one and miss the other.',
  ],
  lookFor: 'A second beep with “already on this cart” while you hold another package.',
  bad: {
    view: aLoad({ holders, packages: [first, but(second, { code })] }),
    caption: 'Two pouches with one and the same label.',
  },
  good: {
    view: aLoad({ holders, packages: [first, second] }),
    caption: 'Each has a code of its own.',
  },
  pictures: [
    { of: 'holder', holderId: 'Rack 1' },
    { of: 'card', card: { shows: 'codes' } },
  ],
  question: {
    text: 'The screen says a label is already on this cart, but the pouch is in your hand.',
    right: 'c',
    answers: {
      a: { text: 'The scanner stutters: go on.', because: 'It may. First look whether its twin stands in the rack.' },
      b: { text: 'Put it in without scanning.', because: 'Then a package rides along that nobody can prove.' },
      c: {
        text: 'Find the other, and print one anew.',
        because: 'One of the two carries a label that is not its own.',
      },
    },
  },
};
