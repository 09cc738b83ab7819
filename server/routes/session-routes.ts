import { Router, type Request, type RequestHandler, type Response } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import type { AppPassport } from '../auth/sign-in.ts';
import { csrfTokenOf, newCsrfToken } from '../auth/csrf.ts';
import { endpoints } from '../contract/endpoints.ts';
import type { Session } from '../contract/sessions.ts';
import { InvalidInputError, SignInNeededError, TooManyError } from '../errors.ts';
import type { Caller } from './caller.ts';
import { mountPublic } from './mount.ts';

const quarterHourMs = 15 * 60 * 1000;

export function sessionRoutes(passport: AppPassport): Router {
  const router = Router();

  // Failures count for an address and e-mail together, so that a stranger elsewhere locks nobody out.
  router.post(
    '/api/session',
    rateLimit({
      windowMs: quarterHourMs,
      limit: 10,
      skipSuccessfulRequests: true,
      standardHeaders: 'draft-8',
      legacyHeaders: false,
      keyGenerator: (request) => `${ipKeyGenerator(request.ip ?? '')} ${emailOf(request)}`,
      handler: () => {
        throw new TooManyError(
          'Too many attempts with this e-mail address. Wait a quarter of an hour, then try again.',
        );
      },
    }),
  );

  mountPublic(router, endpoints.getSession, ({ request }) => describeSession(request));

  mountPublic(router, endpoints.signIn, async ({ body, request, response }) => {
    request.body = body;
    const caller = await authenticate(passport, request, response);
    if (!caller) {
      throw new SignInNeededError(
        'This e-mail address and password do not go together. Check both and try again.',
      );
    }
    await openSession(request, caller);
    return describeSession(request);
  });

  mountPublic(router, endpoints.signOut, async ({ request, response }) => {
    await new Promise<void>((resolve, reject) => {
      request.session.destroy((error: unknown) => (error ? reject(asError(error)) : resolve()));
    });
    response.clearCookie('slackwater');
  });

  return router;
}

/** Signs a caller in: the session gets a new id, so that one handed out before is worth nothing. */
export async function openSession(request: Request, caller: Caller): Promise<void> {
  await new Promise<void>((resolve, reject) => {
    request.logIn(caller, (error: unknown) => (error ? reject(asError(error)) : resolve()));
  });
  request.session.csrfToken = newCsrfToken();
  request.session.userAgent = request.get('user-agent')?.slice(0, 300);
  request.session.signedInAt = new Date().toISOString();
  request.caller = caller;
}

export function describeSession(request: Request): Session {
  return {
    user: request.caller?.user ?? null,
    memberships: request.caller?.memberships ?? [],
    csrfToken: csrfTokenOf(request),
  };
}

function authenticate(
  passport: AppPassport,
  request: Request,
  response: Response,
): Promise<Caller | null> {
  return new Promise((resolve, reject) => {
    const done = (error: unknown, caller?: Caller | false | null) =>
      error ? reject(asError(error)) : resolve(caller || null);
    // Passport types its middleware as any.
    const check = passport.authenticate('local', done) as RequestHandler;
    void check(request, response, (error: unknown) =>
      reject(error ? asError(error) : new InvalidInputError([])),
    );
  });
}

function emailOf(request: Request): string {
  const body: unknown = request.body;
  const email = body && typeof body === 'object' && 'email' in body ? body.email : '';
  return typeof email === 'string' ? email.trim().toLowerCase().slice(0, 254) : '';
}

function asError(error: unknown): Error {
  return error instanceof Error ? error : new Error(String(error));
}
