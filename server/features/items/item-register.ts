import { itemFieldsSchema } from '#contract/items';
import { checkItem, checkItemReferences } from '#domain/catalogue/check-item';
import type { FieldProblem } from '#domain/catalogue/csv-column';
import { readDeviceIdentifier } from '#domain/catalogue/device-identifier';
import { itemColumns } from '#domain/catalogue/item-columns';
import type { ItemFields } from '#domain/catalogue/item-fields';
import { appendEvent, appendEvents, type AuditEvent } from '../../platform/audit-writer';
import type { Db, Transaction } from '../../platform/db';
import {
  keyOfCode,
  type Judge,
  type Kept,
  type FiledRegister,
  type WriteContext,
  type Written,
} from '../../platform/register/register';
import { holderKinds } from '../equipment/read-model';
import { listKeptItems, putItems } from './item-store';

function settle(stated: ItemFields) {
  const read = stated.deviceIdentifier === null ? null : readDeviceIdentifier(stated.deviceIdentifier);
  const fields = read?.ok === true ? { ...stated, deviceIdentifier: read.value } : stated;
  return { fields, problems: checkItem(fields) };
}

/** Who carries which device identifier, when the candidates stand in the place of what they were. */
function deviceIdentifiersOf(candidates: readonly ItemFields[], kept: readonly Kept<ItemFields>[]) {
  const replaced = new Set(candidates.map((item) => item.code));
  const carried = [...kept.map((thing) => thing.fields).filter((item) => !replaced.has(item.code)), ...candidates];
  const owners = new Map<string, string>();
  for (const { deviceIdentifier, code } of carried) {
    // The first one keeps it, so that of two lines of a file only the second is refused.
    if (deviceIdentifier !== null && !owners.has(deviceIdentifier)) owners.set(deviceIdentifier, code);
  }
  return owners;
}

async function judge(
  trx: Transaction | Db,
  facilityId: string,
  kept: readonly Kept<ItemFields>[],
): Promise<Judge<ItemFields>> {
  const kinds = await holderKinds(trx, facilityId);
  const holderKindCodes = new Set(kinds.map((kind) => kind.code));
  return (candidates) => {
    const references = {
      holderKindCodes,
      itemCodes: new Set([...kept.map((thing) => thing.fields.code), ...candidates.map((item) => item.code)]),
      deviceIdentifiers: deviceIdentifiersOf(candidates, kept),
    };
    return new Map<ItemFields, readonly FieldProblem[]>(
      candidates.map((item) => [item, checkItemReferences(item, references)]),
    );
  };
}

function eventOf(
  context: WriteContext,
  { before, after }: Written<ItemFields>,
): AuditEvent<'item.added' | 'item.changed'> {
  const common = {
    at: context.at,
    facilityId: context.actor.facilityId,
    actorId: context.actor.personId,
    subjectKind: 'item',
    subjectId: after.id,
    requestId: context.requestId,
  };
  if (before === null) return { ...common, kind: 'item.added', payload: { code: after.fields.code } };
  return { ...common, kind: 'item.changed', payload: { before: before.fields, after: after.fields } };
}

async function write(context: WriteContext, written: readonly Written<ItemFields>[]): Promise<void> {
  await putItems(
    context.trx,
    context.actor.facilityId,
    written.map(({ after }) => after),
  );
  await appendEvents(
    context.trx,
    written.map((one) => eventOf(context, one)),
  );
}

export const itemRegister: FiledRegister<ItemFields> = {
  name: 'item',
  aNoun: 'an item',
  columns: itemColumns,
  schema: itemFieldsSchema,
  keyField: 'code',
  keyOf: ({ code }) => keyOfCode(code),
  settle,
  list: listKeptItems,
  judge,
  write,
  noteImport: async (context, { added, changed, refused }) => {
    await appendEvent(context.trx, {
      kind: 'items.imported',
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
