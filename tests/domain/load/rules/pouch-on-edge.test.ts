import { describe, expect, it } from 'vitest';
import { aLoad, inBasket, inSlot, onUpper } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rack = aLoad().withHolder('RS-1', 'RS', { x: 20, y: 40 }).withHolder('TB-1', 'TB', { x: 20, y: 600 });

describe('pouches stand on edge', () => {
  it('says nothing about one that does', () => {
    expect(titlesOf('pouch-on-edge', rack.withPackage('P-02', inSlot('RS-1', 1)))).toEqual([]);
  });

  it('finds one that lies flat or is tilted, wherever it is', () => {
    const load = rack
      .withPackage('P-01', onUpper(300, 0, { pose: 'flat' }))
      .withPackage('P-02', inSlot('RS-1', 1, 'up', 'flat'))
      .withPackage('P-16', inBasket('TB-1', 10, 10, { pose: 'tilted' }));
    expect(titlesOf('pouch-on-edge', load)).toEqual([
      'Adson forceps pair lies flat, want it on edge',
      'Metzenbaum scissors in Holder RS-1, slot 1 lies flat, want it on edge',
      'Suture removal scissors in Basket TB-1 is tilted, want it on edge',
    ]);
    expect(findingsOf('pouch-on-edge', load)[0]).toMatchObject({ severity: 'stop' });
  });

  it('leaves sets that lie flat alone', () => {
    expect(titlesOf('pouch-on-edge', aLoad().withPackage('W-03', onUpper(0, 0)))).toEqual([]);
  });

  it('stands one that is in its slot up there, and moves another one into a free slot', () => {
    expect(fixesOf('pouch-on-edge', rack.withPackage('P-02', inSlot('RS-1', 3, 'up', 'flat')))).toEqual([
      'Stand it on edge',
    ]);
    const loose = rack.withPackage('P-03', inSlot('RS-1', 1)).withPackage('P-02', onUpper(300, 0, { pose: 'flat' }));
    expect(fixesOf('pouch-on-edge', loose)).toEqual(['Stand it in Holder RS-1, slot 2, paper side left']);
  });

  it('says nothing of a pouch whose instructions ask for flat, as long as it lies as they say', () => {
    const flat = aLoad().withItemChanged('P-02', { pose: 'flat' });
    expect(titlesOf('pouch-on-edge', flat.withPackage('P-02', onUpper(0, 0, { pose: 'flat', paper: 'up' })))).toEqual(
      [],
    );
    expect(titlesOf('pouch-on-edge', flat.withPackage('P-02', onUpper(0, 0, { pose: 'tilted' })))).toHaveLength(1);
  });
});
