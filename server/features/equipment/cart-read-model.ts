import type { CartOnFile } from '#contract/equipment';
import type { Db, Transaction } from '../../platform/db';
import { NotFound } from '../../platform/errors';
import { pageOf, whereFound, type ListFilters } from '../../platform/paged-list';
import { keptCarts, type KeptCart } from './cart-store';
import type { CartRow } from './equipment-rows';

function onFile({ id, version, own, shelves }: KeptCart): CartOnFile {
  return {
    ...own,
    id,
    version,
    shelves: shelves.map((shelf) => ({ ...shelf.fields, id: shelf.id, placeCode: shelf.placeCode })),
  };
}

export async function getCart(trx: Transaction | Db, facilityId: string, cartId: string): Promise<CartOnFile> {
  const row = await trx('carts')
    .where({ 'carts.facility_id': facilityId, 'carts.id': cartId })
    .first<CartRow | undefined>('carts.*');
  const [kept] = row ? await keptCarts(trx, [row]) : [];
  if (!kept) throw new NotFound('cart.none', 'There is no such cart here.');
  return onFile(kept);
}

/** One page of the facility's carts by code, found also by the place code of a shelf. */
export async function listCarts(db: Db, facilityId: string, { search, page, pageSize }: ListFilters) {
  const wanted = db('carts').where('carts.facility_id', facilityId);
  const placeCodes = `(select string_agg(shelves.place_code, ' ') from shelves where shelves.cart_id = carts.id)`;
  whereFound(wanted, search, ['carts.code', 'carts.name', 'carts.note', db.raw(placeCodes)]);
  const { rows, ...paging } = await pageOf<CartRow>(wanted, {
    page,
    pageSize,
    orderBy: ['carts.code'],
    select: ['carts.*'],
  });
  return { carts: (await keptCarts(db, rows)).map(onFile), ...paging };
}
