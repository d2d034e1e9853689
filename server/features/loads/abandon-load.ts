import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import { once } from '../../platform/once';
import { lockPackages, lockRun } from '../packages/read-model';
import { requireAct } from './load-change';
import { lockLoad, stepVersion } from './load-store';

/** Gives a load up while it is being built: its packages wait again where they waited before. */
export async function abandonLoad(
  services: Services,
  actor: Actor,
  loadId: string,
  request: { readonly requestId: string; readonly reason: string },
): Promise<undefined> {
  const { db, clock } = services;
  await once(
    { db, clock, actor },
    { requestId: request.requestId, act: 'load.abandon', body: { loadId, ...request } },
    async (trx) => {
      const at = clock.now();
      const load = await lockLoad(trx, actor.facilityId, loadId);
      const { to } = requireAct(load, 'abandon');
      // Run first, then packages by id, as staging does: otherwise the two could wait for each other.
      if (load.run_id !== null) await lockRun(trx, load.run_id);
      await lockPackages(trx, await trx('load_packages').where({ load_id: load.id }).pluck<string[]>('package_id'));
      await trx('packages')
        .whereIn('id', trx('load_packages').where({ load_id: load.id }).select('package_id'))
        .whereIn('state', ['in-load', 'staged'])
        .update({
          state: trx.raw("case when run_id is null then 'packed' else 'staged' end"),
          version: trx.raw('version + 1'),
        });
      await trx('load_packages').where({ load_id: load.id }).update({ is_open: false });
      await trx('load_holders').where({ load_id: load.id }).update({ is_open: false });
      await trx('load_stickers')
        .where({ load_id: load.id })
        .whereNull('voided_at')
        .update({ voided_at: at, voided_by: actor.personId, void_reason: 'Load given up' });
      if (load.run_id !== null) {
        await trx('runs')
          .where({ id: load.run_id, state: 'taken' })
          .update({ state: 'waiting', version: trx.raw('version + 1') });
      }
      await trx('loads').where({ id: load.id }).update({ state: to, abandoned_reason: request.reason });
      await stepVersion(trx, load);
      await appendEvent(trx, {
        kind: 'load.abandoned',
        at,
        facilityId: load.facility_id,
        actorId: actor.personId,
        subjectKind: 'load',
        subjectId: load.id,
        loadId: load.id,
        requestId: request.requestId,
        payload: { reason: request.reason },
      });
      return null;
    },
  );
  return undefined;
}
