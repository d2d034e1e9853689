import { appendEvent, appendEvents, type AuditEvent } from '../../platform/audit-writer';
import type { ImportCounts, WriteContext, Written } from '../../platform/register/register';

/** What the history calls the pieces of equipment. */
export type EquipmentKind = 'program' | 'sterilizer' | 'cart' | 'shelf' | 'holder-kind' | 'holder';

/** What the history keeps of one piece: whole before, whole after. */
export type EquipmentNote = {
  readonly id: string;
  readonly code: string;
  readonly before: unknown;
  readonly after: unknown;
};

export function noteOf<Fields>({ before, after }: Written<Fields>, code: string): EquipmentNote {
  return { id: after.id, code, before: before?.fields ?? null, after: after.fields };
}

export async function noteEquipment(
  context: WriteContext,
  what: EquipmentKind,
  notes: readonly EquipmentNote[],
): Promise<void> {
  const events = notes.map((note): AuditEvent<'equipment.added' | 'equipment.changed'> => {
    const common = {
      at: context.at,
      facilityId: context.actor.facilityId,
      actorId: context.actor.personId,
      subjectKind: what,
      subjectId: note.id,
      requestId: context.requestId,
    };
    if (note.before === null) return { ...common, kind: 'equipment.added', payload: { what, code: note.code } };
    return { ...common, kind: 'equipment.changed', payload: { what, before: note.before, after: note.after } };
  });
  await appendEvents(context.trx, events);
}

/** The last line of a register's description: what a file did as a whole. */
export function noteImportOf(what: EquipmentKind) {
  return async (context: WriteContext, { added, changed, refused }: ImportCounts): Promise<void> => {
    await appendEvent(context.trx, {
      kind: 'equipment.imported',
      at: context.at,
      facilityId: context.actor.facilityId,
      actorId: context.actor.personId,
      subjectKind: 'facility',
      subjectId: context.actor.facilityId,
      requestId: context.requestId,
      payload: { what, added, changed, refused },
    });
  };
}
