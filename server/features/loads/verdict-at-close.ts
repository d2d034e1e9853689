import { keptAcceptanceSchema, keptFindingSchema } from '#contract/judged-again';
import { loadViewSchema } from '#contract/load-view';
import type { LoadView } from '#domain/load/model';
import type { KeptFinding } from '#domain/policy/compare-findings';
import { z } from 'zod';
import type { Db, Transaction } from '../../platform/db';

/* What a load was closed with. It was written by the release of that day, so it is read with patience. */

const verdictSchema = z.object({
  findings: z.array(z.unknown()),
  acceptances: z.array(keptAcceptanceSchema).catch([]),
});

export type VerdictAtClose = {
  readonly findings: readonly KeptFinding[];
  readonly acceptances: readonly z.infer<typeof keptAcceptanceSchema>[];
  /** What the rules looked at; null where a release that did not keep it closed the load, or kept less than is read now. */
  readonly view: LoadView | null;
  readonly isViewKept: boolean;
};

/** Undefined for a load that was never closed. */
export async function findVerdictAtClose(db: Db | Transaction, loadId: string): Promise<VerdictAtClose | undefined> {
  const row = await db('loads')
    .where({ id: loadId })
    .whereNotNull('contents_digest')
    .first<{ verdict: unknown; view_at_close: unknown } | undefined>('verdict', 'view_at_close');
  if (!row) return undefined;
  const verdict = verdictSchema.safeParse(row.verdict);
  const view = loadViewSchema.safeParse(row.view_at_close);
  return {
    findings: (verdict.data?.findings ?? []).flatMap((one) => keptFindingSchema.safeParse(one).data ?? []),
    acceptances: verdict.data?.acceptances ?? [],
    view: view.data ?? null,
    isViewKept: row.view_at_close !== null,
  };
}
