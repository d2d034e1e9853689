import type { CartFields, ShelfFields } from '#domain/catalogue/equipment-fields';
import type { Db, Transaction } from '../../platform/db';
import { groupBy } from '../../platform/group-by';
import { putRows } from '../../platform/register/put-rows';
import { shelfFromRow, type CartRow, type ShelfRow } from './equipment-rows';
import { takePlaceCodes } from './place-codes';

export type CartOwn = Omit<CartFields, 'shelves'>;
export type KeptShelf = { readonly id: string; readonly placeCode: string; readonly fields: ShelfFields };
export type KeptCart = {
  readonly id: string;
  readonly version: number;
  readonly own: CartOwn;
  /** From the lowest up. */
  readonly shelves: readonly KeptShelf[];
};

function keptShelf(row: ShelfRow): KeptShelf {
  const { id, placeCode, ...fields } = shelfFromRow(row);
  return { id, placeCode, fields };
}

/** Puts its shelves to each cart. */
export async function keptCarts(trx: Transaction | Db, rows: readonly CartRow[]): Promise<KeptCart[]> {
  const shelves = await trx('shelves')
    .whereIn(
      'shelves.cart_id',
      rows.map((row) => row.id),
    )
    .orderBy('shelves.level')
    .select<ShelfRow[]>('shelves.*');
  const byCart = groupBy(shelves, (shelf) => shelf.cart_id);
  return rows.map((row) => ({
    id: row.id,
    version: row.version,
    own: { code: row.code, name: row.name, sizeClass: row.size_class, isUsable: row.is_usable, note: row.note },
    shelves: (byCart.get(row.id) ?? []).map(keptShelf),
  }));
}

export async function listKeptCarts(trx: Transaction | Db, facilityId: string): Promise<KeptCart[]> {
  const rows = await trx('carts').where('carts.facility_id', facilityId).select<CartRow[]>('carts.*');
  return keptCarts(trx, rows);
}

export type PutCart = {
  readonly id: string;
  readonly version: number;
  readonly own: CartOwn;
  /** Those to add or change; what is not named stays. */
  readonly shelves: readonly { readonly id: string; readonly placeCode: string | null; readonly fields: ShelfFields }[];
};

/** Puts carts and shelves in, or in the place of what they were; a shelf without a place code is given one. */
export async function putCarts(trx: Transaction, facilityId: string, carts: readonly PutCart[]): Promise<void> {
  const uncoded = carts.flatMap((cart) => cart.shelves).filter((shelf) => shelf.placeCode === null);
  const codes = await takePlaceCodes(trx, 'shelf', uncoded.length);
  const given = new Map(uncoded.map((shelf, at) => [shelf.id, codes[at]]));
  const cartRows = carts.map(({ id, version, own }) => ({
    id,
    facility_id: facilityId,
    version,
    code: own.code,
    name: own.name,
    size_class: own.sizeClass,
    is_usable: own.isUsable,
    note: own.note,
  }));
  const shelfRows = carts.flatMap((cart) =>
    cart.shelves.map(({ id, placeCode, fields }) => ({
      id,
      cart_id: cart.id,
      place_code: placeCode ?? given.get(id),
      level: fields.level,
      name: fields.name,
      width_mm: fields.widthMm,
      depth_mm: fields.depthMm,
      clear_height_mm: fields.clearHeightMm,
      surface: fields.surface,
      greatest_mass_kg: fields.greatestMassKg,
      is_usable: fields.isUsable,
    })),
  );
  await putRows(trx, 'carts', cartRows);
  await putRows(trx, 'shelves', shelfRows);
}
