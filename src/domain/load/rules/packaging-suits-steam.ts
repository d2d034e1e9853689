/*
 * A package is wrapped in something that steam gets through and that keeps it sterile afterwards, and a pouch is a pouch.
 * Source: RACGP section 10, loading: avoid wrapped and unwrapped together; pouches only for small, light, low-profile items by a
 * perioperative packaging guideline of 2019 (summary).
 */
import type { CatalogueItem, Program } from '../model';
import { takeOff } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { Listed, Scene } from './scene';
import { racgpLoading } from './sources';

export const packagingSuitsSteam: Rule = {
  id: 'packaging-suits-steam',
  about: 'package',
  name: 'Packaging suits the cycle',
  reason: 'Unwrapped things lose their sterility as soon as the door opens, and drip on wrapped ones.',
  source: racgpLoading,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene, { one, item }: Listed): Draft | null {
  const says = item && unsuited(item, scene.view.program);
  if (!says) return null;
  return {
    subjects: [one.packageId],
    title: `${scene.nameOf(one)} ${says}`,
    remedy: 'Take it off the load and have it packed again.',
    places: onPackage(one),
    fixes: () => [takeOff(one)],
  };
}

function unsuited({ kind, packaging }: CatalogueItem, program: Program): string | null {
  if (kind === 'challenge-device') return null;
  // Immediate use is for unwrapped things; in any other program they have to be wrapped.
  if (packaging === 'none')
    return program.type === 'immediate-use' ? null : `is not wrapped, and ${program.code} is for wrapped goods`;
  const isPouch = packaging === 'paper-film-pouch' || packaging === 'double-pouch';
  return isPouch && kind !== 'pouch' ? 'is packed in a pouch, which is for small and light things' : null;
}
