import { holderFieldsSchema } from '#contract/equipment';
import { checkPlaceCode } from '#domain/catalogue/check-equipment';
import type { FieldProblem } from '#domain/catalogue/csv-column';
import { holderColumns } from '#domain/catalogue/equipment-columns';
import type { HolderFields } from '#domain/catalogue/equipment-fields';
import type { Db, Transaction } from '../../platform/db';
import { putRows } from '../../platform/register/put-rows';
import {
  keyOfCode,
  type Judge,
  type Kept,
  type FiledRegister,
  type WriteContext,
  type Written,
} from '../../platform/register/register';
import { noteEquipment, noteImportOf, noteOf } from './equipment-history';
import { holderFieldsFromRow, listHolderRows } from './holder-read-model';
import { takePlaceCodes } from './place-codes';
import { holderKinds } from './read-model';

function checkKind(holder: HolderFields, kept: HolderFields | undefined, kinds: ReadonlySet<string>): FieldProblem[] {
  if (kept !== undefined && kept.kind !== holder.kind) {
    return [{ field: 'kind', sentence: `${kept.name} is of the kind ${kept.kind}, and stays that.` }];
  }
  if (kinds.has(holder.kind)) return [];
  return [{ field: 'kind', sentence: `There is no kind of holder with the code ${holder.kind}.` }];
}

async function judge(
  trx: Transaction | Db,
  facilityId: string,
  kept: readonly Kept<HolderFields>[],
): Promise<Judge<HolderFields>> {
  const kinds = new Set((await holderKinds(trx, facilityId)).map((kind) => kind.code));
  const byName = new Map(kept.map((thing) => [thing.fields.name, thing.fields]));
  return (candidates) =>
    new Map(
      candidates.map((holder) => {
        const before = byName.get(holder.name);
        return [holder, [...checkKind(holder, before, kinds), ...checkPlaceCode(holder, before)]];
      }),
    );
}

async function write(context: WriteContext, written: readonly Written<HolderFields>[]): Promise<void> {
  const { trx, actor } = context;
  const kindIds = new Map((await holderKinds(trx, actor.facilityId)).map((kind) => [kind.code, kind.id]));
  const uncoded = written.filter(({ after }) => after.fields.placeCode === null);
  const codes = await takePlaceCodes(trx, 'holder', uncoded.length);
  const given = new Map(uncoded.map(({ after }, at) => [after.id, codes[at]]));
  const rows = written.map(({ after: { id, version, fields } }) => ({
    id,
    facility_id: actor.facilityId,
    version,
    holder_kind_id: kindIds.get(fields.kind),
    name: fields.name,
    place_code: fields.placeCode ?? given.get(id),
    condition: fields.condition,
  }));
  await putRows(trx, 'holders', rows);
  await noteEquipment(
    context,
    'holder',
    written.map((one) => noteOf(one, one.after.fields.name)),
  );
}

export const holderRegister: FiledRegister<HolderFields> = {
  name: 'holder',
  aNoun: 'a holder',
  columns: holderColumns,
  schema: holderFieldsSchema,
  keyField: 'name',
  keyOf: ({ name }) => keyOfCode(name),
  settle: (stated, before) => ({
    // The place code of what is there may be left empty: it stays.
    fields: { ...stated, placeCode: stated.placeCode ?? before?.placeCode ?? null },
    problems: [],
  }),
  list: async (trx, facilityId) => {
    const rows = await listHolderRows(trx, facilityId);
    return rows.map((row) => ({ id: row.id, version: row.version, fields: holderFieldsFromRow(row) }));
  },
  judge,
  write,
  noteImport: noteImportOf('holder'),
};
