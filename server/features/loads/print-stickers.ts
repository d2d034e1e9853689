import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import type { Db } from '../../platform/db';
import { NotFound, RuleRefused } from '../../platform/errors';
import { once } from '../../platform/once';
import { drawLoadStickers } from '../labels/draw/draw-load-stickers';
import { requireAct } from './load-change';
import { getLoad, lockLoad } from './load-store';

type Scanned = {
  readonly package_id: string;
  readonly code: string;
  readonly live_id: string | null;
  readonly greatest_copy: number;
};

/**
 * Makes a load sticker for each package: the lot identifier it must carry. One live sticker per package: a reprint needs a
 * reason and voids the one before.
 */
export async function printStickers(
  services: Services,
  actor: Actor,
  loadId: string,
  request: {
    readonly requestId: string;
    readonly packageIds: readonly string[] | null;
    readonly reason: string | null;
  },
): Promise<{ stickerIds: string[]; pdf: string }> {
  const { db, clock, ids } = services;
  return once(
    { db, clock, actor },
    { requestId: request.requestId, act: 'load.print-stickers', body: { loadId, ...request } },
    async (trx) => {
      const at = clock.now();
      const load = await lockLoad(trx, actor.facilityId, loadId);
      requireAct(load, 'print-stickers');
      const scanned = await trx('load_packages as listed')
        .join('packages as package', 'package.id', 'listed.package_id')
        .leftJoin('load_stickers as sticker', (join) => {
          join.on('sticker.package_id', 'listed.package_id').andOn('sticker.load_id', 'listed.load_id');
        })
        .where('listed.load_id', load.id)
        .whereNotNull('listed.scanned_at')
        .groupBy('listed.package_id', 'package.code')
        .orderBy('package.code')
        .select<Scanned[]>(
          'listed.package_id',
          'package.code',
          trx.raw('coalesce(max(sticker.copy), 0) as greatest_copy'),
          trx.raw(
            '(array_agg(sticker.id) filter (where sticker.id is not null and sticker.voided_at is null))[1] as live_id',
          ),
        );
      const chosen = choose(scanned, request.packageIds);
      const reprints = chosen.filter((entry) => entry.greatest_copy > 0);
      if (reprints.length > 0 && request.reason === null) {
        throw new RuleRefused(
          'load.sticker-reprint-needs-reason',
          'A sticker was printed for this before. Say why you print it again.',
        );
      }
      const live = reprints.flatMap((entry) => (entry.live_id === null ? [] : [entry.live_id]));
      await trx('load_stickers')
        .whereIn('id', live)
        .update({ voided_at: at, voided_by: actor.personId, void_reason: request.reason });
      const batchId = ids.next();
      const rows = chosen.map((entry) => ({
        id: ids.next(),
        batch_id: batchId,
        load_id: load.id,
        package_id: entry.package_id,
        copy: entry.greatest_copy + 1,
        reason: entry.greatest_copy > 0 ? request.reason : null,
        printed_by: actor.personId,
        printed_at: at,
      }));
      await trx('load_stickers').insert(rows);
      for (const row of rows) {
        await appendEvent(trx, {
          kind: 'load.sticker-printed',
          at,
          facilityId: load.facility_id,
          actorId: actor.personId,
          subjectKind: 'package',
          subjectId: row.package_id,
          loadId: load.id,
          requestId: request.requestId,
          payload: { copy: row.copy, reason: row.reason },
        });
      }
      return { stickerIds: rows.map((row) => row.id), pdf: `/api/loads/${load.id}/stickers/${batchId}` };
    },
  );
}

function choose(scanned: readonly Scanned[], packageIds: readonly string[] | null): Scanned[] {
  const chosen =
    packageIds === null
      ? scanned.filter((entry) => entry.live_id === null)
      : packageIds.map((id) => {
          const entry = scanned.find((candidate) => candidate.package_id === id);
          if (!entry)
            throw new RuleRefused(
              'load.sticker-not-scanned',
              'A sticker is printed only for a package that was scanned into this load.',
            );
          return entry;
        });
  if (chosen.length === 0) {
    throw new RuleRefused('load.no-stickers-needed', 'Every scanned package of this load has its sticker.');
  }
  return [...new Set(chosen)];
}

/** The sheet of one printing: only its stickers that are still live, so that an old sheet cannot bring void ones back. */
export async function drawStickerBatch(
  db: Db,
  actor: Actor,
  loadId: string,
  batchId: string,
): Promise<{ file: Buffer; mediaType: 'application/pdf'; name: string }> {
  const load = await getLoad(db, actor.facilityId, loadId);
  const sterilizer = await db('sterilizers').where({ id: load.sterilizer_id }).first<{ name: string }>('name');
  const rows = await db('load_stickers as sticker')
    .join('packages as package', 'package.id', 'sticker.package_id')
    .join('items as item', 'item.id', 'package.item_id')
    .join('people as person', 'person.id', 'package.packed_by')
    .where({ 'sticker.batch_id': batchId, 'sticker.load_id': load.id })
    .whereNull('sticker.voided_at')
    .orderBy('package.code')
    .select<{ code: string; name: string; is_implant: boolean; initials: string; copy: number; printed_at: Date }[]>(
      'package.code',
      'item.name',
      'item.is_implant',
      'person.initials',
      'sticker.copy',
      'sticker.printed_at',
    );
  const [first] = rows;
  if (!first) throw new NotFound('load.no-such-stickers', 'There are no live stickers of this printing.');
  const file = await drawLoadStickers(
    rows.map((row) => ({
      packageCode: row.code,
      itemName: row.name,
      loadNumber: load.number,
      sterilizer: sterilizer.name,
      day: load.day,
      packedBy: row.initials,
      isImplant: row.is_implant,
      copy: row.copy,
    })),
    { layout: 'sheet', printedAt: first.printed_at.toISOString() },
  );
  return { file, mediaType: 'application/pdf', name: `load-${load.number}-stickers.pdf` };
}
