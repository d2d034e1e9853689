/*
 * Every holder on the cart is one whose kind is known, on a shelf of this cart, with slots if it is a rack.
 * Source: our own check of the equipment as entered.
 */
import type { HolderKind } from '../model';
import { isSensibleLength } from '../sensible';
import { isUsableRack } from './holder-fit';
import { onHolder } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';
import { drawing } from './sources';

export const holderUsable: Rule = {
  id: 'holder-usable',
  about: 'load',
  name: 'Holders are known',
  reason: 'What is in a holder of unknown size cannot be judged.',
  source: drawing,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene): readonly Draft[] {
  const { holders, holderKinds, cart } = scene.view;
  const kinds = new Map(holderKinds.map((kind) => [kind.id, kind]));
  const shelfIds = new Set(cart.shelves.map((shelf) => shelf.id));
  return holders.flatMap((holder) => {
    const kind = kinds.get(holder.kindId);
    const needsFrame = kind?.form === 'rack' || kind?.form === 'basket';
    const says = !kind
      ? 'is of a kind that is not known'
      : !shelfIds.has(holder.shelfId)
        ? 'is on a shelf of another cart'
        : kind.form === 'rack' && !isUsableRack(kind)
          ? 'has no slots or no pitch entered'
          : needsFrame && (!scene.layout.holderOf.has(holder.holderId) || !takesSomething(kind))
            ? 'has a size or a place that makes no sense'
            : null;
    if (says === null) return [];
    return {
      subjects: [holder.holderId],
      title: `${scene.holderName(holder)} ${says}`,
      remedy: 'Take the holder off the cart, or have its entry mended.',
      places: [onHolder(holder)],
      fixes: () => [
        { label: 'Take the holder off the cart', edits: [{ edit: 'take-holder-off', holderId: holder.holderId }] },
      ],
    };
  });
}

function takesSomething({ greatestHeightMm, greatestLengthMm, greatestThicknessMm }: HolderKind): boolean {
  const limits = [greatestHeightMm, greatestLengthMm, greatestThicknessMm];
  return limits.every((limit) => limit === null || isSensibleLength(limit));
}
