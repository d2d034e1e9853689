/*
 * A shelf carries no more than it is made for.
 * Source: the limit of the shelf, as entered by the facility; how much of it is kept back is the facility's to set.
 */
import { isSensibleMass, massOrNothing } from '../sensible';
import { overMassLimit } from './mass-limit';
import { onShelf } from './places';
import type { Draft, Rule } from './rule';
import type { OnShelf, Scene } from './scene';
import { equipment } from './sources';

export const shelfMass: Rule = {
  id: 'shelf-mass',
  about: 'shelf',
  name: 'Shelves carry what they are made for',
  reason: 'An overloaded shelf bends or tips, and much metal on one shelf makes much water on it.',
  source: equipment,
  severity: 'stop',
  parameters: ['massMarginPercent'],
  find,
};

function find(scene: Scene, { shelf, bodies, holders }: OnShelf): readonly Draft[] {
  if (!isSensibleMass(shelf.greatestMassKg)) return [];
  const over = overMassLimit({
    what: `what is on ${shelf.name}`,
    measured:
      bodies.reduce((sum, body) => sum + massOrNothing(body.item.massKg), 0) +
      holders.reduce((sum, holder) => sum + massOrNothing(holder.kind.massKg), 0),
    limit: shelf.greatestMassKg,
    marginPercent: scene.policy.massMarginPercent,
  });
  return over
    ? [{ subjects: [shelf.id], remedy: 'Move something to another shelf.', places: onShelf(shelf), ...over }]
    : [];
}
