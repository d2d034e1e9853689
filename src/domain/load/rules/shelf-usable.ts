/*
 * Nothing is on a shelf that has been taken out of use.
 * Source: the facility's own word about its equipment.
 */
import { onShelf } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';
import { equipment } from './sources';
import { countWords } from './words';

export const shelfUsable: Rule = {
  id: 'shelf-usable',
  about: 'load',
  name: 'Shelves are fit for use',
  reason: 'A bent or loose shelf tips its load, or lets it slide against the chamber wall.',
  source: equipment,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene): readonly Draft[] {
  return scene.view.cart.shelves
    .filter((shelf) => !shelf.isUsable)
    .flatMap((shelf) => {
      const packages = scene.listed.filter((listed) => scene.shelfIdOf(listed) === shelf.id);
      const holders = scene.view.holders.filter((holder) => holder.shelfId === shelf.id);
      const count = packages.length + holders.length;
      if (count === 0) return [];
      return {
        subjects: [shelf.id],
        title: `${shelf.name} is out of use and has ${countWords(count, 'thing', 'things')} on it`,
        remedy: 'Clear the shelf.',
        places: onShelf(shelf),
      };
    });
}
