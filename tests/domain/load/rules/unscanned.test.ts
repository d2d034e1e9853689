import { describe, expect, it } from 'vitest';
import { aLoad, nowhere, onLower } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

const waiting = { isScanned: false };

describe('nothing unscanned', () => {
  it('says nothing where all is scanned', () => {
    expect(titlesOf('unscanned', aLoad().withPackage('W-01', onLower(0, 0)))).toEqual([]);
  });

  it('names what is not, up to three and how many more, in one finding', () => {
    const load = aLoad()
      .withPackage('W-01', onLower(0, 0))
      .withPackage('W-03', nowhere, waiting)
      .withPackage('P-01', nowhere, waiting);
    expect(findingsOf('unscanned', load)).toMatchObject([
      {
        severity: 'stop',
        title: '2 packages not scanned: Adson forceps pair and D&C set',
        figure: { measured: 2, limit: 0, want: 'exactly' },
        fix: null,
      },
    ]);
    const five = load
      .withPackage('P-02', nowhere, waiting)
      .withPackage('P-03', nowhere, waiting)
      .withPackage('P-04', nowhere, waiting);
    expect(titlesOf('unscanned', five)).toEqual([
      '5 packages not scanned: Adson forceps pair, Metzenbaum scissors, Mayo scissors curved and 2 more',
    ]);
    expect(titlesOf('unscanned', aLoad().withPackage('W-03', nowhere, waiting))).toEqual([
      '1 package not scanned: D&C set',
    ]);
  });
});
