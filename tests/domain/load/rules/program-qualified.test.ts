import { describe, expect, it } from 'vitest';
import { aLoad, aProgram, programs } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

describe('the sterilizer is qualified for the program', () => {
  it('says nothing where it is', () => {
    expect(titlesOf('program-qualified', aLoad().onProgram('P18-30'))).toEqual([]);
  });

  it('finds a program that is only on the panel, names the others and changes to one', () => {
    const load = aLoad().with({ program: aProgram('W3-16', {}), qualifiedPrograms: programs.slice(0, 2) });
    expect(findingsOf('program-qualified', load)).toMatchObject([
      {
        severity: 'stop',
        title: 'Sterilizer 2 is not qualified for W3-16',
        remedy: 'Take one that it is qualified for: W4-20, W4-30.',
        fix: { label: 'Change the program to W4-20' },
      },
    ]);
    expect(findingsOf('program-qualified', load.with({ qualifiedPrograms: [] }))).toMatchObject([
      { remedy: 'Build this load for another sterilizer.', fix: null },
    ]);
  });
});
