import { editsWords, editWords } from '#domain/load/describe-edit';
import type { LoadEdit } from '#domain/load/finding';
import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import {
  aHolder,
  aPackage,
  aView,
  forceps,
  inSlot,
  longDrying,
  lowerShelf,
  smallRack,
} from '../../support/building-load';

const load = aView({
  holders: [aHolder('rs-1', smallRack)],
  packages: [aPackage('p1', forceps, { placement: inSlot('rs-1', 1) })],
});

const cases: readonly [LoadEdit, string, string][] = [
  [
    { edit: 'place', packageId: 'p1', placement: inSlot('rs-1', 4) },
    'Put Adson forceps pair: Holder RS-1, slot 4, paper side left',
    'Put Adson forceps pair: Holder RS-1, slot 4, paper side left',
  ],
  [
    { edit: 'turn-paper', packageId: 'p1', paper: 'right' },
    'Turn Adson forceps pair so that paper is right',
    'Turned Adson forceps pair so that paper is right',
  ],
  [{ edit: 'set-pose', packageId: 'p1', pose: 'flat' }, 'Lay Adson forceps pair flat', 'Laid Adson forceps pair flat'],
  [
    { edit: 'set-pose', packageId: 'p1', pose: 'on-edge' },
    'Stand Adson forceps pair on edge',
    'Stood Adson forceps pair on edge',
  ],
  [
    { edit: 'set-pose', packageId: 'p1', pose: 'tilted' },
    'Tilt Adson forceps pair to drain',
    'Tilted Adson forceps pair to drain',
  ],
  [
    { edit: 'take-off', packageId: 'p1' },
    'Take Adson forceps pair off the load',
    'Took Adson forceps pair off the load',
  ],
  [
    { edit: 'place-holder', holderId: 'rs-1', shelfId: lowerShelf.id, xMm: mm(0), yMm: mm(0), turn: 0 },
    'Put Holder RS-1: Lower shelf',
    'Put Holder RS-1: Lower shelf',
  ],
  [{ edit: 'take-holder-off', holderId: 'rs-1' }, 'Take Holder RS-1 off the cart', 'Took Holder RS-1 off the cart'],
  [
    { edit: 'change-program', programId: longDrying.id },
    'Change the program to 132 °C, 4 min, dry 50 min',
    'Changed the program to 132 °C, 4 min, dry 50 min',
  ],
];

describe('editWords', () => {
  it.each(cases)('says what $edit means, to do and done', (edit, toDo, done) => {
    expect(editWords(load, edit)).toBe(toDo);
    expect(editWords(load, edit, 'done')).toBe(done);
  });

  it('stays readable for things that are not on the load', () => {
    expect(editWords(load, { edit: 'take-off', packageId: 'nobody' })).toBe(
      'Take a package that is not on this load off the load',
    );
    expect(editWords(load, { edit: 'take-holder-off', holderId: 'rs-9' })).toBe('Take a holder off the cart');
  });
});

describe('editsWords', () => {
  it('names the first of several and how many more', () => {
    const [first, second, third] = cases.map(([edit]) => edit);
    if (!first || !second || !third) throw new Error('three examples are needed');
    expect(editsWords(load, [second, first, third], 'done')).toBe(
      'Turned Adson forceps pair so that paper is right, and 2 more',
    );
    expect(editsWords(load, [second])).toBe('Turn Adson forceps pair so that paper is right');
    expect(editsWords(load, [])).toBe('Change nothing');
  });
});
