import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, inBasket, inSlot } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rule = 'holder-fits';
const racks = aLoad()
  .withHolder('RS-1', 'RS', { x: 20, y: 40 })
  .withHolder('RM-1', 'RM', { x: 300, y: 40 })
  .withHolder('TB-1', 'TB', { x: 20, y: 600 });

describe('the holder fits the pouch', () => {
  it('says nothing up to its greatest sizes', () => {
    const exact = racks.withItemChanged('P-04', { lengthMm: mm(340), widthMm: mm(130), heightMm: mm(18) });
    expect(titlesOf(rule, exact.withPackage('P-04', inSlot('RS-1', 1)))).toEqual([]);
  });

  it.each([
    ['length', { lengthMm: mm(341) }, 'is 341 mm long, the holder takes 340 mm'],
    ['height', { widthMm: mm(131) }, 'is 131 mm tall, the holder takes 130 mm'],
    ['thickness', { heightMm: mm(18.4) }, 'is 18.4 mm thick, the holder takes 18 mm'],
  ])('finds too much %s', (_name, changes, says) => {
    const load = racks.withItemChanged('P-04', changes).withPackage('P-04', inSlot('RS-1', 1));
    expect(findingsOf(rule, load)).toMatchObject([
      {
        severity: 'stop',
        title: `Single curette set of 2 in Holder RS-1, slot 1 ${says}`,
        figure: { limitFrom: 'equipment' },
      },
    ]);
  });

  it('names the kind of holder it belongs in', () => {
    const load = racks.withPackage('P-05', inSlot('RM-1', 1));
    expect(findingsOf(rule, load)[0]?.remedy).toBe('Put it into a holder of kind RL, upright pouch rack RL.');
    const huge = racks.withItemChanged('P-05', { lengthMm: mm(600) }).withPackage('P-05', inSlot('RM-1', 1));
    expect(findingsOf(rule, huge)[0]?.remedy).toBe('No holder of this facility takes it.');
  });

  it('moves it to one on the cart', () => {
    expect(fixesOf(rule, racks.withPackage('P-14', inSlot('RS-1', 1)))).toEqual([
      'Stand it in Holder RM-1, slot 1, paper side left',
    ]);
  });

  it('finds a set in a slot', () => {
    expect(titlesOf(rule, racks.withPackage('W-08', inSlot('RM-1', 1, null, 'flat')))).toEqual([
      'Laceration tray in Holder RM-1, slot 1 stands in a slot meant for pouches',
    ]);
  });

  it('finds what sticks out of a basket', () => {
    expect(titlesOf(rule, racks.withPackage('P-02', inBasket('TB-1', 150, 20, { turn: 90 })))).toEqual([]);
    expect(titlesOf(rule, racks.withPackage('P-02', inBasket('TB-1', 151, 20, { turn: 90 })))).toEqual([
      'Metzenbaum scissors in Basket TB-1 sticks out by 1 mm',
    ]);
    expect(titlesOf(rule, racks.withPackage('P-02', inBasket('TB-1', 20, 20)))).toEqual([
      'Metzenbaum scissors in Basket TB-1 sticks out by 100 mm',
    ]);
  });
});
