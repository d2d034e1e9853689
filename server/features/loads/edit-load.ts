import type { EditLoadRequest, LoadChange } from '#contract/loads';
import { applyEdits, type SpareHolder } from '#domain/load/apply-edit';
import { editsWords } from '#domain/load/describe-edit';
import type { LoadDifference } from '#domain/load/difference';
import type { LoadEdit } from '#domain/load/finding';
import type { LoadView } from '#domain/load/model';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import type { Transaction } from '../../platform/db';
import { NotFound, RuleRefused } from '../../platform/errors';
import { once } from '../../platform/once';
import { holderById } from '../equipment/read-model';
import { recordAct, requireAct, type ActKind } from './load-change';
import { lockLoad } from './load-store';
import { readLoadView, type LoadAsKnown } from './load-view-read-model';
import { lockHolders, requireHolderFree } from './require-holder-free';
import type { AuditPayloads } from '#domain/audit/event-kinds';

type Telling = { readonly [Kind in ActKind]: { readonly kind: Kind; readonly payload: AuditPayloads[Kind] } }[ActKind];

/** Moves, turns, takes off: one edit or several that belong together, all or none. */
export async function editLoad(
  services: Services,
  actor: Actor,
  loadId: string,
  request: EditLoadRequest,
): Promise<{ change: LoadChange }> {
  const { db, clock } = services;
  return once(
    { db, clock, actor },
    { requestId: request.requestId, act: 'load.edit', body: { loadId, ...request } },
    async (trx) => {
      const at = clock.now();
      const load = await lockLoad(trx, actor.facilityId, loadId);
      requireAct(load, 'build');
      const known = await readLoadView(trx, load, at);
      const applied = applyEdits(known.view, request.edits, await sparesFor(trx, known, request.edits));
      if (!applied.ok) throw new RuleRefused(applied.refusal.code, applied.refusal.sentence);
      const change = await recordAct(
        trx,
        known,
        applied.value,
        { actor, at, requestId: request.requestId },
        (difference) => tellingOf(known.view, applied.value, request.edits, difference),
      );
      return { change };
    },
  );
}

/** Holders that the edits put on the cart and that are not on it yet: locked, if nobody else has them. */
async function sparesFor(trx: Transaction, known: LoadAsKnown, edits: readonly LoadEdit[]): Promise<SpareHolder[]> {
  const wanted = edits.flatMap((edit) =>
    edit.edit === 'place-holder' && !known.view.holders.some((holder) => holder.holderId === edit.holderId)
      ? [edit.holderId]
      : [],
  );
  if (wanted.length === 0) return [];
  await lockHolders(trx, wanted);
  const spares: SpareHolder[] = [];
  for (const holderId of wanted) {
    const holder = await holderById(trx, known.load.facility_id, holderId);
    if (!holder) throw new NotFound('holder.none', 'There is no such holder here.');
    await requireHolderFree(trx, holder);
    spares.push({ holderId: holder.holderId, name: holder.name, placeCode: holder.placeCode, kindId: holder.kind.id });
  }
  return spares;
}

function tellingOf(view: LoadView, after: LoadView, edits: readonly LoadEdit[], difference: LoadDifference): Telling {
  // Packages as they were, since one may be off now; holders as they are, since one may just have come.
  const words = editsWords({ ...view, holders: [...after.holders, ...view.holders] }, edits, 'done');
  const only = edits.length === 1 ? edits[0] : undefined;
  const codeOf = (packageId: string) => view.packages.find((entry) => entry.packageId === packageId)?.code ?? packageId;
  const nameOf = (holderId: string) =>
    view.holders.find((entry) => entry.holderId === holderId)?.name ??
    difference.holders.find((entry) => entry.id === holderId)?.after?.name ??
    holderId;
  switch (only?.edit) {
    case 'place':
    case 'turn-paper':
    case 'set-pose':
      return { kind: 'load.package-moved', payload: { packageCode: codeOf(only.packageId), words, difference } };
    case 'take-off':
      return { kind: 'load.package-taken-off', payload: { packageCode: codeOf(only.packageId), difference } };
    case 'place-holder':
      return { kind: 'load.holder-placed', payload: { holder: nameOf(only.holderId), difference } };
    case 'take-holder-off':
      return { kind: 'load.holder-taken-off', payload: { holder: nameOf(only.holderId), difference } };
    case 'change-program':
      return {
        kind: 'load.program-changed',
        payload: { before: view.program.code, after: difference.program?.after.code ?? view.program.code, difference },
      };
    case undefined:
      return { kind: 'load.arranged', payload: { packages: difference.packages.length, words, difference } };
  }
}
