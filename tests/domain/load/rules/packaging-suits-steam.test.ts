import { describe, expect, it } from 'vitest';
import { aLoad, aProgram, nowhere } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

const rule = 'packaging-suits-steam';

describe('packaging suits the cycle', () => {
  it('says nothing of pouches, wraps, containers and challenge devices', () => {
    const load = aLoad()
      .withPackage('P-01', nowhere)
      .withPackage('W-01', nowhere)
      .withPackage('C-01', nowhere)
      .withItemChanged('PCD', { packaging: 'none' })
      .withPackage('PCD', nowhere);
    expect(titlesOf(rule, load)).toEqual([]);
  });

  it('finds an unwrapped set among wrapped goods, and not in an immediate-use program', () => {
    const load = aLoad().withItemChanged('W-01', { packaging: 'none' }).withPackage('W-01', nowhere);
    expect(findingsOf(rule, load)).toMatchObject([
      {
        severity: 'stop',
        title: 'Minor set is not wrapped, and W4-30 is for wrapped goods',
        fix: { label: 'Take it off the load' },
      },
    ]);
    expect(titlesOf(rule, load.with({ program: aProgram('I', { type: 'immediate-use' }) }))).toEqual([]);
  });

  it('finds a set in a pouch', () => {
    const load = aLoad().withItemChanged('W-01', { packaging: 'double-pouch' }).withPackage('W-01', nowhere);
    expect(titlesOf(rule, load)).toEqual(['Minor set is packed in a pouch, which is for small and light things']);
  });
});
