import type { Db, Transaction } from '../../platform/db';

/** Number of the load that a holder is on, while it is being built. */
export async function openLoadOfHolder(db: Db | Transaction, holderId: string): Promise<string | undefined> {
  const row = await db('load_holders as placed')
    .join('loads as load', 'load.id', 'placed.load_id')
    .where({ 'placed.holder_id': holderId, 'placed.is_open': true })
    .first<{ number: string } | undefined>('load.number');
  return row?.number;
}

/** Number and builder of the load that a cart carries, while it is being built. */
export async function buildingLoadOfCart(
  db: Db | Transaction,
  cartId: string,
): Promise<{ readonly number: string; readonly openedBy: string } | undefined> {
  const row = await db('loads as load')
    .join('people as person', 'person.id', 'load.opened_by')
    .where({ 'load.cart_id': cartId, 'load.state': 'building' })
    .first<{ number: string; display_name: string } | undefined>('load.number', 'person.display_name');
  return row && { number: row.number, openedBy: row.display_name };
}
