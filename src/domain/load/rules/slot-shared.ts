/*
 * A slot of a holder has one pouch.
 * Source: CDC guideline (2008), loading, as restated: pouches stand apart; no stacking of pouches is general practice.
 */
import type { Body } from '../layout';
import { moveNamed } from './moves';
import { onHolder, onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { OnShelf, Scene } from './scene';
import { generalPractice } from './sources';
import { countWords, listWords } from './words';

export const slotShared: Rule = {
  id: 'slot-shared',
  about: 'shelf',
  name: 'One pouch to a slot',
  reason: 'Two pouches in one slot press on each other, so that steam does not reach between them and they stay wet.',
  source: generalPractice,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene, { bodies }: OnShelf): readonly Draft[] {
  const bySlot = new Map<string, Body[]>();
  for (const body of bodies) {
    if (!body.holder || body.slot === null) continue;
    const key = `${body.slot} ${body.holder.holder.holderId}`;
    const inSlot = bySlot.get(key);
    if (inSlot) inSlot.push(body);
    else bySlot.set(key, [body]);
  }
  return [...bySlot.values()].flatMap((inSlot) => {
    const [first] = inSlot;
    if (!first?.holder || inSlot.length < 2) return [];
    const { holder } = first.holder;
    const names = listWords(inSlot.map((body) => scene.nameOf(body.package)));
    const count = countWords(inSlot.length, 'pouch', 'pouches');
    return {
      subjects: [holder.holderId, ...inSlot.map((body) => body.packageId)],
      title: `${scene.holderName(holder)}, slot ${first.slot ?? ''} has ${count}: ${names}`,
      remedy: 'Leave one and give the others a slot each.',
      places: [onHolder(holder, first.slot), ...onPackage(...inSlot)],
      figure: { measured: inSlot.length, limit: 1, unit: 'count', want: 'at-most', limitFrom: 'equipment' },
      *fixes(scene) {
        if (inSlot.length > 2) return;
        for (const body of [...inSlot].reverse()) {
          yield* moveNamed(scene, body);
        }
      },
    };
  });
}
