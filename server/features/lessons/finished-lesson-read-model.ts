import type { FinishedLesson } from '#contract/lessons';
import type { Db, Transaction } from '../../platform/db';

type FinishedRow = {
  readonly rule_id: string;
  readonly rule_set: string;
  readonly tries: number;
  readonly finished_at: Date;
  readonly load_id: string | null;
  readonly load_number: string | null;
};

/** What one person has finished in one facility: of each lesson the last time, the latest first. */
export async function listFinishedLessons(
  db: Db | Transaction,
  { facilityId, personId }: { readonly facilityId: string; readonly personId: string },
): Promise<FinishedLesson[]> {
  const rows = await db('finished_lessons')
    .leftJoin('loads', 'loads.id', 'finished_lessons.load_id')
    .where({ 'finished_lessons.facility_id': facilityId, 'finished_lessons.person_id': personId })
    .distinctOn('finished_lessons.rule_id')
    .orderBy([
      { column: 'finished_lessons.rule_id' },
      { column: 'finished_lessons.finished_at', order: 'desc' },
      { column: 'finished_lessons.id', order: 'desc' },
    ])
    .select<FinishedRow[]>(
      'finished_lessons.rule_id',
      'finished_lessons.rule_set',
      'finished_lessons.tries',
      'finished_lessons.finished_at',
      'finished_lessons.load_id',
      'loads.number as load_number',
    );
  return rows.map(fromRow).sort((a, b) => (a.finishedAt < b.finishedAt ? 1 : -1));
}

function fromRow(row: FinishedRow): FinishedLesson {
  return {
    ruleId: row.rule_id,
    ruleSet: row.rule_set,
    tries: row.tries,
    finishedAt: row.finished_at.toISOString(),
    load: row.load_id === null || row.load_number === null ? null : { id: row.load_id, number: row.load_number },
  };
}
