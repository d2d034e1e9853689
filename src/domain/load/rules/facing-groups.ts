import type { Body, Side } from '../layout';
import type { PaperSide } from '../model';

/** Pouches on edge whose paper sides have to agree: on one shelf, faces across the same axis. Sorted by package id. */
export function facingGroups(bodies: readonly Body[]): readonly (readonly Body[])[] {
  const groups = new Map<string, Body[]>();
  for (const body of bodies) {
    if (body.thinAxis === null || body.paperLooks === null) continue;
    const key = `${body.shelf.id} ${body.thinAxis}`;
    const group = groups.get(key);
    if (group) group.push(body);
    else groups.set(key, [body]);
  }
  return [...groups.values()];
}

/** The side most papers look to. With as many each way, the side of the first by package id: a choice that no drawing mirrors away. */
export function majoritySide(group: readonly Body[]): Side | null {
  const countOf = new Map<Side, number>();
  let best: Side | null = null;
  for (const { paperLooks } of group) {
    if (paperLooks !== null) countOf.set(paperLooks, (countOf.get(paperLooks) ?? 0) + 1);
  }
  // Insertion order is the order of package ids, so a tie goes to the first one seen.
  for (const [side, count] of countOf) {
    if (best === null || count > (countOf.get(best) ?? 0)) best = side;
  }
  return best;
}

export function otherPaper(paper: PaperSide): PaperSide {
  const others = { left: 'right', right: 'left', up: 'down', down: 'up' } as const;
  return others[paper];
}
