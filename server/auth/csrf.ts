/** A token of the session that every state-changing call must send back. */
import { randomBytes, timingSafeEqual } from 'node:crypto';
import type { Request, RequestHandler } from 'express';
import { ForbiddenError } from '../errors.ts';

const safeMethods = new Set(['GET', 'HEAD', 'OPTIONS']);
/** Calls by POST that store nothing. */
const statelessPaths = new Set(['/api/assessments']);

/** The session's token; made when there is none yet. */
export function csrfTokenOf(request: Request): string {
  request.session.csrfToken ??= newCsrfToken();
  return request.session.csrfToken;
}

export function newCsrfToken(): string {
  return randomBytes(24).toString('base64url');
}

/** Refuses state-changing calls without the session's token in X-CSRF-Token. */
export const requireCsrfToken: RequestHandler = (request, _response, next) => {
  if (safeMethods.has(request.method) || statelessPaths.has(request.baseUrl + request.path))
    return next();
  const expected = request.session.csrfToken;
  const given = request.get('x-csrf-token');
  if (!expected || !given || !isSame(expected, given)) {
    throw new ForbiddenError(
      'The page has been open for too long, or the request did not come from it. Reload the page and try again.',
    );
  }
  next();
};

function isSame(a: string, b: string): boolean {
  const left = Buffer.from(a);
  const right = Buffer.from(b);
  return left.length === right.length && timingSafeEqual(left, right);
}
