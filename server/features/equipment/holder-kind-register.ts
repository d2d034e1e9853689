import { holderKindFieldsSchema } from '#contract/equipment';
import { checkHolderKind } from '#domain/catalogue/check-equipment';
import { holderKindColumns } from '#domain/catalogue/equipment-columns';
import type { HolderKindFields } from '#domain/catalogue/equipment-fields';
import { putRows } from '../../platform/register/put-rows';
import { keyOfCode, type FiledRegister } from '../../platform/register/register';
import { noteEquipment, noteImportOf, noteOf } from './equipment-history';
import type { HolderKindRow } from './equipment-rows';
import { holderKindFieldsFromRow } from './holder-kind-read-model';

function rowFrom(fields: HolderKindFields) {
  return {
    code: fields.code,
    name: fields.name,
    form: fields.form,
    slots: fields.slots,
    pitch_mm: fields.pitchMm,
    greatest_height_mm: fields.greatestHeightMm,
    greatest_length_mm: fields.greatestLengthMm,
    greatest_thickness_mm: fields.greatestThicknessMm,
    across_mm: fields.acrossMm,
    along_mm: fields.alongMm,
    mass_kg: fields.massKg,
    owned: fields.owned,
  };
}

export const holderKindRegister: FiledRegister<HolderKindFields> = {
  name: 'holder-kind',
  aNoun: 'a kind of holder',
  columns: holderKindColumns,
  schema: holderKindFieldsSchema,
  keyField: 'code',
  keyOf: ({ code }) => keyOfCode(code),
  settle: (fields) => ({ fields, problems: checkHolderKind(fields) }),
  list: async (trx, facilityId) => {
    const rows = await trx('holder_kinds')
      .where('holder_kinds.facility_id', facilityId)
      .select<HolderKindRow[]>('holder_kinds.*');
    return rows.map((row) => ({ id: row.id, version: row.version, fields: holderKindFieldsFromRow(row) }));
  },
  judge: () => Promise.resolve(() => new Map()),
  write: async (context, written) => {
    const rows = written.map(({ after: { id, version, fields } }) => ({
      id,
      facility_id: context.actor.facilityId,
      version,
      ...rowFrom(fields),
    }));
    await putRows(context.trx, 'holder_kinds', rows);
    await noteEquipment(
      context,
      'holder-kind',
      written.map((one) => noteOf(one, one.after.fields.code)),
    );
  },
  noteImport: noteImportOf('holder-kind'),
};
