import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { MailModel } from '../../server/db/models/mail-model.ts';
import { addMember, addPractice, testPassword, type TestPractice } from '../support/people.ts';
import { startTestApp, type TestApp } from '../support/app.ts';

const nextPassword = 'another long password';

/** The newest message to an address, and the token in its link. */
async function newestMailTo(address: string) {
  const mail = await MailModel.findOne({ where: { address }, order: [['createdAt', 'DESC']] });
  return { subject: mail?.subject ?? '', token: /#([\w-]+)/.exec(mail?.text ?? '')?.[1] ?? '' };
}

describe('Accounts', () => {
  let app: TestApp;
  let practice: TestPractice;

  beforeAll(async () => {
    app = await startTestApp();
    practice = await addPractice();
  });
  afterAll(() => app.close());

  it('answers a forgotten password alike whether the address is known or not', async () => {
    const visitor = await app.visit();
    const known = await visitor.post('/api/password-reset-requests', {
      email: practice.emails.client,
    });
    const unknown = await visitor.post('/api/password-reset-requests', {
      email: 'no@first.example',
    });
    expect([known.status, known.text]).toEqual([unknown.status, unknown.text]);
    expect(known.status).toBe(202);
    expect(await MailModel.count({ where: { address: 'no@first.example' } })).toBe(0);
  });

  it('sets a new password once with the link, signs other devices out, and says so by mail', async () => {
    const device = await app.signIn(practice.emails.client, testPassword);
    const visitor = await app.visit();
    await visitor.post('/api/password-reset-requests', { email: practice.emails.client });
    const { token, subject } = await newestMailTo(practice.emails.client);
    expect(subject).toBe('Slackwater: choose a new password');
    const reset = await visitor.post('/api/password-resets', { token, password: nextPassword });
    expect(reset.status).toBe(204);
    expect((await device.get('/api/households')).status).toBe(401);
    const again = await visitor.post('/api/password-resets', { token, password: testPassword });
    expect(again.status).toBe(409);
    await app.signIn(practice.emails.client, nextPassword);
    expect((await newestMailTo(practice.emails.client)).subject).toMatch(/was changed/);
  });

  it('lets a link run out after two hours', async () => {
    const visitor = await app.visit();
    await visitor.post('/api/password-reset-requests', { email: practice.emails.adviser });
    const { token } = await newestMailTo(practice.emails.adviser);
    app.clock.advance(2 * 60 * 60 * 1000);
    const late = await visitor.post('/api/password-resets', { token, password: nextPassword });
    expect(late.status).toBe(409);
  });

  it('writes to one address at most three times an hour', async () => {
    const visitor = await app.visit();
    const address = practice.emails.assistant;
    for (let i = 0; i < 5; i += 1)
      await visitor.post('/api/password-reset-requests', { email: address });
    expect(await MailModel.count({ where: { address } })).toBe(3);
  });

  it('changes an address only when both addresses have confirmed', async () => {
    await addMember({
      role: 'client',
      email: 'old@first.example',
      practiceId: practice.practiceId,
      householdId: practice.householdId,
      standing: 'self',
    });
    const person = await app.signIn('old@first.example', testPassword);
    const refused = await person.post('/api/account/email', {
      email: 'new@first.example',
      password: 'no',
    });
    expect(refused.status).toBe(422);
    await person.post('/api/account/email', { email: 'new@first.example', password: testPassword });
    const first = await newestMailTo('new@first.example');
    const second = await newestMailTo('old@first.example');
    const one = await person.post('/api/email-confirmations', { token: first.token });
    expect(one.body).toEqual({ isChanged: false });
    const two = await person.post('/api/email-confirmations', { token: second.token });
    expect(two.body).toEqual({ isChanged: true });
    await app.signIn('new@first.example', testPassword);
  });

  it('lists devices and signs the others out', async () => {
    const here = await app.signIn(practice.emails.owner, testPassword);
    const there = await app.signIn(practice.emails.owner, testPassword);
    const list = (await here.get('/api/account/devices')).body as { items: { isThis: boolean }[] };
    expect(list.items).toHaveLength(2);
    expect(list.items.filter((device) => device.isThis)).toHaveLength(1);
    expect((await here.delete('/api/account/devices')).status).toBe(204);
    expect((await there.get('/api/households')).status).toBe(401);
    expect((await here.get('/api/households')).status).toBe(200);
  });

  it('invites an adviser who then sees the household, with the groups that were shared', async () => {
    const owner = await app.signIn(practice.emails.owner, testPassword);
    const url = `/api/households/${practice.householdId}/invitations`;
    const missing = await owner.post(url, {
      role: 'adviser',
      email: 'acc@firm.example',
      name: 'Acc',
    });
    expect(missing.status).toBe(422);
    const made = await owner.post(url, {
      role: 'adviser',
      email: 'acc@firm.example',
      name: 'Acc Ountant',
      sharedGroups: ['tax'],
    });
    expect(made.status).toBe(201);
    const { token, subject } = await newestMailTo('acc@firm.example');
    expect(subject).not.toMatch(/Household|Practice/);
    const visitor = await app.visit();
    const opened = await visitor.post('/api/invitation-openings', { token });
    expect(opened.body).toMatchObject({ role: 'adviser', hasAccount: false });
    const accepted = await visitor.post('/api/invitation-acceptances', {
      token,
      name: 'Acc Ountant',
      password: nextPassword,
    });
    expect(accepted.body).toMatchObject({
      user: { email: 'acc@firm.example' },
      memberships: [{ role: 'adviser', sharedGroups: ['tax'] }],
    });
    expect((await visitor.get(`/api/households/${practice.householdId}`)).status).toBe(200);
    const again = await visitor.post('/api/invitation-openings', { token });
    expect([403, 409]).toContain(again.status);
  });

  it('ends a membership when the owner says so', async () => {
    const owner = await app.signIn(practice.emails.owner, testPassword);
    const assistant = await app.signIn(practice.emails.assistant, testPassword);
    const members = (await owner.get(`/api/households/${practice.householdId}/members`)).body as {
      items: { membership: { id: string; role: string } }[];
    };
    const id = members.items.find((m) => m.membership.role === 'assistant')?.membership.id ?? '';
    const ended = await owner.patch(`/api/households/${practice.householdId}/members/${id}`, {
      endsOn: '2026-11-06',
    });
    expect(ended.status).toBe(200);
    expect((await assistant.get(`/api/households/${practice.householdId}`)).status).toBe(404);
    const byAssistant = await assistant.post(
      `/api/households/${practice.householdId}/invitations`,
      {},
    );
    expect(byAssistant.status).toBe(404);
  });
});
