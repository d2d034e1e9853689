import type { HolderKind } from '#domain/load/model';
import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

const rack = aLoad().withHolder('RS-1', 'RS', { x: 0, y: 0 });

function ofKind(changes: Partial<HolderKind>) {
  const holderKinds = rack.build().holderKinds.map((kind) => (kind.code === 'RS' ? { ...kind, ...changes } : kind));
  return rack.with({ holderKinds });
}

describe('holders are known', () => {
  it('says nothing of racks, baskets and wedges as they should be', () => {
    const load = rack.withHolder('TB-1', 'TB', { x: 0, y: 500 });
    expect(titlesOf('holder-usable', load)).toEqual([]);
    expect(
      titlesOf('holder-usable', ofKind({ form: 'wedge', slots: null, pitchMm: null, acrossMm: mm(0), alongMm: mm(0) })),
    ).toEqual([]);
  });

  it.each([
    ['is of a kind that is not known', rack.with({ holderKinds: [] })],
    ['is on a shelf of another cart', aLoad().withHolder('RS-1', 'RS', { shelf: 'no such', x: 0, y: 0 })],
    ['has no slots or no pitch entered', ofKind({ slots: 0 })],
    ['has no slots or no pitch entered', ofKind({ slots: null })],
    ['has no slots or no pitch entered', ofKind({ pitchMm: mm(NaN) })],
    ['has a size or a place that makes no sense', ofKind({ acrossMm: mm(0) })],
    ['has a size or a place that makes no sense', ofKind({ greatestHeightMm: mm(NaN) })],
    ['has a size or a place that makes no sense', aLoad().withHolder('RS-1', 'RS', { x: NaN, y: 0 })],
  ])('finds one that %s, and takes it off', (says, load) => {
    expect(findingsOf('holder-usable', load)).toMatchObject([
      { severity: 'stop', title: `Holder RS-1 ${says}`, fix: { label: 'Take the holder off the cart' } },
    ]);
  });
});
