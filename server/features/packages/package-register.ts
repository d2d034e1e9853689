import { packageFieldsSchema } from '#contract/packages';
import { parsePackageCode } from '#domain/label/package-code';
import type { FieldProblem } from '#domain/catalogue/csv-column';
import { decidePacking, defaultPackingPolicy } from '#domain/package/decide-packing';
import { expiresOn } from '#domain/package/expiry';
import { packageColumns, type PackageFields } from '#domain/package/package-columns';
import { appendEvent, appendEvents, type AuditEvent } from '../../platform/audit-writer';
import type { Db, Transaction } from '../../platform/db';
import { facilityDay } from '../../platform/facility-day';
import { groupBy } from '../../platform/group-by';
import type { FiledRegister, Judge, Kept, WriteContext, Written } from '../../platform/register/register';
import { expiryRuleOf, listItemsToPack, type ItemToPack } from './item-to-pack';
import { takePackageCodes } from './package-codes';
import { insertPackages } from './package-store';

/** Brings a code into the form in which it is kept, and leaves alone of a kept package what was settled when it was sealed. */
function settle(stated: PackageFields, before: PackageFields | null) {
  const problems: FieldProblem[] = [];
  const parsed = stated.code.trim() === '' ? null : parsePackageCode(stated.code);
  if (parsed?.ok === false) problems.push({ field: 'code', sentence: parsed.refusal.sentence });
  const fields = {
    ...stated,
    code: parsed?.ok ? parsed.value.code : '',
    itemCode: stated.itemCode.trim().toUpperCase(),
  };
  if (before !== null) {
    for (const field of ['itemCode', 'isContentsConfirmed', 'hasInternalIndicator', 'hasExternalIndicator'] as const) {
      if (fields[field] !== before[field]) {
        problems.push({
          field,
          sentence: 'This was settled when the package was sealed. Only where it goes can change.',
        });
      }
    }
  }
  return { fields, problems };
}

/** What is packed and not in a load yet: the rest of a package's life is no matter of a file. */
async function list(trx: Transaction | Db, facilityId: string): Promise<Kept<PackageFields>[]> {
  const rows = await trx('packages as package')
    .join('items as item', 'item.id', 'package.item_id')
    .where('package.facility_id', facilityId)
    .whereIn('package.state', ['packed', 'staged'])
    .select<
      {
        id: string;
        version: number;
        code: string;
        item_code: string;
        is_contents_confirmed: boolean;
        has_internal_indicator: boolean;
        has_external_indicator: boolean;
        destination: string;
      }[]
    >(
      'package.id',
      'package.version',
      'package.code',
      'item.code as item_code',
      'package.is_contents_confirmed',
      'package.has_internal_indicator',
      'package.has_external_indicator',
      'package.destination',
    );
  return rows.map((row) => ({
    id: row.id,
    version: row.version,
    fields: {
      code: row.code,
      itemCode: row.item_code,
      isContentsConfirmed: row.is_contents_confirmed,
      hasInternalIndicator: row.has_internal_indicator,
      hasExternalIndicator: row.has_external_indicator,
      destination: row.destination,
    },
  }));
}

function problemsOf(stated: PackageFields, item: ItemToPack | undefined, isKept: boolean): FieldProblem[] {
  if (isKept) return [];
  if (stated.code !== '') {
    return [
      { field: 'code', sentence: `No package ${stated.code} waits here. Leave the code empty to pack a new one.` },
    ];
  }
  if (!item) return [{ field: 'itemCode', sentence: `There is no item ${stated.itemCode} in this catalogue.` }];
  const decision = decidePacking(
    {
      code: item.code,
      name: item.name,
      isRetired: item.is_retired,
      ifuReference: item.ifu_reference,
      massKg: item.mass_kg,
      massLimitKg: item.mass_limit_kg,
    },
    stated,
    defaultPackingPolicy,
  );
  if (decision.ok) return [];
  const fields = {
    'package.item-retired': 'itemCode',
    'package.contents-not-confirmed': 'isContentsConfirmed',
    'package.internal-indicator-missing': 'hasInternalIndicator',
  } as const;
  return [{ field: fields[decision.refusal.code], sentence: decision.refusal.sentence }];
}

async function judge(
  trx: Transaction | Db,
  facilityId: string,
  kept: readonly Kept<PackageFields>[],
): Promise<Judge<PackageFields>> {
  const items = new Map((await listItemsToPack(trx, facilityId)).map((item) => [item.code.toUpperCase(), item]));
  const keptCodes = new Set(kept.map((thing) => thing.fields.code));
  return (candidates) =>
    new Map(
      candidates.map((stated) => [stated, problemsOf(stated, items.get(stated.itemCode), keptCodes.has(stated.code))]),
    );
}

async function write(context: WriteContext, written: readonly Written<PackageFields>[]): Promise<void> {
  const { trx, actor, at } = context;
  const items = new Map((await listItemsToPack(trx, actor.facilityId)).map((item) => [item.code.toUpperCase(), item]));
  const { day } = await facilityDay(trx, actor.facilityId, at);
  const events: AuditEvent<'package.packed' | 'package.changed'>[] = [];
  const told = (packageId: string) => ({
    at,
    facilityId: actor.facilityId,
    actorId: actor.personId,
    subjectKind: 'package',
    subjectId: packageId,
    requestId: context.requestId,
  });
  const fresh = written.filter(({ before }) => before === null).map(({ after }) => after);
  for (const [itemCode, ones] of groupBy(fresh, ({ fields }) => fields.itemCode)) {
    const item = items.get(itemCode);
    if (!item) throw new Error(`the item ${itemCode} was there when the file was judged`);
    const codes = await takePackageCodes(trx, item.kind, ones.length);
    const made = ones.map(({ id, fields }, index) => ({
      id,
      facilityId: actor.facilityId,
      code: codes[index] ?? '',
      itemId: item.id,
      packedBy: actor.personId,
      packedAt: at,
      hasInternalIndicator: fields.hasInternalIndicator,
      hasExternalIndicator: fields.hasExternalIndicator,
      expiresOn: expiresOn(expiryRuleOf(item), day),
      destination: fields.destination,
    }));
    await insertPackages(trx, made);
    for (const one of made) {
      events.push({ ...told(one.id), kind: 'package.packed', payload: { code: one.code, itemCode: item.code } });
    }
  }
  for (const { before, after } of written) {
    if (before === null) continue;
    await trx('packages')
      .where({ id: after.id })
      .update({ destination: after.fields.destination, version: trx.raw('version + 1') });
    events.push({
      ...told(after.id),
      kind: 'package.changed',
      payload: { before: before.fields, after: after.fields },
    });
  }
  await appendEvents(trx, events);
}

/** Packages by file: packs new ones, and says of those that wait where they go. */
export const packageRegister: FiledRegister<PackageFields> = {
  name: 'package',
  aNoun: 'a package',
  columns: packageColumns,
  schema: packageFieldsSchema,
  keyField: 'code',
  keyOf: ({ code = '' }) => {
    if (code.trim() === '') return null;
    const parsed = parsePackageCode(code);
    return parsed.ok ? parsed.value.code : code.trim();
  },
  settle,
  list,
  judge,
  write,
  noteImport: async (context, { added, changed, refused }) => {
    await appendEvent(context.trx, {
      kind: 'packages.imported',
      at: context.at,
      facilityId: context.actor.facilityId,
      actorId: context.actor.personId,
      subjectKind: 'facility',
      subjectId: context.actor.facilityId,
      requestId: context.requestId,
      payload: { added, changed, refused },
    });
  },
};
