import { randomBytes, randomUUID } from 'node:crypto';
import { createServer, type Server } from 'node:http';
import request from 'supertest';
import type TestAgent from 'supertest/lib/agent';
import { afterAll, beforeAll } from 'vitest';
import type { Role } from '../../src/domain/access/permissions';
import { roles } from '../../src/domain/access/permissions';
import { formatBadgeCode } from '../../src/domain/label/badge-code';
import { idleTimeoutS } from '../../src/domain/people/session-limits';
import { createApp } from '../../server/app';
import { openSessionPool, type Db } from '../../server/platform/db';
import { timeOrderedIds } from '../../server/platform/ids';
import { openLogger } from '../../server/platform/logger';
import { hashSecret } from '../../server/platform/secret-hash';
import { freshDatabase } from './fresh-database';

/** A clock that moves only when told. It begins at 07:30 on 3 March 2026 in the hospital's zone. */
export type HeldClock = {
  readonly now: () => Date;
  readonly set: (at: string) => void;
  readonly advance: (by: { readonly seconds?: number; readonly minutes?: number; readonly hours?: number }) => void;
};

export function holdClock(at = '2026-03-03T13:30:00.000Z'): HeldClock {
  let nowMs = Date.parse(at);
  return {
    now: () => new Date(nowMs),
    set: (later) => {
      nowMs = Date.parse(later);
    },
    advance: ({ seconds = 0, minutes = 0, hours = 0 }) => {
      nowMs += (seconds + 60 * minutes + 3600 * hours) * 1000;
    },
  };
}

export type FacilityLetter = 'A' | 'B';

export type TestPerson = {
  readonly id: string;
  readonly staffNumber: string;
  readonly displayName: string;
  readonly role: Role;
  readonly facility: FacilityLetter;
  readonly facilityId: string;
  readonly badge: string;
};

/** Everyone in a test signs in with these. */
export const testPassword = 'lantern gravel thirty otters';
export const testPin = '730418';

export type TestApp = {
  readonly db: Db;
  readonly clock: HeldClock;
  /** A and B are strangers to each other. */
  readonly facilities: Readonly<Record<FacilityLetter, string>>;
  /** One person for each role and facility. */
  readonly person: (role: Role, facility?: FacilityLetter) => TestPerson;
  /** An agent signed in with password in that role; it sends what our own pages send. Signs in again after idle hours. */
  readonly as: (role: Role, facility?: FacilityLetter) => Promise<TestAgent>;
  /** An agent nobody has signed in with. */
  readonly anyone: () => TestAgent;
  /** A second process in front of the same database, with its own connections. */
  readonly besides: (settings?: { readonly isCookieSecure?: boolean }) => Promise<{ readonly anyone: () => TestAgent }>;
};

/** The id of nothing: for what is not there, and for the `requestId` of a write. */
export function anId(): string {
  return randomUUID();
}

/**
 * The real application over HTTP on a database of the calling file's own, with a held clock and two facilities.
 * Call it at the top of the file; what it gives is ready from the first beforeAll on.
 */
export function openTestApp(): TestApp {
  const database = freshDatabase();
  const clock = holdClock();
  const facilities = { A: randomUUID(), B: randomUUID() };
  const people = makePeople(facilities);
  const closing: (() => Promise<void>)[] = [];
  const agents = new Map<string, { agent: TestAgent; activeMs: number }>();
  let server: Server | undefined;

  async function listen(isCookieSecure = false): Promise<Server> {
    const sessionPool = openSessionPool(database.url);
    const app = createApp(
      { db: database.db, clock, ids: timeOrderedIds, logger: openLogger('silent') },
      {
        sessionPool,
        sessionSecret: 'a secret that is only ever used in tests',
        isCookieSecure,
        trustProxy: 'loopback',
        clientDir: null,
      },
    );
    const listening = createServer(app);
    await new Promise<void>((resolve) => {
      listening.listen(0, '127.0.0.1', resolve);
    });
    closing.push(async () => {
      listening.closeAllConnections();
      await new Promise((resolve) => listening.close(resolve));
      await sessionPool.end();
    });
    return listening;
  }

  function agentOf(running: Server | undefined): TestAgent {
    if (!running) throw new Error('The application is ready only inside tests and hooks.');
    return request.agent(running).set('X-Requested-With', 'paperside');
  }

  function person(role: Role, facility: FacilityLetter = 'A'): TestPerson {
    const found = people.find((one) => one.role === role && one.facility === facility);
    if (!found) throw new Error(`There is no ${role} in facility ${facility}.`);
    return found;
  }

  beforeAll(async () => {
    await insertFacilities(database.db, facilities, clock.now());
    await insertPeople(database.db, people, clock.now());
    server = await listen();
  });

  afterAll(async () => {
    for (const close of closing) await close();
  });

  return {
    get db() {
      return database.db;
    },
    clock,
    facilities,
    person,
    anyone: () => agentOf(server),
    async as(role, facility = 'A') {
      const key = `${role} ${facility}`;
      const nowMs = clock.now().getTime();
      const known = agents.get(key);
      if (known && Math.abs(nowMs - known.activeMs) < (idleTimeoutS / 2) * 1000) return known.agent;
      const agent = agentOf(server);
      await agent
        .post('/api/session')
        .send({ staffNumber: person(role, facility).staffNumber, password: testPassword })
        .expect(200);
      agents.set(key, { agent, activeMs: nowMs });
      return agent;
    },
    async besides(settings = {}) {
      const second = await listen(settings.isCookieSecure);
      return { anyone: () => agentOf(second) };
    },
  };
}

