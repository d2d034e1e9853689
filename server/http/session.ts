import { judgeSession, isActivityDue } from '#domain/people/session-limits';
import { permissionsOf } from '#domain/access/role-matrix';
import { paths } from '#contract/paths';
import connectPgSimple from 'connect-pg-simple';
import express, { type Request, type RequestHandler } from 'express';
import expressSession from 'express-session';
import passport from 'passport';
import { Strategy as LocalStrategy } from 'passport-local';
import type pg from 'pg';
import { z } from 'zod';
import { findStanding } from '../platform/standing';
import { NotAllowed, NotSignedIn } from '../platform/errors';
import { noteActivity } from '../platform/sessions';
import type { Services } from './define-route';
import type { ResolveActor } from './mount-routes';

export type SessionSettings = {
  readonly sessionPool: pg.Pool;
  readonly sessionSecret: string;
  readonly isCookieSecure: boolean;
};

const signInSchema = z.object({
  personId: z.string(),
  facilityId: z.string(),
  by: z.enum(['password', 'badge']),
  /** Milliseconds since 1970, UTC. */
  startedAtMs: z.number(),
  /** Milliseconds since 1970, UTC: the last act that was not the program's own. */
  activeAtMs: z.number(),
});

/** The request a session belongs to: features hand it on, and speak no HTTP themselves. */
export type SessionRequest = Request;

/** What a session holds of a sign-in. Everything else is read afresh with every request. */
export type SignIn = z.infer<typeof signInSchema>;

type Station = {
  readonly passport: InstanceType<typeof passport.Passport>;
  readonly cookieName: string;
  readonly isCookieSecure: boolean;
};

/** The session parts of the application a request came in by; many applications may live in one process. */
const stations = new WeakMap<Request, Station>();

function stationOf(request: Request): Station {
  const station = stations.get(request);
  if (!station) throw new Error('the session middleware did not see this request');
  return station;
}

/** What remains possible while a one-time password waits to be changed. */
const openWhilePasswordMustChange: ReadonlySet<string> = new Set([
  `GET ${paths.session}`,
  `DELETE ${paths.session}`,
  `POST ${paths.sessionPassword}`,
  `POST ${paths.signOutEverywhere}`,
]);

/** Sessions in PostgreSQL, and who is asking. Mounted on /api only: assets need nobody. */
export function openSession(
  services: Services,
  settings: SessionSettings,
): { readonly middleware: RequestHandler; readonly resolveActor: ResolveActor } {
  const PgStore = connectPgSimple(expressSession);
  // The prefix binds the cookie to this host, path and https: RFC 6265bis, 4.1.3.2; browsers refuse it over plain http.
  const cookieName = settings.isCookieSecure ? '__Host-paperside' : 'paperside';
  const ownPassport = new passport.Passport();
  ownPassport.serializeUser((user, done) => {
    done(null, user);
  });
  ownPassport.deserializeUser((user: object, done) => {
    done(null, user);
  });
  const station: Station = { passport: ownPassport, cookieName, isCookieSecure: settings.isCookieSecure };

  const middleware = express.Router();
  middleware.use(
    (request, _response, next) => {
      stations.set(request, station);
      next();
    },
    expressSession({
      name: cookieName,
      secret: settings.sessionSecret,
      // Saving a session that did not change would write one back that another request has just ended.
      resave: false,
      saveUninitialized: false,
      cookie: cookieOptions(station),
      store: new PgStore({
        pool: settings.sessionPool,
        createTableIfMissing: false,
        // The limits are judged by resolveActor; the store only forgets what nobody can use any more.
        ttl: 24 * 60 * 60,
        disableTouch: true,
        // Its timer would keep a test alive; signing in sweeps instead.
        pruneSessionInterval: false,
        errorLog: (...details: unknown[]) => {
          services.logger.error({ details }, 'the session store failed');
        },
      }),
    }),
    ownPassport.session() as RequestHandler,
  );

  return { middleware, resolveActor: (request) => resolveActor(services, request) };
}

