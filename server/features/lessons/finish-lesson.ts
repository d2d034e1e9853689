import type { FinishedLesson, finishLessonRequestSchema } from '#contract/lessons';
import { decideFinishLesson } from '#domain/lessons/finish-lesson';
import { ruleSetVersion } from '#domain/load/policy';
import type { z } from 'zod';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import type { Transaction } from '../../platform/db';
import { Conflict, NotFound, RuleRefused } from '../../platform/errors';
import { once } from '../../platform/once';

type Stated = z.output<typeof finishLessonRequestSchema>;

/** Keeps that a person has read a lesson and answered its question. It is no competency: that is observed and signed for. */
export async function finishLesson(
  { db, clock, ids }: Services,
  actor: Actor,
  ruleId: string,
  { requestId, ...stated }: Stated,
): Promise<{ lesson: FinishedLesson }> {
  return once({ db, clock, actor }, { requestId, act: 'lesson.finish', body: { ruleId, ...stated } }, async (trx) => {
    const decided = decideFinishLesson(ruleId, stated.answers);
    if (!decided.ok) {
      const { code, sentence } = decided.refusal;
      throw code === 'lesson.none' ? new NotFound(code, sentence) : new RuleRefused(code, sentence);
    }
    if (stated.ruleSet !== ruleSetVersion) {
      throw new Conflict(
        'lesson.rules-changed',
        'The rules have changed since this page was opened. Please reload it.',
      );
    }
    const load = stated.loadId === null ? null : await getLoadNumber(trx, actor.facilityId, stated.loadId);
    const at = clock.now();
    const { tries } = decided.value;
    await trx('finished_lessons').insert({
      id: ids.next(),
      facility_id: actor.facilityId,
      person_id: actor.personId,
      rule_id: ruleId,
      rule_set: ruleSetVersion,
      tries,
      load_id: stated.loadId,
      finished_at: at,
    });
    // Not of the load's own history: what a person learned from it is no act upon it.
    await appendEvent(trx, {
      kind: 'lesson.finished',
      at,
      facilityId: actor.facilityId,
      actorId: actor.personId,
      subjectKind: 'lesson',
      subjectId: ruleId,
      requestId,
      payload: { ruleId, ruleSet: ruleSetVersion, tries, loadId: stated.loadId },
    });
    return { lesson: { ruleId, ruleSet: ruleSetVersion, tries, finishedAt: at.toISOString(), load } };
  });
}

async function getLoadNumber(
  trx: Transaction,
  facilityId: string,
  loadId: string,
): Promise<{ readonly id: string; readonly number: string }> {
  const load = await trx('loads')
    .where({ id: loadId, facility_id: facilityId })
    .first<{ id: string; number: string } | undefined>('id', 'number');
  if (!load) throw new NotFound('load.none', 'There is no such load here.');
  return load;
}
