import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import request from 'supertest';
import { addMember, addPractice, testPassword, type TestPractice } from '../support/people.ts';
import { startTestApp, type TestApp } from '../support/app.ts';

interface SessionBody {
  user: { email: string } | null;
  memberships: { role: string; householdId: string | null }[];
  csrfToken: string;
}

describe('Signing in', () => {
  let app: TestApp;
  let practice: TestPractice;

  beforeAll(async () => {
    app = await startTestApp();
    practice = await addPractice();
  });
  afterAll(() => app.close());

  it('tells a stranger nothing but a token', async () => {
    const answer = await request(app.app).get('/api/session');
    expect(answer.status).toBe(200);
    expect((answer.body as SessionBody).user).toBeNull();
    expect((answer.body as SessionBody).memberships).toEqual([]);
    expect((answer.body as SessionBody).csrfToken).toMatch(/.{20,}/);
  });

  it('gives user, memberships and a new token, and renews the id of the session', async () => {
    const agent = request.agent(app.app);
    const before = await agent.get('/api/session');
    const beforeToken = (before.body as SessionBody).csrfToken;
    const answer = await agent
      .post('/api/session')
      .set('X-CSRF-Token', beforeToken)
      .send({ email: practice.emails.client.toUpperCase(), password: testPassword });
    const body = answer.body as SessionBody;
    expect(answer.status).toBe(200);
    expect(body.user?.email).toBe(practice.emails.client);
    expect(body.memberships).toMatchObject([{ role: 'client', householdId: practice.householdId }]);
    expect(body.csrfToken).not.toBe(beforeToken);
    const cookieOf = (response: request.Response) =>
      response.get('Set-Cookie')?.[0]?.split(';')[0] ?? 'none';
    expect(cookieOf(answer)).not.toBe(cookieOf(before));
    expect(answer.get('Set-Cookie')?.[0]).toMatch(/HttpOnly; SameSite=Lax/);
  });

  it('refuses a wrong password and an unknown address with the same words', async () => {
    const visitor = await app.visit();
    const wrong = await visitor.post('/api/session', {
      email: practice.emails.owner,
      password: 'no',
    });
    const unknown = await visitor.post('/api/session', { email: 'x@y.example', password: 'no' });
    expect([wrong.status, unknown.status]).toEqual([401, 401]);
    expect(wrong.text).toBe(unknown.text);
    expect(wrong.type).toBe('application/problem+json');
  });

  it('refuses every change without the token of the session, sign-in included', async () => {
    const answer = await request(app.app)
      .post('/api/session')
      .send({ email: practice.emails.owner, password: testPassword });
    expect(answer.status).toBe(403);
    const owner = await app.signIn(practice.emails.owner, testPassword);
    const change = await owner.agent.post('/api/households').send({ name: 'X', country: 'GB' });
    expect(change.status).toBe(403);
  });

  it('names each field that does not fit', async () => {
    const visitor = await app.visit();
    const answer = await visitor.post('/api/session', { email: '' });
    expect(answer.status).toBe(422);
    expect(
      (answer.body as { fields: { field: string }[] }).fields.map((f) => f.field).sort(),
    ).toEqual(['email', 'password']);
  });

  it('ends with signing out', async () => {
    const owner = await app.signIn(practice.emails.owner, testPassword);
    expect((await owner.get('/api/households')).status).toBe(200);
    expect((await owner.delete('/api/session')).status).toBe(204);
    expect((await owner.get('/api/households')).status).toBe(401);
  });

  it('counts memberships only between their first and last day', async () => {
    await addMember({
      role: 'client',
      email: 'past@first.example',
      practiceId: practice.practiceId,
      householdId: practice.householdId,
      standing: 'helper',
      endsOn: '2026-11-06',
      rights: { see: 'all', decide: 'all', approve: 'all', export: 'all' },
    });
    const past = await app.signIn('past@first.example', testPassword);
    const session = (await past.get('/api/session')).body as SessionBody;
    expect(session.memberships).toEqual([]);
    expect((await past.get(`/api/households/${practice.householdId}`)).status).toBe(404);
  });

  it('stops guessing after ten wrong passwords for one address, and only for that address', async () => {
    const visitor = await app.visit();
    const statuses: number[] = [];
    for (let attempt = 0; attempt < 11; attempt += 1) {
      const answer = await visitor.post('/api/session', {
        email: practice.emails.adviser,
        password: 'no',
      });
      statuses.push(answer.status);
    }
    expect(statuses.slice(0, 10).every((status) => status === 401)).toBe(true);
    expect(statuses[10]).toBe(429);
    const other = await visitor.post('/api/session', {
      email: practice.emails.assistant,
      password: testPassword,
    });
    expect(other.status).toBe(200);
  });
});
