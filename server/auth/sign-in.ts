/** Sign-in by e-mail and password, and the session that remembers it. */
import connectPgSimple from 'connect-pg-simple';
import type { RequestHandler } from 'express';
import session from 'express-session';
import { Passport } from 'passport';
import { Strategy as LocalStrategy } from 'passport-local';
import pg from 'pg';
import type { Clock } from '../clock.ts';
import type { Config } from '../config.ts';
import { findUser, findUserByEmail, listMemberships } from '../db/repositories/user-repository.ts';
import type { Logger } from '../log.ts';
import type { Caller } from '../routes/caller.ts';
import { checkPassword, demoPassword } from './passwords.ts';

declare module 'express-session' {
  interface SessionData {
    csrfToken: string;
    /** Told to the user in the list of devices. */
    userAgent?: string | undefined;
    signedInAt?: string;
  }
}

/** Fourteen days without a request end a session. */
const sessionMs = 14 * 24 * 60 * 60 * 1000;

export interface SessionStore {
  handler: RequestHandler;
  close(): Promise<void>;
}

/** Sessions in PostgreSQL, in a table that the migrations make. */
export function createSessions(config: Config, log: Logger): SessionStore {
  const pool = new pg.Pool({ connectionString: config.databaseUrl, max: 4 });
  // A connection that PostgreSQL drops while idle would otherwise end the process.
  pool.on('error', (error) => log.warn({ code: error.name }, 'session connection lost'));
  const Store = connectPgSimple(session);
  const store = new Store({
    pool,
    tableName: 'sessions',
    pruneSessionInterval: config.environment === 'test' ? false : 15 * 60,
  });
  return {
    handler: session({
      store,
      name: 'slackwater',
      secret: config.sessionSecret,
      resave: false,
      saveUninitialized: false,
      rolling: true,
      proxy: config.trustProxy !== false,
      cookie: {
        httpOnly: true,
        sameSite: 'lax',
        secure: config.hasSecureCookies,
        maxAge: sessionMs,
      },
    }),
    async close() {
      store.close();
      await pool.end();
    },
  };
}

/** Loads who a user is and what they belong to today; null when the user is gone. */
export async function loadCaller(userId: string, clock: Clock): Promise<Caller | null> {
  const user = await findUser(userId);
  if (!user) return null;
  return {
    user: { id: user.id, email: user.email, name: user.name },
    memberships: await listMemberships(user.id, clock.todayIn('UTC')),
  };
}

/** A passport of this application's own, with the local strategy. */
export function createPassport(config: Config, clock: Clock) {
  const passport = new Passport();
  passport.use(
    new LocalStrategy({ usernameField: 'email' }, (email, password, done) => {
      signIn(email, password).then(
        (caller) => done(null, caller ?? false),
        (error: unknown) => done(error),
      );
    }),
  );
  passport.serializeUser((user, done) => done(null, user.user.id));
  passport.deserializeUser((id: unknown, done) => {
    loadCaller(String(id), clock).then(
      (caller) => done(null, caller ?? false),
      (error: unknown) => done(error),
    );
  });
  return passport;

  async function signIn(email: string, password: string): Promise<Caller | null> {
    const user = await findUserByEmail(email);
    const fits = await checkPassword(user?.passwordHash ?? null, password);
    if (!user || !fits || (config.isProduction && password === demoPassword)) return null;
    return loadCaller(user.id, clock);
  }
}

export type AppPassport = ReturnType<typeof createPassport>;

declare global {
  // The name is given by passport's types.
  namespace Express {
    interface User extends Caller {
      readonly signedIn?: true;
    }
  }
}
