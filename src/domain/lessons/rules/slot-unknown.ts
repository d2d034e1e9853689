import type { Lesson } from '../lesson';
import { forceps, lower, scissors } from '../teaching/catalogue';
import { aLoad, aRack, inSlot } from '../teaching/load';

const holders = [aRack('Rack 1', lower, 160, 120)];
const standing = [inSlot(scissors, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4)];

export const slotUnknownLesson: Lesson = {
  family: 'entries',
  why: [
    'The drawing is only worth something if it shows the cart in front of you.',
    'A slot that the rack does not have says that the pouch is somewhere else, and nobody has judged it there.',
  ],
  lookFor: 'The code you scan is the one on the holder in your hand.',
  bad: {
    view: aLoad({ holders, packages: [...standing, inSlot(forceps, 'Rack 1', 9)] }),
    caption: 'The pouch is entered in slot 9 of a rack with eight slots, so it cannot be drawn.',
  },
  good: {
    view: aLoad({ holders, packages: [...standing, inSlot(forceps, 'Rack 1', 6)] }),
    caption: 'It is entered where it really stands.',
  },
  pictures: [
    { of: 'holder', holderId: 'Rack 1' },
    { of: 'card', card: { shows: 'places' } },
  ],
  question: {
    text: 'The screen names a slot your rack does not have. What is most likely?',
    right: 'c',
    answers: {
      a: { text: 'The pouch is lost.', because: 'It is on the cart; only its place was entered wrongly.' },
      b: { text: 'The rack has to be repaired.', because: 'Nothing is broken: the entry does not match the rack.' },
      c: { text: 'Another holder’s code was scanned.', because: 'Scan the holder it stands in, then the pouch.' },
    },
  },
};
