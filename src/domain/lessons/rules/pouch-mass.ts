import { kg, mm } from '../../units/quantity';
import type { Lesson } from '../lesson';
import { clamps, lower, scissors, smallTray, named } from '../teaching/catalogue';
import { aLoad, aRack, inSlot, onShelf } from '../teaching/load';

const mallet = { ...clamps, ...named('Mallet'), massKg: kg(0.9), metalMassKg: kg(0.8) };
const wrappedMallet = {
  ...smallTray,
  ...named('Mallet, wrapped'),
  lengthMm: mm(260),
  widthMm: mm(150),
  massKg: kg(1.2),
  metalMassKg: kg(1.1),
};
const holders = [aRack('Rack 1', lower, 40, 120)];
const light = [inSlot(scissors, 'Rack 1', 2), inSlot(scissors, 'Rack 1', 4)];

export const pouchMassLesson: Lesson = {
  family: 'mass-and-water',
  why: [
    'A pouch is for small, light things.',
    'A heavy one works through the paper or the seal, and its metal makes more water than a pouch lets out.',
    'How heavy is too heavy is your house rule, unless the pouch’s instructions say it.',
  ],
  lookFor: 'If the pouch sags, or its seal pulls, it is too heavy.',
  bad: {
    view: aLoad({ holders, packages: [...light, inSlot(mallet, 'Rack 1', 7)] }),
    caption: 'A mallet in a pouch, among light ones.',
  },
  good: {
    view: aLoad({ holders, packages: [...light, onShelf(wrappedMallet, lower, 360, 140)] }),
    caption: 'The mallet is wrapped on a tray, with room around it.',
  },
  pictures: [
    { of: 'shelf', shelfId: lower },
    { of: 'card', card: { shows: 'masses' } },
  ],
  question: {
    text: 'Only pouches are at hand, and the thing weighs a kilogram. What now?',
    right: 'a',
    answers: {
      a: { text: 'Have it packed another way.', because: 'A wrap or a container is made for the weight.' },
      b: { text: 'Take a bigger pouch.', because: 'A bigger pouch is no stronger, and the water is the same.' },
      c: {
        text: 'Take two pouches, one in the other.',
        because: 'Doubling has its own instructions and carries no more.',
      },
    },
  },
};
