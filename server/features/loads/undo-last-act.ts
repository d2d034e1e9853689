import type { LoadChange } from '#contract/loads';
import { applyDifference, reverseDifference } from '#domain/load/difference';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { Conflict, RuleRefused } from '../../platform/errors';
import { once } from '../../platform/once';
import { holderById } from '../equipment/read-model';
import { findPackages, lockPackages } from '../packages/read-model';
import { recordAct, requireAct } from './load-change';
import { lockLoad } from './load-store';
import { readLoadView } from './load-view-read-model';
import { lockHolders, requireHolderFree } from './require-holder-free';
import { getUndoable } from './undoable-read-model';

/** Takes the last act on the load back, if nothing it touched has changed since. */
export async function undoLastAct(
  services: Services,
  actor: Actor,
  loadId: string,
  { requestId, undoing }: { readonly requestId: string; readonly undoing: string },
): Promise<{ change: LoadChange }> {
  const { db, clock } = services;
  return once({ db, clock, actor }, { requestId, act: 'load.undo', body: { loadId, undoing } }, async (trx) => {
    const at = clock.now();
    const load = await lockLoad(trx, actor.facilityId, loadId);
    requireAct(load, 'build');
    const undoable = await getUndoable(trx, load.id);
    if (!undoable) throw new RuleRefused('load.nothing-to-undo', 'There is nothing to take back.');
    if (undoable.words !== undoing) {
      throw new Conflict(
        'load.changed-since',
        `Somebody did something else meanwhile: ${undoable.words}. Nothing was taken back.`,
      );
    }
    const known = await readLoadView(trx, load, at);
    const back = reverseDifference(undoable.difference);

    // What comes back to the load must still be free for it. Holders before packages, as everywhere.
    const returningHolders = back.holders.flatMap((entry) => (entry.before === null ? [entry.id] : []));
    await lockHolders(trx, returningHolders);
    const returning = back.packages.flatMap((entry) => (entry.before === null ? [entry.id] : []));
    await lockPackages(trx, returning);
    for (const facts of await findPackages(trx, returning)) {
      const isFree =
        facts.openLoad === null && (facts.state === 'packed' || facts.state === 'staged') && facts.heldReason === null;
      if (!isFree)
        throw new Conflict('load.changed-since', `${facts.code} cannot come back: it has been used elsewhere since.`);
    }
    for (const holderId of returningHolders) {
      const holder = await holderById(trx, actor.facilityId, holderId);
      if (holder) await requireHolderFree(trx, holder);
    }

    const applied = applyDifference(known.view, back);
    if (!applied.ok) throw new Conflict(applied.refusal.code, applied.refusal.sentence);
    const change = await recordAct(trx, known, applied.value, { actor, at, requestId }, (difference) => ({
      kind: 'load.undone',
      payload: { undid: undoable.eventId, difference },
    }));
    return { change };
  });
}
