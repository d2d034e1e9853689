import { programFieldsSchema } from '#contract/equipment';
import { programColumns } from '#domain/catalogue/equipment-columns';
import type { ProgramFields } from '#domain/catalogue/equipment-fields';
import { putRows } from '../../platform/register/put-rows';
import { keyOfCode, type FiledRegister } from '../../platform/register/register';
import { endQualifications } from './end-qualifications';
import { noteEquipment, noteImportOf, noteOf } from './equipment-history';
import type { ProgramRow } from './equipment-rows';
import { programFieldsFromRow } from './program-read-model';

function rowFrom(fields: ProgramFields) {
  return {
    code: fields.code,
    name: fields.name,
    cycle_type: fields.type,
    temperature_c: fields.temperatureC,
    exposure_s: fields.exposureS,
    dry_s: fields.dryS,
    greatest_load_mass_kg: fields.greatestLoadMassKg,
    is_retired: fields.isRetired,
  };
}

export const programRegister: FiledRegister<ProgramFields> = {
  name: 'program',
  aNoun: 'a program',
  columns: programColumns,
  schema: programFieldsSchema,
  keyField: 'code',
  keyOf: ({ code }) => keyOfCode(code),
  settle: (fields) => ({ fields, problems: [] }),
  list: async (trx, facilityId) => {
    const rows = await trx('programs').where('programs.facility_id', facilityId).select<ProgramRow[]>('programs.*');
    return rows.map((row) => ({ id: row.id, version: row.version, fields: programFieldsFromRow(row) }));
  },
  judge: () => Promise.resolve(() => new Map()),
  write: async (context, written) => {
    const rows = written.map(({ after: { id, version, fields } }) => ({
      id,
      facility_id: context.actor.facilityId,
      version,
      ...rowFrom(fields),
    }));
    await putRows(context.trx, 'programs', rows);
    await endQualifications(context, written);
    await noteEquipment(
      context,
      'program',
      written.map((one) => noteOf(one, one.after.fields.code)),
    );
  },
  noteImport: noteImportOf('program'),
};
