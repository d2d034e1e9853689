import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, inBasket, inSlot, onUpper } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rack = aLoad().withHolder('RS-1', 'RS', { x: 20, y: 40 });

/** Two pouches of this thickness in slots 1 and 2 of a pitch of 28 mm. */
function two(thickness: number, clearance: number | null = 10) {
  return rack
    .withItemChanged('P-02', { heightMm: mm(thickness), clearanceMm: clearance === null ? null : mm(clearance) })
    .withPackage('P-02', inSlot('RS-1', 1))
    .withPackage('P-02', inSlot('RS-1', 2));
}

describe('pouches in neighbouring slots stand apart', () => {
  it('by the pitch less half of each thickness', () => {
    expect(findingsOf('gap', two(18))).toEqual([]);
    const [finding] = findingsOf('gap', two(20));
    expect(finding).toMatchObject({
      severity: 'accept',
      figure: { measured: 8, limit: 10, want: 'at-least', limitFrom: 'ifu' },
    });
    expect(finding?.title).toMatch(/ are 8 mm apart, want 10 mm$/);
  });

  it('says so in words where they touch', () => {
    expect(titlesOf('gap', two(28))[0]).toMatch(/ touch, want 10 mm between$/);
    expect(findingsOf('gap', two(35))[0]?.figure?.measured).toBe(-7);
  });

  it('by the instructions of the one that asks for more, else by the house', () => {
    const mixed = two(18)
      .withItemChanged('P-03', { clearanceMm: mm(14) })
      .withPackage('P-03', inSlot('RS-1', 3));
    expect(findingsOf('gap', mixed).map((one) => [one.figure?.measured, one.figure?.limit])).toEqual([[13, 14]]);
    expect(findingsOf('gap', mixed)[0]?.source).toEqual({
      text: 'Instructions for use of Mayo scissors curved: IFU P-03.',
      provenance: 'ifu',
    });
    expect(findingsOf('gap', two(20, null))[0]?.figure).toMatchObject({ limit: 10, limitFrom: 'default' });
    expect(findingsOf('gap', two(18, null), { pouchGapMm: mm(11) })[0]).toMatchObject({
      figure: { limit: 11, limitFrom: 'house-rule' },
      source: { provenance: 'house-rule' },
    });
  });

  it('a slot left free between them is room enough', () => {
    const apart = rack
      .withItemChanged('P-02', { heightMm: mm(30) })
      .withPackage('P-02', inSlot('RS-1', 1))
      .withPackage('P-02', inSlot('RS-1', 3));
    expect(findingsOf('gap', apart)).toEqual([]);
    // 28 - (16 + 18) / 2 = 11, and one of them asks for 12.
    const close = two(16, 12)
      .withItemChanged('P-03', { heightMm: mm(18) })
      .withPackage('P-03', inSlot('RS-1', 3));
    expect(fixesOf('gap', close)).toEqual(['Stand Mayo scissors curved in Holder RS-1, slot 4, paper side left']);
  });
});

describe('loose pouches stand apart', () => {
  const at = (...xs: readonly number[]) => xs.reduce((load, x) => load.withPackage('P-16', onUpper(x, 0)), aLoad());

  it('face to face, each from the next', () => {
    expect(findingsOf('gap', at(0, 18, 36))).toEqual([]);
    expect(findingsOf('gap', at(0, 17, 36)).map((one) => one.figure?.measured)).toEqual([9]);
    // Three of 8 mm side by side: the first and the third are 8 mm apart, but the second is between them.
    expect(findingsOf('gap', at(0, 8, 16)).map((one) => one.figure?.measured)).toEqual([0, 0]);
  });

  it('not where they stand one behind the other, or lie flat', () => {
    const behind = aLoad().withPackage('P-16', onUpper(0, 0)).withPackage('P-16', onUpper(0, 201));
    expect(findingsOf('gap', behind)).toEqual([]);
    const flat = aLoad()
      .withPackage('P-16', onUpper(0, 0, { pose: 'flat' }))
      .withPackage('P-16', onUpper(76, 0, { pose: 'flat' }));
    expect(findingsOf('gap', flat)).toEqual([]);
  });

  it('in a basket, and turned, as well', () => {
    const basket = aLoad()
      .withHolder('TB-1', 'TB', { x: 20, y: 40 })
      .withPackage('P-02', inBasket('TB-1', 10, 20, { turn: 90 }))
      .withPackage('P-03', inBasket('TB-1', 10, 37, { turn: 90 }));
    expect(findingsOf('gap', basket).map((one) => one.figure?.measured)).toEqual([5]);
  });

  it('what reaches into each other is told as that', () => {
    expect(findingsOf('gap', at(0, 5))).toEqual([]);
  });
});
