import type { Body, HolderBody, Layout, Side } from './layout';
import type { CatalogueItem, HolderKind, PaperSide } from './model';
import { facingRuleOf, limitOf, type LoadPolicy } from './policy';
import { otherPaper } from './rules/facing-groups';
import { isUsableRack, misfitsOf } from './rules/holder-fit';
import { clearanceOf } from './rules/near-pairs';
import { slackMm } from './rules/slack';

/** Whether a pouch stands in this kind of holder at all: not too tall, long or thick for it. */
export function fitsHolder(item: CatalogueItem, kind: HolderKind): boolean {
  return item.kind === 'pouch' && isUsableRack(kind) && misfitsOf(item, kind).length === 0;
}

/** Slots of a rack, counted from 1, that are free and keep the gap this pouch and its neighbours ask for. */
export function freeSlots(
  layout: Layout,
  { holder, kind }: HolderBody,
  item: CatalogueItem,
  policy: LoadPolicy,
): readonly number[] {
  if (!fitsHolder(item, kind) || !isUsableRack(kind)) return [];
  const gapMm = limitOf(item.clearanceMm, policy, 'pouchGapMm').limit;
  const inside = insideOf(layout, holder.holderId);
  const keepsGap = (slot: number) =>
    inside.every((body) => {
      if (body.slot === null) return true;
      const free = Math.abs(body.slot - slot) * kind.pitchMm - (item.heightMm + body.item.heightMm) / 2;
      return body.slot !== slot && free >= Math.max(gapMm, clearanceOf(body, policy).limit) - slackMm;
    });
  return Array.from({ length: kind.slots }, (_, index) => index + 1).filter(keepsGap);
}

/**
 * Where the paper side of a pouch put into a slot should look, by its instructions or the house rule and by what stands there
 * already: one way like most others on the shelf, alternating like or unlike the nearest neighbour; left where nothing stands.
 */
export function paperForSlot(
  { layout, item, policy }: { readonly layout: Layout; readonly item: CatalogueItem; readonly policy: LoadPolicy },
  { holder, shelf }: HolderBody,
  slot: number,
): PaperSide {
  if (facingRuleOf(item, policy) === 'alternating') {
    const neighbours = insideOf(layout, holder.holderId).flatMap((body) =>
      body.slot !== null && isLeftOrRight(body.placement.paper)
        ? [{ away: Math.abs(body.slot - slot), paper: body.placement.paper }]
        : [],
    );
    const [nearest] = neighbours.sort((a, b) => a.away - b.away);
    if (!nearest) return 'left';
    return nearest.away % 2 === 1 ? otherPaper(nearest.paper) : nearest.paper;
  }
  // Turned by a quarter, the left side of a rack looks to the door and its right side away from it.
  const [left, right]: readonly [Side, Side] = holder.turn === 0 ? ['left', 'right'] : ['front', 'back'];
  const looking = (bodies: readonly Body[], side: Side) => bodies.filter((body) => body.paperLooks === side).length;
  const here = layout.bodies.filter((body) => body.shelf === shelf);
  const difference = looking(here, right) - looking(here, left);
  if (difference !== 0) return difference > 0 ? 'right' : 'left';
  // As many each way: the rules then go by the first, so the new one does as well.
  return here.find((body) => body.paperLooks === left || body.paperLooks === right)?.paperLooks === right
    ? 'right'
    : 'left';
}

export function insideOf(layout: Layout, holderId: string): readonly Body[] {
  return layout.bodies.filter((body) => body.holder?.holder.holderId === holderId);
}

function isLeftOrRight(paper: PaperSide | null): paper is 'left' | 'right' {
  return paper === 'left' || paper === 'right';
}
