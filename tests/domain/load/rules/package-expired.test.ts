import { describe, expect, it } from 'vitest';
import { aLoad, nowhere } from '../../../support/load-builder';
import { findingsOf } from '../../../support/findings';

describe('no package has expired', () => {
  it.each([
    ['never', null, []],
    ['today', '2026-03-10', []],
    ['yesterday', '2026-03-09', ['Minor set expired on 2026-03-09']],
    ['last year', '2025-12-31', ['Minor set expired on 2025-12-31']],
  ])('%s', (_name, expiresOn, titles) => {
    const found = findingsOf('package-expired', aLoad().withPackage('W-01', nowhere, { expiresOn }));
    expect(found.map((finding) => finding.title)).toEqual(titles);
    for (const finding of found)
      expect(finding).toMatchObject({ severity: 'stop', fix: { label: 'Take it off the load' } });
  });
});
