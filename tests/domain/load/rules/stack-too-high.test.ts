import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, onLower, onTopOf } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rule = 'stack-too-high';
const stack = (limitMm: number | null, code = 'C-02') =>
  aLoad()
    .withItemChanged(code, { greatestStackHeightMm: limitMm === null ? null : mm(limitMm) })
    .withPackage('C-01', onLower(0, 0))
    .withPackage('C-02', onTopOf('C-01', 0, 0));

describe('stacks are not too high', () => {
  it('says nothing up to the height permitted, or where nothing is said', () => {
    expect(findingsOf(rule, stack(300))).toEqual([]);
    expect(findingsOf(rule, stack(null))).toEqual([]);
  });

  it.each(['C-02', 'C-01'])('finds one higher than %s permits', (code) => {
    const name = code === 'C-01' ? 'General container set A' : 'General container set B';
    expect(findingsOf(rule, stack(299, code))).toMatchObject([
      {
        severity: 'stop',
        title: `The stack under General container set B is 300 mm high, ${name} permits 299 mm`,
        figure: { measured: 300, limit: 299, limitFrom: 'ifu' },
        source: { text: `Instructions for use of ${name}: IFU ${code}.` },
      },
    ]);
  });

  it('is told once, of the top of the stack', () => {
    const three = stack(200).withPackage('C-14', onTopOf('C-02', 0, 0));
    expect(titlesOf(rule, three)).toEqual([
      'The stack under Eye micro set is 360 mm high, General container set B permits 200 mm',
    ]);
  });

  it('says nothing of one thing by itself, however high', () => {
    const alone = aLoad()
      .withItemChanged('C-01', { greatestStackHeightMm: mm(100) })
      .withPackage('C-01', onLower(0, 0));
    expect(titlesOf(rule, alone)).toEqual([]);
  });

  it('takes the top one off', () => {
    // Two full containers have no room for 25 mm between them on one shelf; the upper one is free.
    expect(fixesOf(rule, stack(299))).toEqual(['Move it to Upper shelf, left, at the door']);
  });
});
