import { describe, expect, it } from 'vitest';
import { aLoad, inSlot } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rack = aLoad().withHolder('RS-1', 'RS', { x: 20, y: 40 }).withHolder('TB-1', 'TB', { x: 20, y: 600 });

describe('the slot exists', () => {
  it('says nothing about the first and the last', () => {
    const load = rack.withPackage('P-01', inSlot('RS-1', 1)).withPackage('P-02', inSlot('RS-1', 8));
    expect(findingsOf('slot-unknown', load)).toEqual([]);
  });

  it('finds one beyond the last, and puts it into one that exists', () => {
    const load = rack.withPackage('P-01', inSlot('RS-1', 9));
    expect(findingsOf('slot-unknown', load)).toMatchObject([
      {
        severity: 'stop',
        title: 'Adson forceps pair is in slot 9 of Holder RS-1, which has 8 slots',
        figure: { measured: 9, limit: 8 },
      },
    ]);
    expect(fixesOf('slot-unknown', load)).toEqual(['Stand it in Holder RS-1, slot 1, paper side left']);
  });

  it('finds slot 0, and a slot of a basket', () => {
    expect(titlesOf('slot-unknown', rack.withPackage('P-01', inSlot('RS-1', 0)))).toHaveLength(1);
    expect(titlesOf('slot-unknown', rack.withPackage('P-01', inSlot('TB-1', 1)))).toEqual([
      'Adson forceps pair is in slot 1 of Basket TB-1, which has no slots',
    ]);
  });
});
