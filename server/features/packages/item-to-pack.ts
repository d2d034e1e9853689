import type { ItemKind } from '#domain/load/model';
import type { ExpiryRule } from '#domain/package/expiry';
import type { Db, Transaction } from '../../platform/db';
import { NotFound } from '../../platform/errors';

export type ItemToPack = {
  readonly id: string;
  readonly code: string;
  readonly name: string;
  readonly kind: ItemKind;
  readonly mass_kg: number;
  readonly mass_limit_kg: number | null;
  readonly expiry_rule: 'event-related' | 'dated';
  readonly expiry_days: number | null;
  readonly ifu_reference: string | null;
  readonly is_retired: boolean;
};

const columns = [
  'items.id',
  'items.code',
  'items.name',
  'items.kind',
  'items.mass_kg',
  'items.mass_limit_kg',
  'items.expiry_rule',
  'items.expiry_days',
  'items.ifu_reference',
  'items.is_retired',
] as const;

/** Shared lock: nobody retires the item between the decision and the labels. */
export async function getItemToPack(trx: Transaction, facilityId: string, itemId: string): Promise<ItemToPack> {
  const row = await trx('items')
    .where({ 'items.id': itemId, 'items.facility_id': facilityId })
    .forShare()
    .first<ItemToPack | undefined>(...columns);
  if (!row) throw new NotFound('item.none', 'There is no such item in this catalogue.');
  return row;
}

export function expiryRuleOf(item: ItemToPack): ExpiryRule {
  return item.expiry_rule === 'dated' && item.expiry_days !== null
    ? { rule: 'dated', days: item.expiry_days }
    : { rule: 'event-related' };
}

/** The whole catalogue, as packing looks at it. */
export function listItemsToPack(trx: Transaction | Db, facilityId: string): Promise<ItemToPack[]> {
  return trx('items')
    .where('items.facility_id', facilityId)
    .select<ItemToPack[]>(...columns);
}
