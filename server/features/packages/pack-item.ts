import type { PackRequest, PackResponse } from '#contract/packages';
import { decidePacking, defaultPackingPolicy, type PackingRefusal } from '#domain/package/decide-packing';
import { expiresOn } from '#domain/package/expiry';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import type { FieldProblem } from '../../platform/errors';
import { once } from '../../platform/once';
import { facilityDay } from '../../platform/facility-day';
import { takePackageCodes } from './package-codes';
import { expiryRuleOf, getItemToPack } from './item-to-pack';
import { insertPackages, type NewPackage } from './package-store';
import { refusalError } from './refusal';

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
