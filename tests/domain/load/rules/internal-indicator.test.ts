import { describe, expect, it } from 'vitest';
import { aLoad, nowhere } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

describe('internal CI in each package', () => {
  it('finds a package without one, which a lead may accept', () => {
    const load = aLoad().withPackage('P-01', nowhere, { hasInternalIndicator: false });
    expect(findingsOf('internal-indicator', load)).toMatchObject([
      {
        severity: 'accept',
        title: 'Adson forceps pair was packed without an internal CI',
        fix: { label: 'Take it off the load' },
      },
    ]);
  });

  it('says nothing where it is there, nor of a challenge device', () => {
    const load = aLoad().withPackage('P-01', nowhere).withPackage('PCD', nowhere, { hasInternalIndicator: false });
    expect(titlesOf('internal-indicator', load)).toEqual([]);
  });
});
