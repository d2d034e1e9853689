import type { LoadHolder, LoadView } from '../../../src/domain/load/model';
import { mm } from '../../../src/domain/units/quantity';
import { changePackage } from './change';
import { onHolder, onPackage, type Host, type Place } from './fault';
import { holderSize, kindOf, rectOf, type Placed, type Rect } from './geometry';

/* What the faults of space have in common. */

export function onDeck(each: Placed): boolean {
  return each.one.placement?.at === 'shelf';
}

export function slid(view: LoadView, placed: Placed, x: number, y: number): LoadView {
  const placement = placed.one.placement;
  if (placement?.at !== 'shelf') return view;
  return changePackage(view, placed.one.packageId, { placement: { ...placement, xMm: mm(x), yMm: mm(y) } });
}

export function holderRect(host: Host, holder: LoadHolder): Rect {
  return rectOf(holder.xMm, holder.yMm, holderSize(kindOf(host.view, holder), holder.turn));
}

/** A holder and everything in it. */
export function placesOf(host: Host, holder: LoadHolder): readonly Place[] {
  const inside = host.placed.filter((each) => each.holder?.holderId === holder.holderId);
  return [onHolder(holder.holderId), ...inside.map((each) => onPackage(each.one.packageId))];
}
