import { sterilizerFieldsSchema } from '#contract/equipment';
import { checkSterilizer, checkSterilizerReferences } from '#domain/catalogue/check-equipment';
import type { FieldProblem } from '#domain/catalogue/csv-column';
import { sterilizerColumns } from '#domain/catalogue/equipment-columns';
import type { SterilizerFields } from '#domain/catalogue/equipment-fields';
import type { Db, Transaction } from '../../platform/db';
import { putRows } from '../../platform/register/put-rows';
import { keyOfCode, type Judge, type Kept, type FiledRegister } from '../../platform/register/register';
import { noteEquipment, noteImportOf, noteOf } from './equipment-history';
import type { SterilizerRow } from './equipment-rows';
import { keptSterilizers } from './sterilizer-read-model';

function rowFrom(fields: SterilizerFields) {
  return {
    code: fields.code,
    number: fields.number,
    name: fields.name,
    size_class: fields.sizeClass,
    chamber_width_mm: fields.chamberWidthMm,
    chamber_depth_mm: fields.chamberDepthMm,
    chamber_height_mm: fields.chamberHeightMm,
    drain_x_mm: fields.drainXMm,
    drain_y_mm: fields.drainYMm,
    greatest_load_mass_kg: fields.greatestLoadMassKg,
    steam_line: fields.steamLine,
    has_air_detector: fields.hasAirDetector,
    needs_air_removal_test: fields.needsAirRemovalTest,
    service_state: fields.serviceState,
  };
}

async function programIds(trx: Transaction | Db, facilityId: string): Promise<ReadonlyMap<string, string>> {
  const rows = await trx('programs')
    .where('programs.facility_id', facilityId)
    .select<{ readonly id: string; readonly code: string }[]>('programs.id', 'programs.code');
  return new Map(rows.map((row) => [row.code, row.id]));
}

function checkNumber(
  sterilizer: SterilizerFields,
  owners: ReadonlyMap<string, string>,
  kept: SterilizerFields | undefined,
): FieldProblem[] {
  if (kept !== undefined && kept.number !== sterilizer.number) {
    return [{ field: 'number', sentence: `It is number ${kept.number} in every load number so far, and stays that.` }];
  }
  const owner = owners.get(sterilizer.number);
  if (owner === undefined || owner === sterilizer.code) return [];
  return [{ field: 'number', sentence: `${owner} already has the number ${sterilizer.number}.` }];
}

async function judge(
  trx: Transaction | Db,
  facilityId: string,
  kept: readonly Kept<SterilizerFields>[],
): Promise<Judge<SterilizerFields>> {
  const programCodes = new Set((await programIds(trx, facilityId)).keys());
  const byCode = new Map(kept.map((thing) => [thing.fields.code, thing.fields]));
  return (candidates) => {
    const owners = new Map<string, string>();
    for (const { number, code } of [...byCode.values(), ...candidates]) {
      if (!owners.has(number)) owners.set(number, code);
    }
    return new Map(
      candidates.map((candidate) => [
        candidate,
        [
          ...checkSterilizerReferences(candidate, programCodes),
          ...checkNumber(candidate, owners, byCode.get(candidate.code)),
        ],
      ]),
    );
  };
}

/** A program that is named no more leaves the panel: nothing refers to the pair but the pair itself. */
async function putPanel(
  trx: Transaction,
  facilityId: string,
  sterilizers: readonly Kept<SterilizerFields>[],
): Promise<void> {
  const ids = await programIds(trx, facilityId);
  const rows = sterilizers.flatMap(({ id, fields }) =>
    (['qualifiedPrograms', 'otherPrograms'] as const).flatMap((field) =>
      [...new Set(fields[field])].map((code) => ({
        sterilizer_id: id,
        program_id: ids.get(code),
        is_qualified: field === 'qualifiedPrograms',
      })),
    ),
  );
  await trx('sterilizer_programs')
    .whereIn(
      'sterilizer_id',
      sterilizers.map(({ id }) => id),
    )
    .delete();
  for (let from = 0; from < rows.length; from += 5_000) {
    await trx('sterilizer_programs').insert(rows.slice(from, from + 5_000));
  }
}

export const sterilizerRegister: FiledRegister<SterilizerFields> = {
  name: 'sterilizer',
  aNoun: 'a sterilizer',
  columns: sterilizerColumns,
  schema: sterilizerFieldsSchema,
  keyField: 'code',
  keyOf: ({ code }) => keyOfCode(code),
  settle: (stated) => {
    // In the order in which they are kept, so that the same panel is no change.
    const fields = {
      ...stated,
      qualifiedPrograms: [...new Set(stated.qualifiedPrograms)].sort(),
      otherPrograms: [...new Set(stated.otherPrograms)].sort(),
    };
    return { fields, problems: checkSterilizer(fields) };
  },
  list: async (trx, facilityId) => {
    const rows = await trx('sterilizers')
      .where('sterilizers.facility_id', facilityId)
      .select<SterilizerRow[]>('sterilizers.*');
    return keptSterilizers(trx, rows);
  },
  judge,
  write: async (context, written) => {
    const { facilityId } = context.actor;
    const things = written.map(({ after }) => after);
    const rows = things.map(({ id, version, fields }) => ({
      id,
      facility_id: facilityId,
      version,
      ...rowFrom(fields),
    }));
    await putRows(context.trx, 'sterilizers', rows);
    await putPanel(context.trx, facilityId, things);
    await noteEquipment(
      context,
      'sterilizer',
      written.map((one) => noteOf(one, one.after.fields.code)),
    );
  },
  noteImport: noteImportOf('sterilizer'),
};
