import { describe, expect, it } from 'vitest';
import { aLoad, onLower, onTopOf } from '../../../support/load-builder';
import { findingsOf } from '../../../support/findings';

describe('stacks start on a shelf', () => {
  it('says nothing about a stack that does', () => {
    const load = aLoad()
      .withPackage('C-01', onLower(0, 0))
      .withPackage('C-02', onTopOf('C-01', 0, 0));
    expect(findingsOf('stack-circular', load)).toEqual([]);
  });

  it('finds one thing on itself, and two circles as two', () => {
    const load = aLoad()
      .withPackage('C-14', onTopOf('C-14', 0, 0))
      .withPackage('C-01', onTopOf('C-02', 0, 0))
      .withPackage('C-02', onTopOf('C-03', 0, 0))
      .withPackage('C-03', onTopOf('C-01', 0, 0));
    const found = findingsOf('stack-circular', load);
    expect(found.map((finding) => finding.title).sort()).toEqual([
      'Eye micro set is said to stand on itself',
      'General container set A, General container set B and Laparoscopic instruments are said to stand on each other in a circle',
    ]);
    expect(found.every((finding) => finding.severity === 'stop')).toBe(true);
  });
});
