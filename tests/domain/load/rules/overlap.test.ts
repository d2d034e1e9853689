import { describe, expect, it } from 'vitest';
import { aLoad, inBasket, inSlot, onLower, onTopOf, onUpper } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

describe('one thing in one place', () => {
  it('says nothing where things touch, stand on each other, or are on different shelves', () => {
    const load = aLoad()
      .withPackage('C-01', onLower(0, 0))
      .withPackage('C-08', onLower(280, 0))
      .withPackage('C-02', onTopOf('C-01', 0, 0))
      .withPackage('C-03', onUpper(0, 0));
    expect(titlesOf('overlap', load)).toEqual([]);
  });

  it('finds two that reach into each other, by the shortest way out', () => {
    const load = aLoad().withPackage('W-03', onLower(0, 0)).withPackage('W-04', onLower(255, 100));
    expect(findingsOf('overlap', load)).toMatchObject([
      { severity: 'stop', title: 'Vaginal delivery set reaches 5 mm into D&C set', figure: { measured: 5, limit: 0 } },
    ]);
    expect(fixesOf('overlap', load)).toEqual([expect.stringMatching(/^Move Vaginal delivery set to /)]);
  });

  it('finds a thing in a holder’s place, and two holders in one place', () => {
    const holders = aLoad().withHolder('RS-1', 'RS', { x: 0, y: 0 });
    expect(titlesOf('overlap', holders.withPackage('W-08', onUpper(230, 0)))).toEqual([
      'Laceration tray reaches 10 mm into Holder RS-1',
    ]);
    expect(titlesOf('overlap', holders.withHolder('RS-2', 'RS', { x: 200, y: 0 }))).toEqual([
      'Holder RS-2 reaches 40 mm into Holder RS-1',
    ]);
    expect(titlesOf('overlap', holders.withHolder('RS-2', 'RS', { x: 240, y: 0 }))).toEqual([]);
    const wedge = holders
      .build()
      .holderKinds.map((kind) => (kind.code === 'RM' ? { ...kind, form: 'wedge' as const } : kind));
    expect(titlesOf('overlap', holders.with({ holderKinds: wedge }).withHolder('RM-1', 'RM', { x: 0, y: 0 }))).toEqual(
      [],
    );
  });

  it('says nothing about pouches and the holder they are in', () => {
    const load = aLoad()
      .withHolder('RS-1', 'RS', { x: 0, y: 0 })
      .withHolder('TB-1', 'TB', { x: 0, y: 400 })
      .withPackage('P-01', inSlot('RS-1', 1))
      .withPackage('P-02', inSlot('RS-1', 1))
      .withPackage('P-16', inBasket('TB-1', 10, 10, { turn: 90 }));
    expect(titlesOf('overlap', load)).toEqual([]);
  });

  it('finds two in a basket', () => {
    const load = aLoad()
      .withHolder('TB-1', 'TB', { x: 0, y: 400 })
      .withPackage('P-16', inBasket('TB-1', 10, 10))
      .withPackage('P-01', inBasket('TB-1', 14, 10));
    expect(titlesOf('overlap', load)).toEqual([
      'Suture removal scissors in Basket TB-1 reaches 4 mm into Adson forceps pair in Basket TB-1',
    ]);
  });
});
