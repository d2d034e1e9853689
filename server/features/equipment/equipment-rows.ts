import type { HolderKind, Program, Shelf, Sterilizer } from '#domain/load/model';
import { celsius, kg, mm, seconds } from '#domain/units/quantity';

export type SterilizerRow = {
  readonly id: string;
  readonly code: string;
  readonly number: string;
  readonly name: string;
  readonly size_class: 'large' | 'small';
  readonly chamber_width_mm: number;
  readonly chamber_depth_mm: number;
  readonly chamber_height_mm: number;
  readonly drain_x_mm: number;
  readonly drain_y_mm: number;
  readonly greatest_load_mass_kg: number;
  readonly steam_line: string;
  readonly has_air_detector: boolean;
  readonly needs_air_removal_test: boolean;
  readonly service_state: Sterilizer['serviceState'];
  readonly version: number;
};

export type ProgramRow = {
  readonly id: string;
  readonly code: string;
  readonly name: string;
  readonly cycle_type: Program['type'];
  readonly temperature_c: number;
  readonly exposure_s: number;
  readonly dry_s: number;
  readonly greatest_load_mass_kg: number | null;
  readonly is_retired: boolean;
  readonly version: number;
};

export type CartRow = {
  readonly id: string;
  readonly code: string;
  readonly name: string;
  readonly size_class: 'large' | 'small';
  readonly is_usable: boolean;
  readonly note: string;
  readonly version: number;
};

export type ShelfRow = {
  readonly id: string;
  readonly cart_id: string;
  readonly level: number;
  readonly name: string;
  readonly place_code: string;
  readonly width_mm: number;
  readonly depth_mm: number;
  readonly clear_height_mm: number;
  readonly surface: Shelf['surface'];
  readonly greatest_mass_kg: number;
  readonly is_usable: boolean;
};

export type HolderKindRow = {
  readonly id: string;
  readonly code: string;
  readonly name: string;
  readonly form: HolderKind['form'];
  readonly slots: number | null;
  readonly pitch_mm: number | null;
  readonly greatest_height_mm: number | null;
  readonly greatest_length_mm: number | null;
  readonly greatest_thickness_mm: number | null;
  readonly across_mm: number;
  readonly along_mm: number;
  readonly mass_kg: number;
  readonly owned: number;
  readonly version: number;
};

export type HolderRow = {
  readonly id: string;
  readonly holder_kind_id: string;
  readonly name: string;
  readonly place_code: string;
  readonly condition: 'good' | 'in-repair' | 'missing';
  readonly version: number;
};

export function sterilizerFromRow(row: SterilizerRow): Sterilizer {
  return {
    id: row.id,
    code: row.code,
    number: row.number,
    name: row.name,
    chamberWidthMm: mm(row.chamber_width_mm),
    chamberDepthMm: mm(row.chamber_depth_mm),
    chamberHeightMm: mm(row.chamber_height_mm),
    drainXMm: mm(row.drain_x_mm),
    drainYMm: mm(row.drain_y_mm),
    greatestLoadMassKg: kg(row.greatest_load_mass_kg),
    needsAirRemovalTest: row.needs_air_removal_test,
    serviceState: row.service_state,
  };
}

export function programFromRow(row: ProgramRow): Program {
  return {
    id: row.id,
    code: row.code,
    name: row.name,
    type: row.cycle_type,
    temperatureC: celsius(row.temperature_c),
    exposureS: seconds(row.exposure_s),
    dryS: seconds(row.dry_s),
    greatestLoadMassKg: row.greatest_load_mass_kg === null ? null : kg(row.greatest_load_mass_kg),
  };
}

export function shelfFromRow(row: ShelfRow): Shelf {
  return {
    id: row.id,
    level: row.level,
    name: row.name,
    placeCode: row.place_code,
    widthMm: mm(row.width_mm),
    depthMm: mm(row.depth_mm),
    clearHeightMm: mm(row.clear_height_mm),
    surface: row.surface,
    greatestMassKg: kg(row.greatest_mass_kg),
    isUsable: row.is_usable,
  };
}

export function holderKindFromRow(row: HolderKindRow): HolderKind {
  const lengthOrNull = (value: number | null) => (value === null ? null : mm(value));
  return {
    id: row.id,
    code: row.code,
    name: row.name,
    form: row.form,
    slots: row.slots,
    pitchMm: lengthOrNull(row.pitch_mm),
    greatestHeightMm: lengthOrNull(row.greatest_height_mm),
    greatestLengthMm: lengthOrNull(row.greatest_length_mm),
    greatestThicknessMm: lengthOrNull(row.greatest_thickness_mm),
    acrossMm: mm(row.across_mm),
    alongMm: mm(row.along_mm),
    massKg: kg(row.mass_kg),
  };
}
