/**
 * Mounts one call of the contract: parse, authorise, call, present. Nothing is reachable that is not
 * in the endpoint table, and nothing in the table is reachable without its access check.
 */
import type { Request, Response, Router } from 'express';
import type { z } from 'zod';
import type { BodyOf, Endpoint, ParamsOf, QueryOf, ResponseOf } from '../contract/endpoint.ts';
import type { Membership, Permission } from '../contract/permissions.ts';
import type { FieldProblem } from '../contract/problems.ts';
import { InvalidInputError, NotFoundError, VersionNeededError } from '../errors.ts';
import { locateHousehold } from '../use-cases/locate-household.ts';
import {
  type Access,
  type Caller,
  requireAccess,
  requireCaller,
  requirePracticeAccess,
} from './caller.ts';

/** What a handler gets: the parsed request and how far the caller may reach. */
export interface Call<T extends Endpoint> {
  params: ParamsOf<T>;
  query: QueryOf<T>;
  body: BodyOf<T>;
  /** The version from If-Match; 0 for calls that need none. */
  version: number;
  request: Request;
  response: Response;
}
export type HouseholdCall<T extends Endpoint> = Call<T> & { access: Access };
export type SignedInCall<T extends Endpoint> = Call<T> & { caller: Caller };
export type PracticeCall<T extends Endpoint> = SignedInCall<T> & { membership: Membership };

type Answer<T extends Endpoint> = T['response'] extends z.ZodType
  ? ResponseOf<T> | Promise<ResponseOf<T>>
  : void | Promise<void>;

/** A call that belongs to one household, found from the id in its path. */
export function mountForHousehold<const T extends Endpoint & { access: Permission }>(
  router: Router,
  endpoint: T,
  handle: (call: HouseholdCall<T>) => Answer<T>,
): void {
  register(router, endpoint, async (call) => {
    const caller = requireCaller(call.request);
    const id = (call.params as { id?: string } | undefined)?.id ?? '';
    const household = await locateHousehold(kindOfPath(endpoint.path), id);
    if (!household) throw new NotFoundError();
    // Access first: spreading the call parses body and version, whose faults only members may learn of.
    const access = requireAccess(caller, household, endpoint.access);
    return handle({ ...call, access });
  });
}

/** A call that belongs to the practice itself. */
export function mountForPractice<const T extends Endpoint & { access: Permission }>(
  router: Router,
  endpoint: T,
  handle: (call: PracticeCall<T>) => Answer<T>,
): void {
  register(router, endpoint, (call) => {
    const caller = requireCaller(call.request);
    const membership = requirePracticeAccess(caller, endpoint.access);
    return handle({ ...call, caller, membership });
  });
}

/** A call for anybody who is signed in. */
export function mountForSignedIn<const T extends Endpoint & { access: 'signed-in' }>(
  router: Router,
  endpoint: T,
  handle: (call: SignedInCall<T>) => Answer<T>,
): void {
  register(router, endpoint, (call) => handle({ ...call, caller: requireCaller(call.request) }));
}

/** A call that needs no sign-in. */
export function mountPublic<const T extends Endpoint & { access: 'public' }>(
  router: Router,
  endpoint: T,
  handle: (call: Call<T>) => Answer<T>,
): void {
  register(router, endpoint, handle);
}

function register<T extends Endpoint>(
  router: Router,
  endpoint: T,
  handle: (call: Call<T>) => unknown,
): void {
  router[endpoint.method](endpoint.path, async (request: Request, response: Response) => {
    // Who may not know of a thing is told so before the form of the request is looked at.
    if (endpoint.access !== 'public') requireCaller(request);
    const params = parsePart(endpoint.params, request.params, true);
    const query = parsePart(endpoint.query, request.query, false);
    const call = {
      params,
      query,
      get body() {
        return parsePart(endpoint.body, request.body ?? {}, false);
      },
      get version() {
        return endpoint.ifMatch ? parseVersion(request) : 0;
      },
      request,
      response,
    } as Call<T>;
    const answer = await handle(call);
    if (response.headersSent) return;
    if (endpoint.response) response.status(endpoint.status).json(answer);
    else if (!endpoint.mediaType) response.status(endpoint.status).end();
  });
}

/** Parses one part of a request; a path that does not fit is simply not there. */
function parsePart(schema: z.ZodType | undefined, value: unknown, isPath: boolean): unknown {
  if (!schema) return undefined;
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  if (isPath) throw new NotFoundError();
  throw new InvalidInputError(parsed.error.issues.flatMap(describeIssue));
}

function describeIssue(issue: z.core.$ZodIssue): FieldProblem[] {
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({
      field: [...issue.path, key].join('.'),
      message: `The name "${key}" is not known here. Leave it out or correct it.`,
    }));
  }
  const field = issue.path.join('.');
  const sentence = /[.!?]$/.test(issue.message) ? issue.message : `${issue.message}.`;
  return [{ field, message: field ? `${field}: ${sentence}` : sentence }];
}

function parseVersion(request: Request): number {
  const header = request.get('if-match');
  const match = /^\s*(?:W\/)?"?(\d{1,9})"?\s*$/.exec(header ?? '');
  if (!match) throw new VersionNeededError();
  return Number(match[1]);
}

const kinds: Record<string, Parameters<typeof locateHousehold>[0]> = {
  households: 'household',
  boxes: 'box',
  scans: 'scan',
  pages: 'page',
  papers: 'paper',
  holds: 'hold',
  subjects: 'subject',
  'shred-lists': 'shred-list',
};

function kindOfPath(path: string): Parameters<typeof locateHousehold>[0] {
  const kind = kinds[path.split('/')[2] ?? ''];
  if (!kind) throw new RangeError(`No household can be found from ${path}.`);
  return kind;
}
