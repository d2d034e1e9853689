import type { PaperSide } from '#domain/load/model';
import { describe, expect, it } from 'vitest';
import { aLoad, inBasket, inSlot, onUpper, type LoadBuilder } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rack = aLoad().withHolder('RS-1', 'RS', { x: 20, y: 40 });

/** One small pouch per slot, from slot 1 on; a dot leaves the slot free. */
function facing(sides: string, load: LoadBuilder = rack, holder = 'RS-1'): LoadBuilder {
  const paper: Readonly<Record<string, PaperSide>> = { L: 'left', R: 'right' };
  return sides
    .split('')
    .reduce(
      (one, side, index) =>
        side === '.' ? one : one.withPackage('P-02', inSlot(holder, index + 1, paper[side] ?? null)),
      load,
    );
}

function slotsFound(load: LoadBuilder, rule: 'one-way' | 'alternating' | 'not-set' = 'one-way'): readonly string[] {
  return titlesOf('facing', load, { facing: rule }).map((title) => title.replace(/.*slot (\d).*/, '$1'));
}

describe('paper sides one way', () => {
  it.each([
    ['LLLL', []],
    ['RRRR', []],
    ['LLRL', ['3']],
    ['RRLR', ['3']],
    ['LRRL.R', ['1', '4']],
    ['L', []],
    ['??LL', []],
  ])('%s', (sides, found) => {
    expect(slotsFound(facing(sides))).toEqual(found);
  });

  it('with as many each way takes the side of the first by its label, and finds the other half', () => {
    expect(slotsFound(facing('LR'))).toEqual(['2']);
  });

  it('holds for all holders of a shelf that stand the same way, and not across shelves', () => {
    const two = rack.withHolder('RS-2', 'RS', { x: 300, y: 40 });
    expect(titlesOf('facing', facing('R', facing('LL', two), 'RS-2'))).toHaveLength(1);
    const turned = rack.withHolder('RS-2', 'RS', { x: 20, y: 500, turn: 90 });
    expect(titlesOf('facing', facing('R', facing('LL', turned), 'RS-2'))).toEqual([]);
    const below = rack.withHolder('RS-2', 'RS', { shelf: 'lower', x: 20, y: 40 });
    expect(titlesOf('facing', facing('R', facing('LL', below), 'RS-2'))).toEqual([]);
  });

  it('holds for pouches in a basket and for loose ones, but not for flat ones', () => {
    const basket = facing('LL').withHolder('TB-1', 'TB', { x: 20, y: 600 });
    expect(titlesOf('facing', basket.withPackage('P-16', inBasket('TB-1', 20, 20, { paper: 'right' })))).toHaveLength(
      1,
    );
    expect(titlesOf('facing', facing('LL').withPackage('P-16', onUpper(400, 20, { paper: 'right' })))).toHaveLength(1);
    const flat = facing('LL').withPackage('P-16', onUpper(400, 20, { pose: 'flat', paper: 'up' }));
    expect(titlesOf('facing', flat)).toEqual([]);
  });

  it('may stay with a reason, and is turned with a touch', () => {
    const [finding] = findingsOf('facing', facing('LLR'));
    expect(finding).toMatchObject({
      severity: 'accept',
      title: 'Metzenbaum scissors label P-02 no. 3 in Holder RS-1, slot 3 faces the other way than the rest',
      remedy: 'Turn it so that its paper side is left.',
      fix: {
        label: 'Turn it so paper is left',
        edits: [{ edit: 'turn-paper', packageId: 'P-02 no. 3', paper: 'left' }],
      },
    });
  });
});

describe('paper to paper and film to film', () => {
  it.each([
    ['LRLR', []],
    ['RLRL', []],
    ['LLRL', ['1']],
    ['LRRL', ['3', '4']],
    ['LL', ['2']],
    ['L.L', []],
    ['LRLL', ['4']],
    ['LR?LR', []],
  ])('%s', (sides, found) => {
    expect(slotsFound(facing(sides), 'alternating')).toEqual(found);
  });

  it('holds for pouches that stand face to face in a basket, and not for those side by side', () => {
    const basket = aLoad().withHolder('TB-1', 'TB', { x: 20, y: 40 });
    // P-16 is 10 mm thick, 200 mm long and 75 mm wide, and stands along the basket's 250 mm.
    const pair = (paper: PaperSide, x: number, y: number) =>
      basket
        .withPackage('P-16', inBasket('TB-1', 20, 0, { paper: 'left' }))
        .withPackage('P-16', inBasket('TB-1', x, y, { paper }));
    const found = (load: LoadBuilder) => titlesOf('facing', load, { facing: 'alternating' });
    expect(found(pair('left', 45, 0))).toHaveLength(1);
    expect(found(pair('right', 45, 0))).toEqual([]);
    expect(found(pair('left', 45, 205))).toEqual([]);
  });

  it('turns the one that does not alternate', () => {
    expect(fixesOf('facing', facing('LRLL'), { facing: 'alternating' })).toEqual(['Turn it so paper is right']);
  });
});

describe('what the instructions of a pouch ask for', () => {
  const asks = (facing: 'one-way' | 'alternating') => rack.withItemChanged('P-02', { facing });

  it('comes before the house rule, and is named as the source', () => {
    const oneWay = facing('LLRL', asks('one-way'));
    expect(slotsFound(oneWay, 'alternating')).toEqual(['3']);
    expect(slotsFound(oneWay, 'not-set')).toEqual(['3']);
    const [finding] = findingsOf('facing', oneWay, { facing: 'not-set' });
    expect(finding?.source).toMatchObject({ provenance: 'ifu' });
    expect(slotsFound(facing('LRLR', asks('alternating')), 'one-way')).toEqual([]);
    expect(slotsFound(facing('LLLL', asks('alternating')), 'one-way')).toHaveLength(2);
  });

  it('says nothing about pouches beside it that are silent', () => {
    const mixed = facing('LL', asks('alternating')).withPackage('P-16', inSlot('RS-1', 3, 'right'));
    expect(titlesOf('facing', mixed, { facing: 'one-way' })).toHaveLength(1);
    expect(titlesOf('facing', mixed, { facing: 'not-set' })).toHaveLength(1);
  });
});

describe('no rule about facing', () => {
  it('finds nothing', () => {
    expect(slotsFound(facing('LLRLRR'), 'not-set')).toEqual([]);
  });
});
