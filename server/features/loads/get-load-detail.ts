import type { LoadDetail } from '#contract/loads';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { NotFound } from '../../platform/errors';
import { findLoadSummary } from './load-list-read-model';
import { getLoad } from './load-store';
import { readLoadView } from './load-view-read-model';
import { getUndoable } from './undoable-read-model';
import { findVerdictAtClose } from './verdict-at-close';

/** One load with everything a station needs to go on building it, read at one moment. */
export async function getLoadDetail(services: Services, actor: Actor, loadId: string): Promise<LoadDetail> {
  return services.db.transaction(
    async (trx) => {
      const load = await getLoad(trx, actor.facilityId, loadId);
      const [known, closed, summary, stickers, undoable] = await Promise.all([
        readLoadView(trx, load, services.clock.now()),
        findVerdictAtClose(trx, load.id),
        findLoadSummary(trx, actor.facilityId, loadId),
        trx('load_stickers')
          .where({ load_id: load.id })
          .whereNull('voided_at')
          .select<{ id: string; package_id: string; copy: number }[]>('id', 'package_id', 'copy'),
        load.state === 'building' ? getUndoable(trx, load.id) : null,
      ]);
      if (!summary) throw new NotFound('load.none', 'There is no such load here.');
      return {
        summary,
        // A closed load stays as it was, whatever becomes of the catalogue and the equipment.
        view: closed?.view ?? known.view,
        policy: known.policy,
        policyNumber: known.policyNumber,
        counts: [...known.counts],
        acceptances: [...known.acceptances],
        undoable: undoable?.words ?? null,
        stickers: stickers.map((row) => ({ packageId: row.package_id, stickerId: row.id, copy: row.copy })),
        closing:
          closed && load.contents_digest !== null && load.rule_set !== null
            ? { digest: load.contents_digest, ruleSet: load.rule_set, findings: [...closed.findings] }
            : null,
        version: load.version,
      };
    },
    // All of it from one snapshot, so that the version tells the truth about the rest.
    { isolationLevel: 'repeatable read', readOnly: true },
  );
}
