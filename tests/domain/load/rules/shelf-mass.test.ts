import { kg, percent } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, nowhere, onLower, onTopOf } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

/** 8.9 + 9.3 kg, and a rack of 1 kg. */
const load = aLoad()
  .withHolder('RS-1', 'RS', { shelf: 'lower', x: 300, y: 700 })
  .withPackage('C-01', onLower(0, 0))
  .withPackage('C-02', onTopOf('C-01', 0, 0));

const carrying = (limitKg: number) => load.withShelf('lower', { greatestMassKg: kg(limitKg) });

describe('shelves carry what they are made for', () => {
  it('weighs what stands on it, stacks and holders included, up to its limit', () => {
    expect(titlesOf('shelf-mass', carrying(19.2))).toEqual([]);
    expect(findingsOf('shelf-mass', carrying(19.1))).toMatchObject([
      {
        severity: 'stop',
        title: 'What is on Lower shelf weighs 19.2 kg, want at most 19.1 kg',
        places: [{ on: 'shelf', shelfId: 'lower' }],
        figure: { limitFrom: 'equipment' },
      },
    ]);
  });

  it('close to the limit a lead may accept it, where the house keeps some back', () => {
    expect(findingsOf('shelf-mass', carrying(20), { massMarginPercent: percent(10) })).toMatchObject([
      { severity: 'accept', figure: { limit: 18, limitFrom: 'house-rule' } },
    ]);
  });

  it('leaves out what has no place', () => {
    expect(titlesOf('shelf-mass', carrying(19.2).withPackage('C-08', nowhere))).toEqual([]);
  });
});
