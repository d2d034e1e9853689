import type { Db, Transaction } from '../../platform/db';

/** Number of the load that a holder is on, while it is being built. */
export async function openLoadOfHolder(db: Db | Transaction, holderId: string): Promise<string | undefined> {
  const row = await db('load_holders as placed')
    .join('loads as load', 'load.id', 'placed.load_id')
    .where({ 'placed.holder_id': holderId, 'placed.is_open': true })
    .first<{ number: string } | undefined>('load.number');
  return row?.number;
}

export type CartInUse = { readonly number: string; readonly openedBy: string };

function loadsBeingBuilt(db: Db | Transaction) {
  return db('loads as load').join('people as person', 'person.id', 'load.opened_by').where('load.state', 'building');
}

/** Number and builder of the load that a cart carries, while it is being built. */
export async function buildingLoadOfCart(db: Db | Transaction, cartId: string): Promise<CartInUse | undefined> {
  const row = await loadsBeingBuilt(db)
    .where('load.cart_id', cartId)
    .first<{ number: string; display_name: string } | undefined>('load.number', 'person.display_name');
  return row && { number: row.number, openedBy: row.display_name };
}

/** The same of all the facility's carts, in one reading. */
export async function buildingLoadsOf(
  db: Db | Transaction,
  facilityId: string,
): Promise<ReadonlyMap<string, CartInUse>> {
  const rows = await loadsBeingBuilt(db)
    .where('load.facility_id', facilityId)
    .select<{ cart_id: string; number: string; display_name: string }[]>(
      'load.cart_id',
      'load.number',
      'person.display_name',
    );
  return new Map(rows.map((row) => [row.cart_id, { number: row.number, openedBy: row.display_name }]));
}
