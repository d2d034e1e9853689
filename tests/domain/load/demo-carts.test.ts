import { evaluateLoad } from '#domain/load/evaluate-load';
import type { RuleId } from '#domain/load/finding';
import type { LoadView } from '#domain/load/model';
import { defaultPolicy, type LoadPolicy } from '#domain/load/policy';
import { describe, expect, it } from 'vitest';
import { aLoad, inSlot, onLower, onTopOf, onUpper } from '../../support/load-builder';

/*
 * The twelve carts of the demonstration hospital: six that are good and six that are bad in exactly one way each. Shelves
 * are 560 mm wide and 1150 mm deep, so two full containers (580 × 280 mm) have no room for 25 mm between them, neither side
 * by side nor one behind the other: where the carts were told with several to a shelf, they have one and smaller ones here.
 */

function pins(view: LoadView, policy: LoadPolicy = defaultPolicy): Partial<Record<RuleId, number>> {
  const counts: Partial<Record<RuleId, number>> = {};
  for (const { ruleId } of evaluateLoad(view, policy)) counts[ruleId] = (counts[ruleId] ?? 0) + 1;
  return counts;
}

const containersLowWrapsHigh = aLoad()
  .withPackage('C-01', onLower(0, 0))
  .withPackage('C-15', onLower(305, 0))
  .withPackage('C-14', onLower(305, 525))
  .withPackage('C-04', onLower(30, 605))
  .withPackage('W-02', onUpper(0, 0, { turn: 90 }))
  .withPackage('W-01', onUpper(0, 295, { turn: 90 }))
  .withPackage('W-08', onUpper(0, 580, { turn: 90 }));

const wrapsWithGaps = aLoad()
  .withPackage('W-09', onLower(0, 0, { turn: 90 }))
  .withPackage('W-03', onLower(0, 285, { turn: 90 }))
  .withPackage('W-06', onLower(0, 570, { turn: 90 }))
  .withPackage('W-07', onLower(0, 855, { turn: 90 }))
  .withPackage('W-04', onUpper(0, 0))
  .withPackage('W-08', onUpper(285, 0))
  .withPackage('W-01', onUpper(0, 425, { turn: 90 }));

const pouchesOneWay = aLoad()
  .withHolder('RS-1', 'RS', { x: 20, y: 40 })
  .withHolder('RM-1', 'RM', { x: 300, y: 40 })
  .withPackage('P-01', inSlot('RS-1', 1))
  .withPackage('P-02', inSlot('RS-1', 2))
  .withPackage('P-03', inSlot('RS-1', 3))
  .withPackage('P-04', inSlot('RS-1', 5))
  .withPackage('P-16', inSlot('RS-1', 8))
  .withPackage('P-07', inSlot('RM-1', 1))
  .withPackage('P-13', inSlot('RM-1', 2))
  .withPackage('P-14', inSlot('RM-1', 4))
  .withPackage('P-15', inSlot('RM-1', 5));

const basinsTilted = aLoad()
  .withPackage('W-10', onUpper(0, 0))
  .withPackage('W-11', onUpper(0, 425))
  .withPackage('W-09', onLower(0, 700, { turn: 90 }));

const linenHighMetalLow = aLoad()
  .withPackage('W-12', onUpper(0, 0))
  .withPackage('W-03', onUpper(250, 0))
  .withPackage('C-08', onLower(0, 0));

const implantWithChallengePack = aLoad().withPackage('C-05', onLower(0, 200)).withPackage('PCD', onLower(305, 30));

describe('a good cart has no finding', () => {
  it.each([
    ['containers low, wraps high', containersLowWrapsHigh],
    ['mixed wraps with 25 mm gaps', wrapsWithGaps],
    ['pouches in small and medium racks, one way', pouchesOneWay],
    ['basins tilted, nothing under them', basinsTilted],
    ['linen on edge on the upper shelf, metal beside it and lower', linenHighMetalLow],
    ['one implant container with a challenge pack over the drain', implantWithChallengePack],
  ])('%s', (_name, load) => {
    expect(evaluateLoad(load.build(), defaultPolicy)).toEqual([]);
  });
});

describe('a bad cart has exactly the findings it was built for', () => {
  it('nine pouches, six of them bunched in no holder, the last with its film close to the rack', () => {
    let load = aLoad()
      .withHolder('RL-1', 'RL', { x: 275, y: 0 })
      .withPackage('P-06', inSlot('RL-1', 1))
      .withPackage('P-06', inSlot('RL-1', 2))
      .withPackage('P-05', inSlot('RL-1', 3));
    for (let index = 0; index < 6; index += 1) {
      load = load.withPackage('P-05', onUpper(index * 45, 60, { paper: 'left' }));
    }
    expect(pins(load.build())).toEqual({ 'pouch-in-holder': 6, gap: 5, 'label-hidden': 6 });
  });

  it('pouches lying flat on the lid of a container', () => {
    const load = aLoad()
      .withPackage('C-01', onLower(0, 0))
      .withPackage('P-01', onTopOf('C-01', 60, 60, { pose: 'flat', paper: 'down' }))
      .withPackage('P-02', onTopOf('C-01', 150, 60, { pose: 'flat', paper: 'down' }))
      .withPackage('P-16', onTopOf('C-01', 60, 350, { pose: 'flat', paper: 'down' }));
    expect(pins(load.build())).toEqual({ 'lid-filter-covered': 1, 'pouch-on-edge': 3 });
  });

  it('a set that needs 134 °C with one that needs 132 °C', () => {
    const load = aLoad()
      .withPackage('C-13', onLower(0, 0))
      .withPackage('W-01', onUpper(0, 0, { turn: 90 }));
    expect(pins(load.build())).toEqual({ 'cycle-conflict': 1 });
  });

  it('a loaner of 12.1 kg', () => {
    const load = aLoad().onProgram('W4-40').withPackage('C-12', onLower(0, 0));
    expect(pins(load.build())).toEqual({ 'set-mass': 1 });
  });

  it.each([
    ['on the shelf above the linen', onUpper(0, 0)],
    ['above one corner of the linen', onUpper(150, 350)],
  ])('metal over linen: %s', (_name, where) => {
    const load = aLoad().withPackage('W-12', onLower(0, 0)).withPackage('C-08', where);
    expect(pins(load.build())).toEqual({ 'metal-over-textile': 1 });
  });

  it('metal standing on linen is told once, and not as a stack too', () => {
    const load = aLoad()
      .withPackage('W-12', onLower(0, 0))
      .withPackage('W-08', onTopOf('W-12', 0, 0));
    expect(pins(load.build())).toEqual({ 'metal-over-textile': 1 });
  });

  it('one pouch reversed among three', () => {
    const load = aLoad()
      .withHolder('RL-1', 'RL', { x: 20, y: 40 })
      .withPackage('P-05', inSlot('RL-1', 1, 'left'))
      .withPackage('P-06', inSlot('RL-1', 2, 'right'))
      .withPackage('P-05', inSlot('RL-1', 3, 'left'))
      .build();
    expect(pins(load)).toEqual({ facing: 1 });
    expect(evaluateLoad(load, defaultPolicy)[0]?.places).toEqual([{ on: 'package', packageId: 'P-06' }]);
    expect(pins(load, { ...defaultPolicy, facing: 'alternating' })).toEqual({});
    expect(pins(load, { ...defaultPolicy, facing: 'not-set' })).toEqual({});
  });
});
