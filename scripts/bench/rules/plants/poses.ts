import type { CatalogueItem, Pose } from '../../../../src/domain/load/model';
import { changeItemOf, changePackage, pickPlaced } from '../change';
import { onPackage, type Fault, type Host, type Planted } from '../fault';
import type { Placed } from '../geometry';
import type { Random } from '../random';

/* Trays, containers, basins and textile packs that stand or lie as they should not. */

function onDeck(placed: Placed, kinds: readonly CatalogueItem['kind'][]): boolean {
  return placed.one.placement?.at === 'shelf' && kinds.includes(placed.item.kind);
}

function posed(kinds: readonly CatalogueItem['kind'][], pose: Pose, isRight: (item: CatalogueItem) => boolean) {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, (each) => onDeck(each, kinds) && isRight(each.item));
    if (placed?.one.placement?.at !== 'shelf') return null;
    return {
      view: changePackage(host.view, placed.one.packageId, { placement: { ...placed.one.placement, pose } }),
      at: [onPackage(placed.one.packageId)],
    };
  };
}

/** Lies flat as before, and turns out to have a solid floor. */
function solidFloor(pose: Pose) {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, (each) => onDeck(each, ['wrapped-tray']) && each.item.pose === 'flat');
    if (!placed) return null;
    return {
      view: changeItemOf(host.view, placed, { isPerforated: false, pose }),
      at: [onPackage(placed.one.packageId)],
    };
  };
}

const isFlat = (item: CatalogueItem) => item.pose === 'flat';
const isTilted = (item: CatalogueItem) => item.pose === 'tilted';
const always = () => true;

export const poseFaults: readonly Fault[] = [
  { name: 'tray-on-edge', rule: 'tray-flat', plant: posed(['wrapped-tray'], 'on-edge', isFlat) },
  { name: 'tray-tilted', rule: 'tray-flat', plant: posed(['wrapped-tray'], 'tilted', isFlat) },
  { name: 'container-on-edge', rule: 'tray-flat', plant: posed(['rigid-container'], 'on-edge', isFlat) },
  { name: 'container-tilted', rule: 'tray-flat', plant: posed(['rigid-container'], 'tilted', isFlat) },
  { name: 'basin-level', rule: 'basin-drains', plant: posed(['basin'], 'flat', always) },
  { name: 'solid-tray-level', rule: 'basin-drains', plant: posed(['wrapped-tray'], 'flat', isTilted) },
  { name: 'solid-floor-to-be-tilted', rule: 'basin-drains', plant: solidFloor('tilted') },
  { name: 'solid-floor-said-flat', rule: 'basin-drains', orRules: ['tray-flat'], plant: solidFloor('flat') },
  { name: 'textile-flat', rule: 'textile-on-edge', plant: posed(['textile-pack'], 'flat', always) },
  { name: 'textile-tilted', rule: 'textile-on-edge', plant: posed(['textile-pack'], 'tilted', always) },
];
