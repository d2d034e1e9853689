import type { PackageDetail } from '#contract/packages';
import { parsePackageCode } from '#domain/label/package-code';
import { z } from 'zod';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { NotFound } from '../../platform/errors';
import { facilityDay } from '../../platform/facility-day';
import { packageHistory } from './package-history-read-model';
import { findPackageSummary } from './package-read-model';

const uuidSchema = z.uuid();

/** What is written in an address: an id, or a code as scanned or typed; null when it is neither. */
function readReference(reference: string): { readonly id: string } | { readonly code: string } | null {
  if (uuidSchema.safeParse(reference).success) return { id: reference };
  const parsed = parsePackageCode(reference);
  return parsed.ok ? { code: parsed.value.code } : null;
}

/** One package with its labels and its history. Another facility's package is not known here. */
export async function getPackage(services: Services, actor: Actor, reference: string): Promise<PackageDetail> {
  const { db, clock } = services;
  const by = readReference(reference);
  const { day } = await facilityDay(db, actor.facilityId, clock.now());
  const found = by === null ? undefined : await findPackageSummary(db, actor.facilityId, by, day);
  if (!found) throw new NotFound('package.none', 'No package here has this code.');
  const [facts, labelPrints, history] = await Promise.all([
    db('packages')
      .where({ id: found.id })
      .first<
        { is_contents_confirmed: boolean; has_internal_indicator: boolean; has_external_indicator: boolean } | undefined
      >('is_contents_confirmed', 'has_internal_indicator', 'has_external_indicator'),
    db('label_prints')
      .join('people', 'people.id', 'label_prints.printed_by')
      .where('label_prints.package_id', found.id)
      .orderBy('label_prints.copy')
      .select<{ copy: number; reason: string | null; printed_by: string; printed_at: Date }[]>(
        'label_prints.copy',
        'label_prints.reason',
        'people.display_name as printed_by',
        'label_prints.printed_at',
      ),
    packageHistory(db, found.id),
  ]);
  return {
    package: found,
    isContentsConfirmed: facts?.is_contents_confirmed ?? false,
    hasInternalIndicator: facts?.has_internal_indicator ?? false,
    hasExternalIndicator: facts?.has_external_indicator ?? false,
    labelPrints: labelPrints.map((print) => ({
      copy: print.copy,
      reason: print.reason,
      printedBy: print.printed_by,
      printedAt: print.printed_at.toISOString(),
    })),
    history,
  };
}
