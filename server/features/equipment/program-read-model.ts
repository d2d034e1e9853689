import type { ProgramOnFile } from '#contract/equipment';
import type { ProgramFields } from '#domain/catalogue/equipment-fields';
import type { Db, Transaction } from '../../platform/db';
import { NotFound } from '../../platform/errors';
import { pageOf, whereFound, type ListFilters } from '../../platform/paged-list';
import { programFromRow, type ProgramRow } from './equipment-rows';

export function programFieldsFromRow(row: ProgramRow): ProgramFields {
  const { id: _id, ...program } = programFromRow(row);
  return { ...program, isRetired: row.is_retired };
}

async function onFile(trx: Transaction | Db, rows: readonly ProgramRow[]): Promise<ProgramOnFile[]> {
  const qualified = await trx('sterilizer_programs')
    .join('sterilizers', 'sterilizers.id', 'sterilizer_programs.sterilizer_id')
    .where('sterilizer_programs.is_qualified', true)
    .whereIn(
      'sterilizer_programs.program_id',
      rows.map((row) => row.id),
    )
    .orderBy('sterilizers.code')
    .select<{ readonly program_id: string; readonly code: string }[]>(
      'sterilizer_programs.program_id',
      'sterilizers.code',
    );
  return rows.map((row) => ({
    ...programFieldsFromRow(row),
    id: row.id,
    version: row.version,
    qualifiedOn: qualified.filter((one) => one.program_id === row.id).map((one) => one.code),
  }));
}

export async function getProgram(trx: Transaction | Db, facilityId: string, programId: string): Promise<ProgramOnFile> {
  const row = await trx('programs')
    .where({ 'programs.facility_id': facilityId, 'programs.id': programId })
    .first<ProgramRow | undefined>('programs.*');
  const [program] = row ? await onFile(trx, [row]) : [];
  if (!program) throw new NotFound('program.none', 'There is no such program here.');
  return program;
}

/** One page of the facility's programs by code. */
export async function listPrograms(db: Db, facilityId: string, { search, retired, page, pageSize }: ListFilters) {
  const wanted = db('programs').where('programs.facility_id', facilityId);
  if (retired === 'hidden') void wanted.where('programs.is_retired', false);
  whereFound(wanted, search, ['programs.code', 'programs.name', 'programs.cycle_type']);
  const { rows, ...paging } = await pageOf<ProgramRow>(wanted, {
    page,
    pageSize,
    orderBy: ['programs.code'],
    select: ['programs.*'],
  });
  return { programs: await onFile(db, rows), ...paging };
}
