import type { CatalogueItem } from '#domain/load/model';
import { kg, mm } from '#domain/units/quantity';
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
  readonly mass_limit_kg: number | null;
  readonly ifu_reference: string | null;
  readonly is_retired: boolean;
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
    massLimitKg: row.mass_limit_kg === null ? null : kg(row.mass_limit_kg),
    ifuReference: row.ifu_reference,
    isRetired: row.is_retired,
  };
}
