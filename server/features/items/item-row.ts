import type { ItemFields } from '#domain/catalogue/item-fields';
import type { CatalogueItem, PouchFacing } from '#domain/load/model';
import { kg, mm, seconds } from '#domain/units/quantity';
import { cycleNeedSchema, filterZoneSchema } from '#contract/load-view';
import { z } from 'zod';

/** The columns of `items` that the core's item is made of. */
export type ItemRow = {
  readonly id: string;
  readonly code: string;
  readonly name: string;
  readonly kind: CatalogueItem['kind'];
  readonly packaging: CatalogueItem['packaging'];
  readonly length_mm: number;
  readonly width_mm: number;
  readonly height_mm: number;
  readonly mass_kg: number;
  readonly metal_mass_kg: number;
  readonly textile_mass_kg: number;
  readonly metal: CatalogueItem['metal'];
  readonly is_implant: boolean;
  readonly pose: CatalogueItem['pose'];
  readonly is_perforated: boolean;
  readonly clearance_mm: number | null;
  readonly stands_on: readonly string[];
  readonly greatest_stack_height_mm: number | null;
  readonly filter_zones: unknown;
  readonly cycle_needs: unknown;
  readonly preferred_holder: string | null;
  readonly facing: PouchFacing | null;
  readonly mass_limit_kg: number | null;
  readonly ifu_reference: string | null;
  readonly is_retired: boolean;
};

/** All columns of `items`. */
export type WholeItemRow = ItemRow & {
  readonly cool_s: number;
  readonly expiry_rule: ItemFields['expiryRule'];
  readonly expiry_days: number | null;
  readonly device_identifier: string | null;
  readonly ifu_revision: string | null;
  readonly service: string;
  readonly note: string;
  readonly version: number;
};

const filterZonesSchema = z.array(filterZoneSchema);
const cycleNeedsSchema = z.array(cycleNeedSchema);

export function catalogueItemFromRow(row: ItemRow): CatalogueItem {
  return {
    id: row.id,
    code: row.code,
    name: row.name,
    kind: row.kind,
    packaging: row.packaging,
    lengthMm: mm(row.length_mm),
    widthMm: mm(row.width_mm),
    heightMm: mm(row.height_mm),
    massKg: kg(row.mass_kg),
    metalMassKg: kg(row.metal_mass_kg),
    textileMassKg: kg(row.textile_mass_kg),
    metal: row.metal,
    isImplant: row.is_implant,
    pose: row.pose,
    isPerforated: row.is_perforated,
    clearanceMm: row.clearance_mm === null ? null : mm(row.clearance_mm),
    standsOn: row.stands_on,
    greatestStackHeightMm: row.greatest_stack_height_mm === null ? null : mm(row.greatest_stack_height_mm),
    filterZones: filterZonesSchema.parse(row.filter_zones),
    cycleNeeds: cycleNeedsSchema.parse(row.cycle_needs),
    preferredHolder: row.preferred_holder,
    facing: row.facing,
    massLimitKg: row.mass_limit_kg === null ? null : kg(row.mass_limit_kg),
    ifuReference: row.ifu_reference,
    isRetired: row.is_retired,
  };
}

export function itemFieldsFromRow(row: WholeItemRow): ItemFields {
  const { id: _id, ...item } = catalogueItemFromRow(row);
  return {
    ...item,
    coolS: seconds(row.cool_s),
    expiryRule: row.expiry_rule,
    expiryDays: row.expiry_days,
    deviceIdentifier: row.device_identifier,
    ifuRevision: row.ifu_revision,
    service: row.service,
    note: row.note,
  };
}

export function itemRowFrom(fields: ItemFields) {
  return {
    code: fields.code,
    name: fields.name,
    kind: fields.kind,
    packaging: fields.packaging,
    length_mm: fields.lengthMm,
    width_mm: fields.widthMm,
    height_mm: fields.heightMm,
    mass_kg: fields.massKg,
    metal_mass_kg: fields.metalMassKg,
    textile_mass_kg: fields.textileMassKg,
    metal: fields.metal,
    is_implant: fields.isImplant,
    pose: fields.pose,
    is_perforated: fields.isPerforated,
    clearance_mm: fields.clearanceMm,
    stands_on: [...fields.standsOn],
    greatest_stack_height_mm: fields.greatestStackHeightMm,
    filter_zones: JSON.stringify(fields.filterZones),
    cycle_needs: JSON.stringify(fields.cycleNeeds),
    preferred_holder: fields.preferredHolder,
    facing: fields.facing,
    mass_limit_kg: fields.massLimitKg,
    cool_s: fields.coolS,
    expiry_rule: fields.expiryRule,
    expiry_days: fields.expiryDays,
    device_identifier: fields.deviceIdentifier,
    ifu_reference: fields.ifuReference,
    ifu_revision: fields.ifuRevision,
    service: fields.service,
    note: fields.note,
    is_retired: fields.isRetired,
  };
}
