/*
 * Every size, mass and place the rules measure with is a number that can be true.
 * Source: our own check; a load can be judged only from data that make sense.
 */
import type { FindingPlace } from '../finding';
import type { CatalogueItem, Shelf, Sterilizer } from '../model';
import { isSensibleLength, isSensibleMass } from '../sensible';
import { onLoad, onPackage, onShelf } from './places';
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
  const { cart, sterilizer } = scene.view;
  return [
    ...ofPackages(scene),
    ...cart.shelves.flatMap((shelf) => told(shelf.id, shelf.name, wrongOfShelf(shelf, sterilizer), onShelf(shelf))),
    ...told(sterilizer.id, sterilizer.name, wrongOfSterilizer(sterilizer), onLoad),
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

function wrongOfItem(item: CatalogueItem): string | null {
  const lengths = { length: item.lengthMm, width: item.widthMm, height: item.heightMm };
  const [badLength] = Object.entries(lengths).filter(([, value]) => !isSensibleLength(value));
  if (badLength) return `a ${badLength[0]} of ${badLength[1]} mm`;
  const masses = { mass: item.massKg, 'metal mass': item.metalMassKg, 'textile mass': item.textileMassKg };
  const [badMass] = Object.entries(masses).filter(([, value]) => !isSensibleMass(value));
  return badMass ? `a ${badMass[0]} of ${badMass[1]} kg` : null;
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

function wrongOfShelf(shelf: Shelf, sterilizer: Sterilizer): string | null {
  if (!isSensibleLength(shelf.widthMm)) return `a width of ${shelf.widthMm} mm`;
  if (!isSensibleLength(shelf.depthMm)) return `a depth of ${shelf.depthMm} mm`;
  if (!isSensibleLength(shelf.clearHeightMm)) return `a clear height of ${shelf.clearHeightMm} mm`;
  if (!isSensibleMass(shelf.greatestMassKg)) return `a greatest mass of ${shelf.greatestMassKg} kg`;
  if (shelf.widthMm > sterilizer.chamberWidthMm || shelf.depthMm > sterilizer.chamberDepthMm) {
    return `a size of ${shelf.widthMm} × ${shelf.depthMm} mm, more than the chamber of ${sterilizer.name}`;
  }
  return null;
}

function wrongOfSterilizer(sterilizer: Sterilizer): string | null {
  if (!isSensibleLength(sterilizer.chamberWidthMm)) return `a chamber width of ${sterilizer.chamberWidthMm} mm`;
  if (!isSensibleLength(sterilizer.chamberDepthMm)) return `a chamber depth of ${sterilizer.chamberDepthMm} mm`;
  if (!isSensibleMass(sterilizer.greatestLoadMassKg)) return `a load limit of ${sterilizer.greatestLoadMassKg} kg`;
  return null;
}
