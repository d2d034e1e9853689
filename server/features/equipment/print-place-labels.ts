import type { PlaceLabelQuery } from '#contract/equipment';
import type { Db } from '../../platform/db';
import { NotFound } from '../../platform/errors';
import { drawPlaceLabels, type PlaceLabel } from '../labels/draw/draw-place-labels';
import { getCart } from './cart-read-model';
import { holdersWithKind, type HolderWithKindRow } from './holder-read-model';

type Wanted = Omit<PlaceLabelQuery, 'layout'>;

async function shelfLabels(db: Db, facilityId: string, cartId: string): Promise<PlaceLabel[]> {
  const cart = await getCart(db, facilityId, cartId);
  return cart.shelves.map((shelf) => ({ code: shelf.placeCode, name: `${cart.name}, ${shelf.name}`, note: null }));
}

async function holderLabels(db: Db, facilityId: string, { holderKindId, holderId }: Wanted): Promise<PlaceLabel[]> {
  const wanted = holdersWithKind(db, facilityId);
  if (holderId !== undefined) void wanted.where('holders.id', holderId);
  else void wanted.where('holders.holder_kind_id', holderKindId).whereNot('holders.condition', 'missing');
  const rows = await wanted
    .orderBy('holders.place_code')
    .select<(HolderWithKindRow & { readonly slots: number | null })[]>(
      'holders.*',
      'holder_kinds.name as kind_name',
      'holder_kinds.slots',
    );
  return rows.map((row) => ({
    code: row.place_code,
    name: row.name,
    note: row.slots === null ? row.kind_name : `${row.kind_name}, ${row.slots} slots`,
  }));
}

/**
 * Labels of places as a PDF. They carry nothing but the place's own code and name, so any number of them may be printed.
 * @throws NotFound where there is no such place in the facility
 */
export async function printPlaceLabels(
  db: Db,
  { facilityId, at, query }: { readonly facilityId: string; readonly at: Date; readonly query: PlaceLabelQuery },
): Promise<Buffer> {
  const labels =
    query.cartId === undefined
      ? await holderLabels(db, facilityId, query)
      : await shelfLabels(db, facilityId, query.cartId);
  if (labels.length === 0)
    throw new NotFound('place-label.none', 'There is no holder here that this label would be for.');
  return drawPlaceLabels(labels, { layout: query.layout, printedAt: at.toISOString() });
}
