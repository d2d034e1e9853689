import type { LoadChange } from '#contract/loads';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import { NotFound } from '../../platform/errors';
import { once } from '../../platform/once';
import { differenceOf } from '#domain/load/difference';
import { changeFrom, requireAct } from './load-change';
import { lockLoad, stepVersion } from './load-store';
import { readLoadView } from './load-view-read-model';

/** Keeps what a person counted on a shelf without being shown what was scanned there. */
export async function countShelf(
  services: Services,
  actor: Actor,
  loadId: string,
  request: { readonly requestId: string; readonly shelfId: string; readonly counted: number },
): Promise<{ change: LoadChange }> {
  const { db, clock } = services;
  return once(
    { db, clock, actor },
    { requestId: request.requestId, act: 'load.count', body: { loadId, ...request } },
    async (trx) => {
      const at = clock.now();
      const load = await lockLoad(trx, actor.facilityId, loadId);
      requireAct(load, 'build');
      const { view } = await readLoadView(trx, load, at);
      const shelf = view.cart.shelves.find((entry) => entry.id === request.shelfId);
      if (!shelf) throw new NotFound('shelf.none', 'This shelf is not on the load’s cart.');
      const count = { counted: request.counted, counted_by: actor.personId, counted_at: at };
      await trx('load_counts')
        .insert({ load_id: load.id, shelf_id: shelf.id, ...count })
        .onConflict(['load_id', 'shelf_id'])
        .merge(count);
      await appendEvent(trx, {
        kind: 'load.counted',
        at,
        facilityId: load.facility_id,
        actorId: actor.personId,
        subjectKind: 'load',
        subjectId: load.id,
        loadId: load.id,
        requestId: request.requestId,
        payload: { shelf: shelf.name, counted: request.counted },
      });
      return { change: await changeFrom(trx, load, await stepVersion(trx, load), view, differenceOf(view, view)) };
    },
  );
}
