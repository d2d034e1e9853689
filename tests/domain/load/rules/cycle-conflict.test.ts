import { seconds } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, aProgram, nowhere, onLower } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rule = 'cycle-conflict';

describe('one program fits every package', () => {
  it('says nothing where the chosen one does, nor of items whose instructions name none', () => {
    const load = aLoad().withPackage('W-01', nowhere).withPackage('W-12', nowhere).withPackage('PCD', nowhere);
    expect(titlesOf(rule, load)).toEqual([]);
  });

  it('where another one fits all, names it with the longest drying that is asked for, and changes to it', () => {
    const load = aLoad().withPackage('W-01', nowhere).withPackage('C-07', nowhere);
    expect(findingsOf(rule, load)).toMatchObject([
      {
        severity: 'stop',
        title: 'Power drill set is not permitted in W4-30',
        remedy: 'Take W4-50: it fits every package, with the longest drying that any of them asks for.',
        places: [{ on: 'package', packageId: 'C-07' }],
        fix: { label: 'Change the program to W4-50', edits: [{ edit: 'change-program', programId: 'program W4-50' }] },
      },
    ]);
  });

  it('where none fits all, names the smallest set to take out and the program that buys', () => {
    const load = aLoad().withPackage('C-13', onLower(0, 0)).withPackage('W-01', nowhere).withPackage('W-03', nowhere);
    expect(findingsOf(rule, load)).toMatchObject([
      {
        title: 'Neuro craniotomy set is not permitted in W4-30',
        remedy: 'No program fits all. Take 1 package out and W4-30 can stay: Neuro craniotomy set.',
        fix: { label: 'Take 1 package off the load' },
      },
    ]);
  });

  it('changes the program as well where that leaves fewer out', () => {
    const load = aLoad()
      .onProgram('P18-30')
      .withPackage('C-13', nowhere)
      .withPackage('W-01', nowhere)
      .withPackage('W-03', nowhere);
    expect(findingsOf(rule, load)).toMatchObject([
      {
        title: 'Minor set and D&C set are not permitted in P18-30',
        remedy: 'No program fits all. Take 1 package out and W4-30 fits the rest: Neuro craniotomy set.',
      },
    ]);
    expect(fixesOf(rule, load)).toEqual(['Take 1 package off and change the program to W4-30']);
  });

  it('holds 4 minutes apart from 18, and never takes a setting between', () => {
    const program = aProgram('X', { exposureS: seconds(1080) });
    const load = aLoad()
      .withPackage('W-01', nowhere)
      .with({ program, qualifiedPrograms: [program] });
    expect(findingsOf(rule, load)).toMatchObject([{ fix: { label: 'Take 1 package off the load' } }]);
    expect(
      findingsOf(rule, aLoad().withPackage('W-01', nowhere).with({ program, qualifiedPrograms: [] })),
    ).toMatchObject([{ remedy: 'This sterilizer has no qualified program.' }]);
  });
});
