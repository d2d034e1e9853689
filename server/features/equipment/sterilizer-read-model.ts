import type { SterilizerOnFile } from '#contract/equipment';
import type { SterilizerFields } from '#domain/catalogue/equipment-fields';
import type { AirRemovalState } from '#domain/load/model';
import type { Db, Transaction } from '../../platform/db';
import { NotFound } from '../../platform/errors';
import { pageOf, whereFound, type ListFilters } from '../../platform/paged-list';
import type { Kept } from '../../platform/register/register';
import { sterilizerFromRow, type SterilizerRow } from './equipment-rows';
import { facilityDay } from '../../platform/facility-day';
import { airRemovalOfDay, airRemovalsOfDay } from './read-model';

type PanelRow = { readonly sterilizer_id: string; readonly code: string; readonly is_qualified: boolean };

function codesOf(panel: readonly PanelRow[], sterilizerId: string, isQualified: boolean): string[] {
  return panel
    .filter((row) => row.sterilizer_id === sterilizerId && row.is_qualified === isQualified)
    .map((row) => row.code);
}

/** Puts the programs on its panel to each sterilizer. */
export async function keptSterilizers(
  trx: Transaction | Db,
  rows: readonly SterilizerRow[],
): Promise<Kept<SterilizerFields>[]> {
  const panel = await trx('sterilizer_programs')
    .join('programs', 'programs.id', 'sterilizer_programs.program_id')
    .whereIn(
      'sterilizer_programs.sterilizer_id',
      rows.map((row) => row.id),
    )
    .orderBy('programs.code')
    .select<PanelRow[]>('sterilizer_programs.sterilizer_id', 'sterilizer_programs.is_qualified', 'programs.code');
  return rows.map((row) => {
    const { id, ...sterilizer } = sterilizerFromRow(row);
    const fields = {
      ...sterilizer,
      sizeClass: row.size_class,
      steamLine: row.steam_line,
      hasAirDetector: row.has_air_detector,
      qualifiedPrograms: codesOf(panel, id, true),
      otherPrograms: codesOf(panel, id, false),
    };
    return { id, version: row.version, fields };
  });
}

function onFile({ id, version, fields }: Kept<SterilizerFields>, airRemoval: AirRemovalState): SterilizerOnFile {
  return {
    ...fields,
    qualifiedPrograms: [...fields.qualifiedPrograms],
    otherPrograms: [...fields.otherPrograms],
    id,
    version,
    airRemoval,
  };
}

export async function getSterilizer(
  trx: Transaction | Db,
  { facilityId, sterilizerId, at }: { readonly facilityId: string; readonly sterilizerId: string; readonly at: Date },
): Promise<SterilizerOnFile> {
  const row = await trx('sterilizers')
    .where({ 'sterilizers.facility_id': facilityId, 'sterilizers.id': sterilizerId })
    .first<SterilizerRow | undefined>('sterilizers.*');
  const [kept] = row ? await keptSterilizers(trx, [row]) : [];
  if (!kept) throw new NotFound('sterilizer.none', 'There is no such sterilizer here.');
  const { day } = await facilityDay(trx, facilityId, at);
  return onFile(kept, await airRemovalOfDay(trx, facilityId, sterilizerId, day));
}

/** One page of the facility's sterilizers by code, each with its air-removal test of the day. */
export async function listSterilizers(
  db: Db,
  { facilityId, at, filters }: { readonly facilityId: string; readonly at: Date; readonly filters: ListFilters },
) {
  const wanted = db('sterilizers').where('sterilizers.facility_id', facilityId);
  whereFound(wanted, filters.search, ['sterilizers.code', 'sterilizers.name', 'sterilizers.steam_line']);
  const { rows, ...paging } = await pageOf<SterilizerRow>(wanted, {
    page: filters.page,
    pageSize: filters.pageSize,
    orderBy: ['sterilizers.code'],
    select: ['sterilizers.*'],
  });
  const { day } = await facilityDay(db, facilityId, at);
  const airRemovalOf = await airRemovalsOfDay(db, facilityId, day);
  const kept = await keptSterilizers(db, rows);
  return { sterilizers: kept.map((one) => onFile(one, airRemovalOf(one.id))), ...paging };
}
