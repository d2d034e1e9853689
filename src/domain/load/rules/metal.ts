import { areaOf, commonRect, type ShelfRect } from '../../geometry/box';
import { mm } from '../../units/quantity';
import type { Body } from '../layout';
import { limitOf, type LoadPolicy } from '../policy';
import { massOrNothing } from '../sensible';
import { slackKg, slackMm } from './slack';

/** Whether a thing holds enough metal for its water to matter to textiles below it. */
export function hasMetal(body: Body, policy: LoadPolicy): boolean {
  const metal = massOrNothing(body.item.metalMassKg);
  return metal > 0 && metal >= limitOf(null, policy, 'metalOverTextileKg').limit - slackKg;
}

/** Whether metal is above a textile: on it, over it on the same shelf, or over it on a higher shelf. */
export function isMetalOver(upper: Body, lower: Body, policy: LoadPolicy): boolean {
  if (lower.item.kind !== 'textile-pack' || upper.item.kind === 'textile-pack' || !hasMetal(upper, policy))
    return false;
  const isHigher =
    upper.shelf === lower.shelf ? upper.box.bottom >= lower.box.top - slackMm : upper.shelf.level > lower.shelf.level;
  if (!isHigher) return false;
  const shared = commonRect(fromMiddle(upper), fromMiddle(lower));
  return shared !== null && areaOf(shared) > 1;
}

/** Shelves of one cart are taken to stand centred over each other, whatever their sizes. */
function fromMiddle({ box, shelf }: Body): ShelfRect {
  const [x, y] = [shelf.widthMm / 2, shelf.depthMm / 2];
  return { left: mm(box.left - x), right: mm(box.right - x), front: mm(box.front - y), back: mm(box.back - y) };
}
