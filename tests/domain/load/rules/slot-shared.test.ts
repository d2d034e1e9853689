import { describe, expect, it } from 'vitest';
import { aLoad, inSlot } from '../../../support/load-builder';
import { findingsOf, fixesOf } from '../../../support/findings';

const rack = aLoad().withHolder('RS-1', 'RS', { x: 20, y: 40 }).withHolder('RS-2', 'RS', { x: 300, y: 40 });

describe('one pouch to a slot', () => {
  it('says nothing about the same slot of two holders', () => {
    const load = rack.withPackage('P-01', inSlot('RS-1', 1)).withPackage('P-02', inSlot('RS-2', 1));
    expect(findingsOf('slot-shared', load)).toEqual([]);
  });

  it('finds two in one slot once, and points at the slot', () => {
    const load = rack.withPackage('P-01', inSlot('RS-1', 3)).withPackage('P-02', inSlot('RS-1', 3));
    expect(findingsOf('slot-shared', load)).toMatchObject([
      {
        severity: 'stop',
        title: 'Holder RS-1, slot 3 has 2 pouches: Adson forceps pair and Metzenbaum scissors',
        places: [
          { on: 'holder', holderId: 'RS-1', slot: 3 },
          { on: 'package', packageId: 'P-01' },
          { on: 'package', packageId: 'P-02' },
        ],
        figure: { measured: 2, limit: 1 },
      },
    ]);
    expect(fixesOf('slot-shared', load)).toEqual(['Stand Metzenbaum scissors in Holder RS-1, slot 1, paper side left']);
  });
});
