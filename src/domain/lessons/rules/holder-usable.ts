import type { Lesson } from '../lesson';
import { lower, rack, scissors, wideRack, named } from '../teaching/catalogue';
import { aLoad, aRack, inSlot } from '../teaching/load';

const unmeasured = { ...rack, ...named('rack nobody measured'), slots: null, pitchMm: null };
const measured = { ...unmeasured, name: 'rack with eight slots', slots: rack.slots, pitchMm: rack.pitchMm };
const holders = [aRack('Rack 1', lower, 20, 120), aRack('Rack 2', lower, 310, 120, unmeasured)];
const pouches = [inSlot(scissors, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4)];

export const holderUsableLesson: Lesson = {
  family: 'entries',
  why: [
    'To judge a gap, the screen has to know how far the slots of a rack are apart.',
    'A rack with no slots entered says nothing: what stands in it cannot be checked.',
  ],
  lookFor: 'A new rack gets its measures entered before its first load.',
  bad: {
    view: aLoad({ holders, packages: pouches, changes: { holderKinds: [rack, wideRack, unmeasured] } }),
    caption: 'Rack 2 is on the cart, and nobody has entered its slots.',
  },
  good: {
    view: aLoad({
      holders,
      packages: [...pouches, inSlot(scissors, 'Rack 2', 3)],
      changes: { holderKinds: [rack, wideRack, measured] },
    }),
    caption: 'Its eight slots are entered; pouches in it can be judged.',
  },
  pictures: [{ of: 'shelf', shelfId: lower }],
  question: {
    text: 'A new rack has arrived and has no entry yet. May you use it tonight?',
    right: 'c',
    answers: {
      a: { text: 'Yes, it looks like the old ones.', because: 'A few millimetres of pitch make the gap.' },
      b: { text: 'Yes, with half the pouches.', because: 'Even then nobody can check where they stand.' },
      c: { text: 'Not before it is measured.', because: 'A ruler and two minutes, and it can be judged.' },
    },
  },
};
