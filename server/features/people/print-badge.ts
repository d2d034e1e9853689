import { roleWords } from '#domain/access/role-words';
import type { Role } from '#domain/access/permissions';
import type { FileReply, Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import { NotFound } from '../../platform/errors';
import { drawBadges } from '../labels/draw/draw-badges';

type BadgeRow = {
  readonly badge_code: string | null;
  readonly display_name: string;
  readonly role: Role;
  readonly facility_name: string;
};

/** The badge of a person of this facility, as a card to print. Each printing is told in the history: it is half of a key. */
export function printBadge({ db, clock }: Services, actor: Actor, personId: string): Promise<FileReply> {
  return db.transaction(async (trx) => {
    const at = clock.now();
    const row = await trx('people')
      .join('memberships', 'memberships.person_id', 'people.id')
      .join('facilities', 'facilities.id', 'memberships.facility_id')
      .where({ 'people.id': personId, 'memberships.facility_id': actor.facilityId })
      .first<BadgeRow | undefined>(
        'people.badge_code',
        'people.display_name',
        'memberships.role',
        'facilities.name as facility_name',
      );
    if (!row) throw new NotFound('people.none', 'There is no such person here.');
    if (row.badge_code === null) throw new NotFound('people.no-badge', 'This person has no badge.');
    const file = await drawBadges(
      [{ code: row.badge_code, name: row.display_name, role: roleWords[row.role], facility: row.facility_name }],
      { layout: 'single', printedAt: at.toISOString() },
    );
    await appendEvent(trx, {
      kind: 'person.badge-printed',
      at,
      facilityId: actor.facilityId,
      actorId: actor.personId,
      subjectKind: 'person',
      subjectId: personId,
      payload: {},
    });
    return { file, mediaType: 'application/pdf', name: 'badge.pdf' };
  });
}
