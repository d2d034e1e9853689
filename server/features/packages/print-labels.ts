import { paths } from '#contract/paths';
import type { PrintLabelsRequest, PrintLabelsResponse } from '#contract/packages';
import { decideLabelPrint } from '#domain/package/decide-label-print';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import type { Transaction } from '../../platform/db';
import { InvalidInput, NotFound, type FieldProblem } from '../../platform/errors';
import { once } from '../../platform/once';
import { findPackages, lockPackages } from './read-model';
import { refusalError } from './refusal';
import type { Refusal } from '#domain/result';

/** Labels printed so far, of each package that has any. */
async function countCopies(trx: Transaction, packageIds: readonly string[]): Promise<ReadonlyMap<string, number>> {
  const rows = await trx('label_prints')
    .whereIn('label_prints.package_id', [...packageIds])
    .groupBy('label_prints.package_id')
    .select<{ package_id: string; copies: number }[]>('label_prints.package_id', trx.raw('max(copy) as copies'));
  return new Map(rows.map((row) => [row.package_id, row.copies]));
}

/** Writes down which label is printed for whom and which copy it is; the paper comes from the address in the answer. */
export async function printLabels(
  services: Services,
  actor: Actor,
  request: PrintLabelsRequest,
): Promise<PrintLabelsResponse> {
  const { db, clock, ids } = services;
  if (new Set(request.packageIds).size !== request.packageIds.length) {
    throw new InvalidInput('label.package-twice', 'A package is named twice. One label for each, please.');
  }
  const reason = request.reason ?? null;
  return once(
    { db, clock, actor },
    { requestId: request.requestId, act: 'package.print-labels', body: request },
    async (trx) => {
      const at = clock.now();
      // The lock comes first: two who print at once must not both print the first copy.
      await lockPackages(trx, request.packageIds);
      const found = (await findPackages(trx, request.packageIds)).filter((one) => one.facilityId === actor.facilityId);
      const copies = await countCopies(trx, request.packageIds);
      const refusals: Refusal[] = [];
      const fields: FieldProblem[] = [];
      const labels = request.packageIds.map((packageId, index) => {
        const one = found.find((entry) => entry.id === packageId);
        if (!one) throw new NotFound('package.none', 'One of these packages is not known here.');
        const before = copies.get(packageId) ?? 0;
        const decision = decideLabelPrint({ code: one.code, state: one.state, copies: before }, reason);
        if (decision.ok) return { packageId, copy: decision.value.copy, reason: before === 0 ? null : reason };
        refusals.push(decision.refusal);
        fields.push({ pointer: `/body/packageIds/${index}`, detail: decision.refusal.sentence });
        return { packageId, copy: 0, reason: null };
      });
      if (refusals[0]) throw refusalError(refusals[0], fields.slice(0, 20));
      const batchId = ids.next();
      await trx('label_prints').insert(
        labels.map((label) => ({
          id: ids.next(),
          batch_id: batchId,
          package_id: label.packageId,
          copy: label.copy,
          reason: label.reason,
          printed_by: actor.personId,
          printed_at: at,
        })),
      );
      for (const label of labels) {
        await appendEvent(trx, {
          kind: 'package.label-printed',
          at,
          facilityId: actor.facilityId,
          actorId: actor.personId,
          subjectKind: 'package',
          subjectId: label.packageId,
          requestId: request.requestId,
          payload: { copy: label.copy, reason: label.reason },
        });
      }
      return {
        labels: labels.map(({ packageId, copy }) => ({ packageId, copy })),
        pdf: paths.packageLabelSheet(batchId, request.layout),
      };
    },
  );
}
