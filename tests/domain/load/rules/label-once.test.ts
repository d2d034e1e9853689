import { describe, expect, it } from 'vitest';
import { aLoad, nowhere } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

describe('each label once', () => {
  it('says nothing of two packages of one item with a label each', () => {
    expect(titlesOf('label-once', aLoad().withPackage('W-01', nowhere).withPackage('W-01', nowhere))).toEqual([]);
  });

  it('finds one label on two packages, in one finding', () => {
    const load = aLoad()
      .withPackage('W-01', nowhere, { code: 'L-7' })
      .withPackage('W-03', nowhere, { code: ' L-7 ' })
      .withPackage('W-04', nowhere);
    expect(findingsOf('label-once', load)).toMatchObject([
      {
        severity: 'stop',
        title: 'Label L-7 is on the list 2 times',
        places: [
          { on: 'package', packageId: 'W-01' },
          { on: 'package', packageId: 'W-03' },
        ],
        figure: { measured: 2, limit: 1 },
      },
    ]);
  });

  it('finds one package that is on the list twice, whatever its labels say', () => {
    const same = { packageId: 'same' };
    const twice = aLoad()
      .withPackage('W-01', nowhere, { ...same, code: 'L-1' })
      .withPackage('W-01', nowhere, { ...same, code: 'L-1' });
    expect(titlesOf('label-once', twice)).toEqual(['Label L-1 is on the list 2 times']);
    const relabelled = aLoad()
      .withPackage('W-01', nowhere, { ...same, code: 'L-1' })
      .withPackage('W-01', nowhere, { ...same, code: 'L-2' });
    expect(titlesOf('label-once', relabelled)).toEqual(['Label L-1 is on the list 2 times']);
  });
});
