import { describe, expect, it } from 'vitest';
import { aLoad } from '../../../support/load-builder';
import { findingsOf } from '../../../support/findings';

describe('the sterilizer is in service', () => {
  it.each([
    ['in-service', []],
    ['out-of-service', ['Sterilizer 2 is out of service']],
    ['awaiting-requalification', ['Sterilizer 2 waits to be qualified again']],
  ] as const)('%s', (serviceState, titles) => {
    const found = findingsOf('sterilizer-in-service', aLoad().withSterilizer({ serviceState }));
    expect(found.map((finding) => finding.title)).toEqual(titles);
    expect(found.every((finding) => finding.severity === 'stop')).toBe(true);
  });
});
