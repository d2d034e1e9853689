/*
 * Every size, mass and place the rules measure with is a number that can be true.
 * Source: our own check; a load can be judged only from data that make sense.
 */
import type { FindingPlace } from '../finding';
import {
  wrongOfHolderKind,
  wrongOfItem,
  wrongOfPolicy,
  wrongOfProgram,
  wrongOfShelf,
  wrongOfSterilizer,
} from './measures';
import { onHolder, onLoad, onPackage, onShelf } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';
import { drawing } from './sources';

export const sizeMakesNoSense: Rule = {
  id: 'size-makes-no-sense',
  about: 'load',
  name: 'Sizes make sense',
  reason: 'With a size that cannot be true every answer about room, weight and water is wrong.',
  source: drawing,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene): readonly Draft[] {
  const { cart, sterilizer, program } = scene.view;
  return [
    ...ofPackages(scene),
    ...ofHolders(scene),
    ...cart.shelves.flatMap((shelf) => told(shelf.id, shelf.name, wrongOfShelf(shelf, sterilizer), onShelf(shelf))),
    ...told(sterilizer.id, sterilizer.name, wrongOfSterilizer(sterilizer), onLoad),
    ...told(program.id, program.code, wrongOfProgram(program), onLoad),
    ...wrongOfPolicy(scene.policy).map((label) => ({
      subjects: [label],
      title: `The house rule “${label}” is set to something that cannot be`,
      remedy: 'Have the house rule mended.',
      places: onLoad,
    })),
  ];
}

function ofPackages(scene: Scene): readonly Draft[] {
  const wrongOf = new Map<string, string>();
  for (const item of scene.view.items) {
    const wrong = wrongOfItem(item);
    if (wrong !== null) wrongOf.set(item.id, wrong);
  }
  const { nowhere } = scene.layout;
  if (wrongOf.size === 0 && nowhere.size === 0) return [];
  return scene.listed.flatMap(({ one, name }) => {
    const isFarOff = nowhere.get(one.packageId) === 'position-makes-no-sense';
    const wrong = wrongOf.get(one.itemId) ?? (isFarOff ? 'a place that is nowhere near the cart' : null);
    return told(one.packageId, name, wrong, onPackage(one));
  });
}

function ofHolders(scene: Scene): readonly Draft[] {
  const wrongOf = new Map(scene.view.holderKinds.map((kind) => [kind.id, wrongOfHolderKind(kind)]));
  return scene.view.holders.flatMap((holder) =>
    told(holder.holderId, scene.holderName(holder), wrongOf.get(holder.kindId) ?? null, [onHolder(holder)]),
  );
}

function told(id: string, name: string, wrong: string | null, places: readonly FindingPlace[]): readonly Draft[] {
  if (wrong === null) return [];
  return [
    {
      subjects: [id],
      title: `${name} has ${wrong}, which cannot be`,
      remedy: 'Have the entry mended, or place the package again.',
      places,
    },
  ];
}
