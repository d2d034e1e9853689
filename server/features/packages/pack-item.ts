import type { PackRequest, PackResponse } from '#contract/packages';
import type { ItemKind } from '#domain/load/model';
import { decidePacking, defaultPackingPolicy, type PackingRefusal } from '#domain/package/decide-packing';
import { expiresOn, type ExpiryRule } from '#domain/package/expiry';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import type { Transaction } from '../../platform/db';
import { NotFound, type FieldProblem } from '../../platform/errors';
import { once } from '../../platform/once';
import { facilityDay } from './facility-day';
import { takePackageCodes } from './package-codes';
import { insertPackages, type NewPackage } from './package-store';
import { refusalError } from './refusal';

type ItemToPack = {
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

/** Shared lock: nobody retires the item between the decision and the labels. */
async function getItemToPack(trx: Transaction, facilityId: string, itemId: string): Promise<ItemToPack> {
  const row = await trx('items')
    .where({ 'items.id': itemId, 'items.facility_id': facilityId })
    .forShare()
    .first<ItemToPack | undefined>(
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
    );
  if (!row) throw new NotFound('item.none', 'There is no such item in this catalogue.');
  return row;
}

function expiryRuleOf(item: ItemToPack): ExpiryRule {
  return item.expiry_rule === 'dated' && item.expiry_days !== null
    ? { rule: 'dated', days: item.expiry_days }
    : { rule: 'event-related' };
}

const fieldOf: Readonly<Record<PackingRefusal, string>> = {
  'package.item-retired': '/body/itemId',
  'package.contents-not-confirmed': '/body/isContentsConfirmed',
  'package.internal-indicator-missing': '/body/hasInternalIndicator',
};

/** Makes packages of one item, each with a code of its own, on one person's word about what is inside. */
export async function packItem(services: Services, actor: Actor, request: PackRequest): Promise<PackResponse> {
  const { db, clock, ids } = services;
  return once(
    { db, clock, actor },
    { requestId: request.requestId, act: 'package.pack', body: request },
    async (trx) => {
      const at = clock.now();
      const item = await getItemToPack(trx, actor.facilityId, request.itemId);
      const decision = decidePacking(
        {
          code: item.code,
          name: item.name,
          isRetired: item.is_retired,
          ifuReference: item.ifu_reference,
          massKg: item.mass_kg,
          massLimitKg: item.mass_limit_kg,
        },
        request,
        defaultPackingPolicy,
      );
      if (!decision.ok) {
        const field: FieldProblem = { pointer: fieldOf[decision.refusal.code], detail: decision.refusal.sentence };
        throw refusalError(decision.refusal, [field]);
      }
      const { day } = await facilityDay(trx, actor.facilityId, at);
      const codes = await takePackageCodes(trx, item.kind, request.quantity);
      const made = codes.map((code): NewPackage => ({
        id: ids.next(),
        facilityId: actor.facilityId,
        code,
        itemId: item.id,
        packedBy: actor.personId,
        packedAt: at,
        hasInternalIndicator: request.hasInternalIndicator,
        hasExternalIndicator: request.hasExternalIndicator,
        expiresOn: expiresOn(expiryRuleOf(item), day),
        destination: request.destination,
      }));
      await insertPackages(trx, made);
      for (const one of made) {
        await appendEvent(trx, {
          kind: 'package.packed',
          at,
          facilityId: actor.facilityId,
          actorId: actor.personId,
          subjectKind: 'package',
          subjectId: one.id,
          requestId: request.requestId,
          payload: { code: one.code, itemCode: item.code },
        });
      }
      return {
        packages: made.map(({ id, code }) => ({ id, code })),
        warnings: decision.value.warnings.map((warning) => ({ ...warning })),
      };
    },
  );
}
