/*
 * A pouch is in a slot that its holder has.
 * Source: the number of slots of the holder, as entered by the facility.
 */
import { elsewhere } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';
import { equipment } from './sources';

export const slotUnknown: Rule = {
  id: 'slot-unknown',
  about: 'load',
  name: 'The slot exists',
  reason: 'A slot that the holder does not have says nothing about where the pouch really is.',
  source: equipment,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene): readonly Draft[] {
  if (scene.layout.nowhere.size === 0) return [];
  return scene.listed.flatMap(({ one, item, body }) => {
    const why = scene.layout.nowhere.get(one.packageId);
    if ((why !== 'no-such-slot' && why !== 'holder-without-slots') || one.placement?.at !== 'slot') return [];
    const { holderId, slot } = one.placement;
    const holder = scene.layout.holderOf.get(holderId);
    if (!holder) return [];
    const { slots } = holder.kind;
    const has = why === 'no-such-slot' && slots !== null ? `which has ${slots} slots` : 'which has no slots';
    return {
      subjects: [one.packageId, holderId],
      title: `${scene.nameOf(one)} is in slot ${slot} of ${scene.holderName(holder.holder)}, ${has}`,
      remedy: 'Scan the holder it is really in, then the pouch.',
      places: onPackage(one),
      ...(slots !== null && Number.isFinite(slot)
        ? { figure: { measured: slot, limit: slots, unit: 'count', want: 'at-most', limitFrom: 'equipment' } as const }
        : {}),
      fixes: (scene) => (item ? elsewhere(scene, { one, item, body }) : []),
    };
  });
}