function makePeople(facilities: Readonly<Record<FacilityLetter, string>>): readonly TestPerson[] {
  return (['A', 'B'] as const).flatMap((facility, facilityIndex) =>
    roles.map((role, index) => ({
      id: randomUUID(),
      staffNumber: `${facility}${String(1001 + index)}`,
      displayName: `${facility === 'A' ? 'Ada' : 'Bo'} ${role}`,
      role,
      facility,
      facilityId: facilities[facility],
      badge: formatBadgeCode(40_000_000 + facilityIndex * 1_000_000 + index * 1_013),
    })),
  );
}

async function insertFacilities(
  db: Db,
  facilities: Readonly<Record<FacilityLetter, string>>,
  now: Date,
): Promise<void> {
  const shared = {
    time_zone: 'America/Chicago',
    unit_system: 'metric',
    load_number_pattern: '{sterilizer}-{yy}{ddd}-{nn}',
    day_rule: 'calendar-day',
    created_at: now,
  };
  await db('facilities').insert([
    { ...shared, id: facilities.A, name: 'Alder Hospital' },
    { ...shared, id: facilities.B, name: 'Birch Hospital' },
  ]);
}

let hashes: Promise<{ readonly password: string; readonly pin: string }> | undefined;

/** Hashing is slow on purpose, so once per file is enough. */
function hashOnce(): Promise<{ readonly password: string; readonly pin: string }> {
  hashes ??= Promise.all([hashSecret(testPassword), hashSecret(testPin)]).then(([password, pin]) => ({
    password,
    pin,
  }));
  return hashes;
}

async function insertPeople(db: Db, people: readonly TestPerson[], now: Date): Promise<void> {
  const { password, pin } = await hashOnce();
  const expiresAt = new Date(now.getTime() + 30 * 24 * 3600 * 1000);
  await db('people').insert(
    people.map((one) => ({
      id: one.id,
      staff_number: one.staffNumber,
      display_name: one.displayName,
      initials: one.role.slice(0, 2).toUpperCase(),
      password_hash: password,
      badge_code: one.badge,
      pin_hash: pin,
      created_at: now,
    })),
  );
  await db('memberships').insert(
    people.map((one) => ({
      person_id: one.id,
      facility_id: one.facilityId,
      role: one.role,
      expires_at: one.role === 'surveyor' ? expiresAt : null,
    })),
  );
}

export type NewPerson = {
  readonly role: Role;
  readonly facilityId: string;
  readonly staffNumber?: string;
  readonly displayName?: string;
  readonly expiresAt?: Date | null;
};

/** One more person, with the password and PIN everyone has. */
export async function addTestPerson(app: TestApp, { role, facilityId, ...rest }: NewPerson): Promise<TestPerson> {
  const person: TestPerson = {
    id: randomUUID(),
    staffNumber: rest.staffNumber ?? `X${randomBytes(6).toString('hex').toUpperCase()}`,
    displayName: rest.displayName ?? 'Quill Somebody',
    role,
    facility: facilityId === app.facilities.B ? 'B' : 'A',
    facilityId,
    badge: formatBadgeCode(randomBytes(3).readUIntBE(0, 3) + 50_000_000),
  };
  await insertPeople(app.db, [person], app.clock.now());
  if (rest.expiresAt !== undefined) {
    await app.db('memberships').where({ person_id: person.id }).update({ expires_at: rest.expiresAt });
  }
  return person;
}
