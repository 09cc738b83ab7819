/**
 * Who may what: every call of the OpenAPI document by every role, standing and set of rights, towards their
 * own household, another of the practice, another practice, with a membership that ended or has not begun,
 * and signed out. What one may not know of is 404, what one may know of and not do is 403.
 */
import type { Response } from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { type Reach, reaches } from '../../server/contract/permissions.ts';
import { HouseholdModel } from '../../server/db/models/household-model.ts';
import { MembershipModel } from '../../server/db/models/membership-model.ts';
import { createOpenApiDocument } from '../../server/routes/openapi.ts';
import { startTestApp, type TestApp, type Visitor } from '../support/app.ts';
import {
  addCallers,
  type CallerKind,
  callerKinds,
  paperGroup,
} from '../support/authorisation/callers.ts';
import { type Operation, operations } from '../support/authorisation/operations.ts';
import { makeWorld, type World } from '../support/authorisation/world.ts';
import { sayNoBusiness } from '../support/papers.ts';
import { addPractice, testPassword } from '../support/people.ts';

type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';
interface Route {
  name: string;
  method: Method;
  path: string;
}
/** Let in, whatever comes of it; or refused with this status. */
type Verdict = 'in' | 401 | 403 | 404;

let app: TestApp;
let visitors: Visitor[];
let own: World;
let sameCompany: World;
let elsewhere: World;
let cells = 0;

const routes = listRoutes();

beforeAll(async () => {
  app = await startTestApp();
  const first = await addPractice('first');
  const second = await addPractice('second');
  const sibling = await HouseholdModel.create({
    practiceId: first.practiceId,
    name: 'Sibling',
    country: 'GB',
    timeZone: 'Europe/London',
  });
  const make = async (email: string, place: { practiceId: string; householdId: string }) => {
    const owner = await app.signIn(email, testPassword);
    await sayNoBusiness(owner, place.householdId);
    return makeWorld(app, owner, place);
  };
  own = await make(first.emails.owner, first);
  sameCompany = await make(first.emails.owner, { ...first, householdId: sibling.id });
  elsewhere = await make(second.emails.owner, second);
  const emails = await addCallers(first);
  visitors = await Promise.all(emails.map((email) => app.signIn(email, testPassword)));
}, 120_000);

afterAll(async () => {
  process.stdout.write(`authorisation: ${cells} cells, ${routes.length} calls\n`);
  await app.close();
});

function listRoutes(): Route[] {
  const { paths } = createOpenApiDocument() as {
    paths: Record<string, Record<Method, { operationId: string }>>;
  };
  return Object.entries(paths).flatMap(([path, methods]) =>
    Object.entries(methods).map(([method, { operationId }]) => ({
      name: operationId,
      method: method as Method,
      path,
    })),
  );
}

/**
 * Sends a call. Where it should be refused, it is one that would succeed; where it should be let in, one
 * that stops right behind the door: an outdated version or a body that does not fit.
 */
async function knock(
  route: Route,
  operation: Operation,
  visitor: Visitor,
  world: World,
  { isReal, withToken = true }: { isReal: boolean; withToken?: boolean },
): Promise<Response> {
  const params = operation.params?.(world) ?? {};
  const path = route.path.replace(/\{(\w+)\}/g, (_all, name: string) => params[name] ?? 'missing');
  const request = visitor.agent[route.method](path + (operation.query ?? ''));
  if (withToken) void request.set('X-CSRF-Token', visitor.csrfToken);
  if (operation.version) {
    void request.set('If-Match', `"${isReal ? operation.version(world) : 999_999}"`);
  }
  if (operation.file) return request.attach('files', operation.file, 'scan.pdf');
  if (route.method === 'get') return request;
  const body = operation.body?.(world) ?? {};
  const stops = operation.version || !operation.body ? body : { unfit: true };
  return request.send(isReal ? body : stops);
}

/** 401, 403 and 404 count as refusals; of what was let in, only a fault of the server is not right. */
function judge(response: Response): 'in' | number {
  const { status } = response;
  if (status === 401 || status === 403 || status === 404) return status;
  return status < 500 ? 'in' : status;
}

function expectOwn(operation: Operation, caller: CallerKind): Verdict {
  const rule = operation.for;
  if (rule === 'public' || rule === 'signed-in') return 'in';
  if (rule === 'practice') return caller.role === 'owner' ? 'in' : 403;
  if (caller.role === 'owner' || caller.role === 'assistant') return rule[caller.role] ? 'in' : 403;
  const reach: Reach =
    caller.role === 'client'
      ? (rule.client && caller.rights?.[rule.client]) || 'none'
      : (rule.adviser && caller.sharedGroups) || 'none';
  if (!reaches(reach)) return 403;
  if (!operation.about) return 'in';
  const sees = caller.rights?.see ?? caller.sharedGroups ?? 'none';
  if (operation.about !== 'kind' && !reaches(sees, paperGroup)) return 404;
  if (operation.about === 'scan') return 'in';
  return reaches(reach, paperGroup) && reaches(sees, paperGroup) ? 'in' : 403;
}

