import type { Figure } from '../finding';
import type { HolderBody } from '../layout';
import type { CatalogueItem, HolderKind } from '../model';
import { isSensibleLength } from '../sensible';
import { slackMm } from './slack';

export type Misfit = { readonly what: 'tall' | 'long' | 'thick'; readonly figure: Figure };

/** Where a pouch on edge exceeds what a holder takes, the worst first; empty where it fits. */
export function misfitsOf(item: CatalogueItem, kind: HolderKind): readonly Misfit[] {
  const measures = [
    { what: 'tall', measured: item.widthMm, limit: kind.greatestHeightMm },
    { what: 'long', measured: item.lengthMm, limit: kind.greatestLengthMm },
    { what: 'thick', measured: item.heightMm, limit: kind.greatestThicknessMm },
  ] as const;
  return measures
    .flatMap(({ what, measured, limit }) =>
      limit !== null && measured > limit + slackMm
        ? [{ what, figure: { measured, limit, unit: 'mm', want: 'at-most', limitFrom: 'equipment' } as const }]
        : [],
    )
    .sort((a, b) => b.figure.measured - b.figure.limit - (a.figure.measured - a.figure.limit));
}

export function isUsableRack(kind: HolderKind): kind is HolderKind & { slots: number; pitchMm: number } {
  return (
    kind.form === 'rack' &&
    kind.slots !== null &&
    kind.slots > 0 &&
    kind.pitchMm !== null &&
    isSensibleLength(kind.pitchMm)
  );
}

/** Racks that take this pouch with its gap, the one its catalogue entry prefers first, then the closest fit. */
export function rackKindsFor(item: CatalogueItem, kinds: readonly HolderKind[], gapMm: number): readonly HolderKind[] {
  return kinds
    .filter(isUsableRack)
    .filter((kind) => misfitsOf(item, kind).length === 0 && item.heightMm + gapMm <= kind.pitchMm + slackMm)
    .sort((a, b) => rank(a) - rank(b) || a.pitchMm - b.pitchMm || (a.code < b.code ? -1 : 1));

  function rank(kind: HolderKind): number {
    return kind.code === item.preferredHolder ? 0 : 1;
  }
}

/** Holders on the cart that take this pouch, the preferred kind first. */
export function racksFor(item: CatalogueItem, holders: readonly HolderBody[], gapMm: number): readonly HolderBody[] {
  const order = rackKindsFor(item, [...new Set(holders.map((holder) => holder.kind))], gapMm);
  return order.flatMap((kind) => holders.filter((holder) => holder.kind === kind));
}

/** Whether a holder takes up room of its own: a wedge or a spacer is meant to be under something. */
export function hasFrame({ kind }: HolderBody): boolean {
  return kind.form === 'rack' || kind.form === 'basket';
}