async function resolveActor(services: Services, request: Request): ReturnType<ResolveActor> {
  const held = signInOf(request);
  if (!held) {
    if (carriesCookie(request)) throw sessionExpired();
    return null;
  }
  const now = services.clock.now();
  const standing =
    judgeSession(held, now.getTime()) === 'live'
      ? await findStanding(services.db, held.personId, held.facilityId)
      : undefined;
  if (
    !standing ||
    standing.isDisabled ||
    (standing.expiresAt !== null && standing.expiresAt <= now) ||
    (standing.signedOutEverywhereAt !== null && held.startedAtMs < standing.signedOutEverywhereAt.getTime())
  ) {
    await destroySession(request);
    throw sessionExpired();
  }
  if (standing.mustChangePassword && !openWhilePasswordMustChange.has(`${request.method} ${request.path}`)) {
    throw new NotAllowed('session.password-must-change', 'First choose a password of your own.');
  }
  if (!isBackground(request) && isActivityDue(held, now.getTime())) {
    await noteActivity(services.db, request.sessionID, now);
  }
  return {
    personId: held.personId,
    displayName: standing.displayName,
    facilityId: held.facilityId,
    role: standing.role,
    permissions: permissionsOf(standing.role),
  };
}

function sessionExpired(): NotSignedIn {
  return new NotSignedIn('session.expired', 'The sign-in here has ended. Scan your badge or sign in.');
}

/** A screen that asks by itself is not a person at work. Writes always are. */
function isBackground(request: Request): boolean {
  return (request.method === 'GET' || request.method === 'HEAD') && request.get('x-background') === 'yes';
}

function carriesCookie(request: Request): boolean {
  const { cookieName } = stationOf(request);
  return (request.get('cookie') ?? '').split(';').some((pair) => pair.trim().startsWith(`${cookieName}=`));
}

function cookieOptions({ isCookieSecure }: Station) {
  return { path: '/', httpOnly: true, sameSite: 'lax', secure: isCookieSecure } as const;
}

/** What the session of this request holds; it may have run out. Null when there is none. */
export function signInOf(request: Request): SignIn | null {
  const read = signInSchema.safeParse(request.user);
  return read.success ? read.data : null;
}

/**
 * Lets Passport take staff number and password out of this request and have them judged. The body must have been parsed:
 * Passport reads it by itself.
 */
export function authenticateWithPassword<Person extends object>(
  request: SessionRequest,
  judge: (staffNumber: string, password: string) => Promise<Person>,
): Promise<Person> {
  const strategy = new LocalStrategy(
    { usernameField: 'staffNumber', passwordField: 'password', session: false },
    (staffNumber, password, done) => {
      judge(staffNumber, password).then(
        (person) => {
          done(null, person);
        },
        (error: unknown) => {
          done(error);
        },
      );
    },
  );
  return new Promise((resolve, reject) => {
    const middleware = stationOf(request).passport.authenticate(
      strategy,
      { session: false },
      (error: unknown, person: Person | false | undefined) => {
        if (person) resolve(person);
        else reject(error instanceof Error ? error : new Error('nobody was judged', { cause: error }));
      },
    ) as RequestHandler;
    void middleware(request, responseOf(request), reject);
  });
}

/** Begins a sign-in under a new session id; the former session of this browser is gone. */
export function beginSession(request: Request, signIn: SignIn): Promise<void> {
  return new Promise((resolve, reject) => {
    // Passport regenerates the session before it writes into it.
    request.logIn(signIn, (error: unknown) => {
      if (error) reject(error instanceof Error ? error : new Error('the session was not kept', { cause: error }));
      else resolve();
    });
  });
}

/** Ends the session of this request and takes its cookie back. */
export async function endSession(request: Request): Promise<void> {
  await destroySession(request);
  responseOf(request).clearCookie(stationOf(request).cookieName, cookieOptions(stationOf(request)));
}

function destroySession(request: Request): Promise<void> {
  return new Promise((resolve, reject) => {
    request.session.destroy((error: unknown) => {
      if (error) reject(error instanceof Error ? error : new Error('the session was not ended', { cause: error }));
      else resolve();
    });
  });
}

function responseOf(request: Request) {
  if (!request.res) throw new Error('this request has no response');
  return request.res;
}

/** Some acts ask for more than a badge and six digits: OWASP ASVS 5.0, 7.5.3. */
export function isPasswordSignIn(request: Request): boolean {
  return signInOf(request)?.by === 'password';
}

/** @throws NotAllowed when the person came in by badge */
export function requirePasswordSignIn(request: Request): void {
  if (isPasswordSignIn(request)) return;
  throw new NotAllowed(
    'session.password-needed',
    'This needs a sign-in with your password. Sign in with it and come back.',
  );
}
