import { cycleChanges, type CycleField } from '#domain/catalogue/cycle-change';
import type { ProgramFields } from '#domain/catalogue/equipment-fields';
import { appendEvents, type AuditEvent } from '../../platform/audit-writer';
import { lockRegister, type WriteContext, type Written } from '../../platform/register/register';

type Ended = { readonly programId: string; readonly program: string; readonly because: readonly CycleField[] };

function changedCycles(written: readonly Written<ProgramFields>[]): Ended[] {
  return written.flatMap(({ before, after }) => {
    const because = before === null ? [] : cycleChanges(before.fields, after.fields);
    return because.length === 0 ? [] : [{ programId: after.id, program: after.fields.code, because }];
  });
}

/**
 * A program whose cycle is another one now stays on the panel, and no sterilizer is qualified for it any more until
 * somebody says so again.
 */
export async function endQualifications(
  { trx, actor, at, requestId }: WriteContext,
  written: readonly Written<ProgramFields>[],
): Promise<void> {
  const changed = changedCycles(written);
  if (changed.length === 0) return;
  // The sterilizer's own form writes its panel under the same lock.
  await lockRegister(trx, actor.facilityId, 'sterilizer');
  const qualified = await trx('sterilizer_programs')
    .join('sterilizers', 'sterilizers.id', 'sterilizer_programs.sterilizer_id')
    .where('sterilizer_programs.is_qualified', true)
    .whereIn(
      'sterilizer_programs.program_id',
      changed.map(({ programId }) => programId),
    )
    .orderBy('sterilizers.code')
    .select<{ sterilizer_id: string; program_id: string; code: string }[]>(
      'sterilizer_programs.sterilizer_id',
      'sterilizer_programs.program_id',
      'sterilizers.code',
    );
  const sterilizerIds = [...new Set(qualified.map((row) => row.sterilizer_id))].sort();
  // In the order of their ids, like whoever else changes several.
  for (const id of sterilizerIds) {
    await trx('sterilizers').where({ id }).increment('version', 1);
  }
  await trx('sterilizer_programs')
    .whereIn(
      'program_id',
      changed.map(({ programId }) => programId),
    )
    .update({ is_qualified: false });
  const events = qualified.flatMap((row): AuditEvent<'equipment.qualification-ended'>[] => {
    const ended = changed.find(({ programId }) => programId === row.program_id);
    if (!ended) return [];
    return [
      {
        kind: 'equipment.qualification-ended',
        at,
        facilityId: actor.facilityId,
        actorId: actor.personId,
        subjectKind: 'sterilizer',
        subjectId: row.sterilizer_id,
        requestId,
        payload: { sterilizer: row.code, program: ended.program, because: ended.because },
      },
    ];
  });
  await appendEvents(trx, events);
}
