import type { LoadChange } from '#contract/loads';
import { affectedShelves } from '#domain/load/apply-edit';
import type { AuditKind, AuditPayloads } from '#domain/audit/event-kinds';
import { differenceOf, isEmptyDifference, type LoadDifference } from '#domain/load/difference';
import type { LoadView } from '#domain/load/model';
import { decideAct, type DecidedAct, type LoadAct } from '#domain/load/state-machine';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import type { Transaction } from '../../platform/db';
import { RuleRefused } from '../../platform/errors';
import { lockPackages } from '../packages/read-model';
import { getUndoable, isUndoable, undoWords } from './undoable-read-model';
import type { LoadAsKnown } from './load-view-read-model';
import { listAcceptances, listCounts, stepVersion, voidCounts, writeDifference, type LoadRow } from './load-store';

/** Whether the load's state allows an act, by the one table of its life. */
export function requireAct(load: LoadRow, act: LoadAct): DecidedAct {
  const decided = decideAct(load.state, act);
  if (!decided.ok) throw new RuleRefused(decided.refusal.code, decided.refusal.sentence);
  return decided.value;
}

export type ActKind = {
  [Kind in AuditKind]: AuditPayloads[Kind] extends { readonly difference: LoadDifference } ? Kind : never;
}[AuditKind];

export type ActContext = {
  readonly actor: Actor;
  readonly at: Date;
  readonly requestId: string;
  readonly entry?: string;
};

/** Writes one act on a load: what changed, the counts it voids, the event that tells it, the next version. */
export async function recordAct<Kind extends ActKind>(
  trx: Transaction,
  known: LoadAsKnown,
  after: LoadView,
  act: ActContext,
  tell: (difference: LoadDifference) => { readonly kind: Kind; readonly payload: AuditPayloads[Kind] },
): Promise<LoadChange> {
  const { load, view } = known;
  const difference = differenceOf(view, after);
  if (isEmptyDifference(difference)) return changeFrom(trx, load, load.version, after, difference);
  const { kind, payload } = tell(difference);
  const scanning = { personId: act.actor.personId, at: act.at, entry: act.entry ?? 'keyed' };
  const isVoid = new Set(affectedShelves(view, after));
  const voided = known.counts.filter((count) => isVoid.has(count.shelfId));
  await lockTouched(trx, difference);
  const [version] = await Promise.all([
    stepVersion(trx, load),
    writeDifference(trx, load.id, difference, scanning),
    voidCounts(
      trx,
      load.id,
      voided.map((count) => count.shelfId),
    ),
    appendEvent(trx, {
      kind,
      at: act.at,
      facilityId: load.facility_id,
      actorId: act.actor.personId,
      subjectKind: 'load',
      subjectId: load.id,
      loadId: load.id,
      requestId: act.requestId,
      payload,
    }),
  ]);
  return {
    ...partsOf(load, version, after, difference),
    counts: known.counts.filter((count) => !isVoid.has(count.shelfId)),
    acceptances: [...known.acceptances],
    // An act that was taken back uncovers the one before it; any other is itself the last.
    undoable: isUndoable(kind) ? undoWords(kind, payload) : ((await getUndoable(trx, load.id))?.words ?? null),
  };
}

/** Packages that are written, and those that something is put on, all in one order: whoever stages them keeps to it too. */
async function lockTouched(trx: Transaction, difference: LoadDifference): Promise<void> {
  const touched = difference.packages.flatMap(({ id, after }) =>
    after?.placement?.at === 'package' ? [id, after.placement.belowPackageId] : [id],
  );
  // One alone can be in no wrong order, and a scan should be quick.
  if (touched.length > 1) await lockPackages(trx, touched);
}

/** The part of a load that changed, for whoever holds the version before. */
export async function changeFrom(
  trx: Transaction,
  load: LoadRow,
  version: number,
  after: LoadView,
  difference: LoadDifference,
): Promise<LoadChange> {
  const [counts, acceptances, undoable] = await Promise.all([
    listCounts(trx, load.id),
    listAcceptances(trx, load.id),
    getUndoable(trx, load.id),
  ]);
  return { ...partsOf(load, version, after, difference), counts, acceptances, undoable: undoable?.words ?? null };
}

function partsOf(
  load: LoadRow,
  version: number,
  after: LoadView,
  difference: LoadDifference,
): Omit<LoadChange, 'counts' | 'acceptances' | 'undoable'> {
  const newItemIds = new Set(
    difference.packages.flatMap((change) => (change.before === null && change.after ? [change.after.itemId] : [])),
  );
  return {
    from: load.version,
    version,
    packages: difference.packages.flatMap((change) => (change.after ? [change.after] : [])),
    removedPackageIds: difference.packages.flatMap((change) => (change.after === null ? [change.id] : [])),
    items: after.items.filter((item) => newItemIds.has(item.id)),
    holders: [...after.holders],
    program: after.program,
  };
}