function expectAway(operation: Operation, isOwnerThere: boolean, isMember: boolean): Verdict {
  const rule = operation.for;
  if (rule === 'public' || rule === 'signed-in') return 'in';
  if (rule === 'practice') return isMember ? 'in' : 403;
  return isOwnerThere ? 'in' : 404;
}

/** Asks every caller for every call; answers the cells that came out otherwise than they should. */
async function walk(
  place: string,
  world: World,
  expectFor: (operation: Operation, caller: CallerKind) => Verdict,
): Promise<string[]> {
  const wrong: string[] = [];
  await Promise.all(
    callerKinds.map(async (caller, index) => {
      const visitor = visitors[index];
      if (!visitor) throw new Error('Nobody is signed in.');
      for (const route of routes) {
        const operation = requireOperation(route);
        const expected = expectFor(operation, caller);
        // Signing out would end the walk of this caller; a visitor of its own does it.
        const knocker = route.name === 'signOut' ? await app.visit() : visitor;
        const isReal = expected !== 'in';
        const actual = judge(await knock(route, operation, knocker, world, { isReal }));
        cells += 1;
        if (!isRight(operation, actual, expected)) {
          wrong.push(`${route.name} by ${caller.name}, ${place}: ${actual}, not ${expected}`);
        }
      }
    }),
  );
  return wrong;
}

/** A call for everybody may still find nothing behind a token that is not right. */
function isRight(operation: Operation, actual: 'in' | number, expected: Verdict): boolean {
  return actual === expected || (operation.for === 'public' && [401, 404].includes(Number(actual)));
}

function requireOperation({ name }: Route): Operation {
  const operation = operations[name];
  if (!operation) throw new Error(`Nobody said who may call "${name}".`);
  return operation;
}

describe('every call by everybody', () => {
  test('is covered: add a new call to tests/support/authorisation/operations.ts', () => {
    const named = routes.map(({ name }) => name).sort();
    expect(Object.keys(operations).sort()).toEqual(named);
  });

  test('in their own household', async () => {
    expect(await walk('own household', own, expectOwn)).toEqual([]);
  }, 120_000);

  test('towards another household of the practice', async () => {
    const expectThere = (operation: Operation, { role }: CallerKind) =>
      expectAway(operation, role === 'owner', role === 'owner');
    expect(await walk('other household', sameCompany, expectThere)).toEqual([]);
  }, 120_000);

  test('towards another practice', async () => {
    const expectThere = (operation: Operation, { role }: CallerKind) =>
      expectAway(operation, false, role === 'owner');
    expect(await walk('other practice', elsewhere, expectThere)).toEqual([]);
  }, 120_000);

  test.each([
    ['ended', { endsOn: '2026-11-06' }, { endsOn: null }],
    ['not begun', { startsOn: '2026-11-08' }, { startsOn: '2020-01-01' }],
  ])(
    'with a membership that has %s',
    async (place, change, back) => {
      await MembershipModel.update(change, { where: {} });
      const wrong = await walk(place, own, (operation) => expectAway(operation, false, false));
      await MembershipModel.update(back, { where: {} });
      expect(wrong).toEqual([]);
    },
    120_000,
  );

  test('signed out', async () => {
    const nobody = await app.visit();
    const wrong: string[] = [];
    for (const route of routes) {
      const operation = requireOperation(route);
      const expected = operation.for === 'public' ? 'in' : 401;
      const knocker = route.name === 'signOut' ? await app.visit() : nobody;
      const actual = judge(await knock(route, operation, knocker, own, { isReal: true }));
      cells += 1;
      if (!isRight(operation, actual, expected)) {
        wrong.push(`${route.name} by nobody: ${actual}, not ${expected}`);
      }
    }
    expect(wrong).toEqual([]);
  });

  test('without the token that proves where a change comes from', async () => {
    const storesNothing = ['assessCase'];
    const wrong: string[] = [];
    for (const [index, caller] of callerKinds.entries()) {
      const visitor = visitors[index];
      if (!visitor) throw new Error('Nobody is signed in.');
      for (const route of routes.filter(({ method }) => method !== 'get')) {
        if (storesNothing.includes(route.name)) continue;
        const way = { isReal: true, withToken: false };
        const answer = await knock(route, requireOperation(route), visitor, own, way);
        cells += 1;
        const isRefused =
          answer.status === 403 && (answer.body as { detail: string }).detail.includes('Reload');
        if (!isRefused) wrong.push(`${route.name} by ${caller.name}: ${answer.status}`);
      }
    }
    expect(wrong).toEqual([]);
  }, 120_000);
});
