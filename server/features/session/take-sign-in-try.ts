import type { Services } from '../../http/define-route';
import { appendEvent } from '../../platform/audit-writer';
import { TooManyTries } from '../../platform/errors';
import { takeTry } from '../../platform/sign-in-tries';
import { listFacilityIds, type Credentials } from './sign-in-store';

type RefusedSignIn = {
  readonly by: 'password' | 'badge';
  readonly person: Credentials | undefined;
  readonly reason: string;
};

/** Tells a refused sign-in in the history of the person it was tried for, if there is one. */
export async function noteRefusedSignIn(
  { db }: Pick<Services, 'db'>,
  { by, person, reason }: RefusedSignIn,
  now: Date,
): Promise<void> {
  await appendEvent(db, {
    kind: 'person.sign-in-refused',
    at: now,
    facilityId: person ? ((await listFacilityIds(db, person.personId, now))[0] ?? null) : null,
    actorId: null,
    subjectKind: 'person',
    subjectId: person?.personId ?? 'unknown',
    payload: { by, reason },
  });
}

/** Tries that have to wait may come by the thousand, and the history is never made shorter: one a minute tells it. */
const toldAgainAfterMs = 60_000;

async function isToldAlready(
  { db }: Pick<Services, 'db'>,
  { person, reason }: RefusedSignIn,
  now: Date,
): Promise<boolean> {
  const last = await db('audit_events')
    .where({ subject_kind: 'person', subject_id: person?.personId ?? 'unknown' })
    .orderBy('id', 'desc')
    .first<{ kind: string; at: Date; payload: { reason?: string } } | undefined>('kind', 'at', 'payload');
  return (
    last?.kind === 'person.sign-in-refused' &&
    last.payload.reason === reason &&
    last.at.getTime() > now.getTime() - toldAgainAfterMs
  );
}

/**
 * Counts a try to sign in, or to prove who one is, before it is judged.
 * @returns its id, for `noteSuccess`
 * @throws TooManyTries when this one has to wait; the history tells it
 */
export async function takeSignInTry(
  services: Services,
  {
    by,
    subject,
    source,
    findPerson,
  }: {
    readonly by: 'password' | 'badge';
    readonly subject: string;
    readonly source: string;
    readonly findPerson: () => Promise<Credentials | undefined>;
  },
): Promise<number> {
  try {
    return await takeTry(services, { subject, source });
  } catch (error) {
    if (error instanceof TooManyTries) {
      const now = services.clock.now();
      const refused = { by, person: await findPerson(), reason: error.code.replace('session.', '') };
      if (!(await isToldAlready(services, refused, now))) await noteRefusedSignIn(services, refused, now);
    }
    throw error;
  }
}
