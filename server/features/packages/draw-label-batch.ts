import type { LabelLayout } from '#contract/packages';
import { hasGs1CheckDigit } from '#domain/label/gs1-check-digit';
import type { FileReply, Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { NotFound } from '../../platform/errors';
import { drawPackageLabels, type PackageLabel } from '../labels/draw/draw-package-labels';

type LabelRow = {
  readonly code: string;
  readonly name: string;
  readonly item_code: string;
  readonly kind: string;
  readonly length_mm: number;
  readonly width_mm: number;
  readonly is_implant: boolean;
  readonly device_identifier: string | null;
  readonly packed_by: string;
  readonly packed_at: Date;
  readonly expires_on: string | null;
  readonly copy: number;
  readonly printed_at: Date;
};

// NIST SP 811 (2008), appendix B.8: the inch is exact.
const mmPerInch = 25.4;

/** A pouch is known by its size; what else there is by its name. */
function sizeOf(row: LabelRow, unitSystem: string): string | null {
  if (row.kind !== 'pouch') return null;
  if (unitSystem === 'metric') return `${Math.round(row.width_mm)} × ${Math.round(row.length_mm)} mm`;
  return `${(row.width_mm / mmPerInch).toFixed(1)} × ${(row.length_mm / mmPerInch).toFixed(1)} in`;
}

/** The item's GTIN, if it has one. In the catalogue it is the maker's: it was read off the maker's label. */
function gtinOf(deviceIdentifier: string | null): PackageLabel['gtin'] {
  if (deviceIdentifier === null || !/^\d{14}$/.test(deviceIdentifier) || !hasGs1CheckDigit(deviceIdentifier))
    return null;
  return { gtin: deviceIdentifier, allocatedBy: 'maker' };
}

function labelOf(row: LabelRow, unitSystem: string): PackageLabel {
  return {
    code: row.code,
    itemName: row.name,
    size: sizeOf(row, unitSystem),
    catalogueReference: row.item_code,
    packedBy: row.packed_by,
    packedAt: row.packed_at.toISOString(),
    expiry: row.expires_on === null ? { rule: 'event-related' } : { rule: 'dated', on: row.expires_on },
    isImplant: row.is_implant,
    gtin: gtinOf(row.device_identifier),
    copy: row.copy,
  };
}

/** The paper of one printing. A label that was printed again since is not on it: an old sheet must not bring it back. */
export async function drawLabelBatch(
  { db }: Pick<Services, 'db'>,
  actor: Actor,
  batchId: string,
  layout: LabelLayout,
): Promise<FileReply> {
  const rows = await db('label_prints')
    .join('packages', 'packages.id', 'label_prints.package_id')
    .join('items', 'items.id', 'packages.item_id')
    .join('people', 'people.id', 'packages.packed_by')
    .where({ 'label_prints.batch_id': batchId, 'packages.facility_id': actor.facilityId })
    .whereRaw(
      `not exists (select from label_prints as later
                    where later.package_id = label_prints.package_id and later.copy > label_prints.copy)`,
    )
    .orderBy('packages.code')
    .select<LabelRow[]>(
      'packages.code',
      'items.name',
      'items.code as item_code',
      'items.kind',
      'items.length_mm',
      'items.width_mm',
      'items.is_implant',
      'items.device_identifier',
      'people.initials as packed_by',
      'packages.packed_at',
      'packages.expires_on',
      'label_prints.copy',
      'label_prints.printed_at',
    );
  const [first] = rows;
  if (!first) throw new NotFound('label.none', 'There are no labels of this printing that still hold.');
  const facility = await db('facilities')
    .where({ id: actor.facilityId })
    .first<{ time_zone: string; unit_system: string } | undefined>('time_zone', 'unit_system');
  const unitSystem = facility?.unit_system ?? 'metric';
  const file = await drawPackageLabels(
    rows.map((row) => labelOf(row, unitSystem)),
    { layout, printedAt: first.printed_at.toISOString(), timeZone: facility?.time_zone ?? 'UTC' },
  );
  return { file, mediaType: 'application/pdf', name: 'package-labels.pdf' };
}
