/*
 * Each shelf, also an empty one, has been counted by a person who did not see the scanned number.
 * Source: our own rule; accountability for each package asks for nothing unscanned.
 */
import { onShelf } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';
import { talliesOf } from './shelf-tally';
import { accountability } from './sources';

export const countMissing: Rule = {
  id: 'count-missing',
  about: 'load',
  name: 'Every shelf is counted',
  reason: 'Only a count shows that nothing lies on the cart that was never scanned.',
  source: accountability,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene): readonly Draft[] {
  return talliesOf(scene)
    .filter(({ counted }) => counted === null)
    .map(({ shelf }) => ({
      subjects: [shelf.id],
      title: `${shelf.name} has not been counted`,
      remedy: 'Count the pieces on the shelf and type the number.',
      places: onShelf(shelf),
    }));
}
