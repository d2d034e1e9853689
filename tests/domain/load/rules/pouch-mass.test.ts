import { kg } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, nowhere } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

const weighing = (massKg: number) =>
  aLoad()
    .withItemChanged('P-13', { massKg: kg(massKg) })
    .withPackage('P-13', nowhere);

describe('pouches are not too heavy', () => {
  it('says nothing up to what the house allows, nor of sets', () => {
    expect(titlesOf('pouch-mass', weighing(0.5))).toEqual([]);
    expect(titlesOf('pouch-mass', aLoad().withPackage('C-01', nowhere))).toEqual([]);
  });

  it('finds a heavier one, which a lead may accept', () => {
    expect(findingsOf('pouch-mass', weighing(0.6))).toMatchObject([
      {
        severity: 'accept',
        title: 'Bone rongeur single weighs 0.6 kg, a pouch takes 0.5 kg',
        figure: { limitFrom: 'default' },
      },
    ]);
  });

  it('goes by the instructions first', () => {
    const limited = weighing(0.42).withItemChanged('P-13', { massLimitKg: kg(0.4) });
    expect(findingsOf('pouch-mass', limited)[0]?.figure).toMatchObject({
      measured: 0.42,
      limit: 0.4,
      limitFrom: 'ifu',
    });
  });
});
