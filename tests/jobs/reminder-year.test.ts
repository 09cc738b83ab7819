/** A year of reminders with a fast clock: two workers each morning, deaths and a failing mail server between. */
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { Paper } from '../../server/contract/papers.ts';
import { HouseholdModel } from '../../server/db/models/household-model.ts';
import { ReminderModel } from '../../server/db/models/reminder-model.ts';
import { startMailCatcher, type MailCatcher } from '../../server/mail-catcher/catcher.ts';
import { createMailer, type Mailer } from '../../server/mail/transport.ts';
import { resumeMail, sendMail } from '../../server/use-cases/mail/send-mail.ts';
import { sendReminders } from '../../server/use-cases/reminders/send-reminders.ts';
import { startTestApp, type TestApp, type Visitor } from '../support/app.ts';
import { change, enter, sayNoBusiness } from '../support/papers.ts';
import { addMember, addPractice, testPassword, type TestPractice } from '../support/people.ts';

const dayMs = 24 * 60 * 60 * 1000;
const start = Date.parse('2026-11-07T16:00:00Z');
const days = 366;

let app: TestApp;
let mail: MailCatcher;
let mailer: Mailer;
let practice: TestPractice;
let owner: Visitor;
const households: string[] = [];
const papers: Paper[] = [];

beforeAll(async () => {
  mail = await startMailCatcher();
  app = await startTestApp({ now: new Date(start).toISOString() });
  mailer = createMailer({ smtpUrl: mail.smtpUrl, mailFrom: app.deps.config.mailFrom });
  practice = await addPractice();
  const far = await HouseholdModel.create({
    practiceId: practice.practiceId,
    name: 'Household on the other coast',
    country: 'GB',
    timeZone: 'America/Los_Angeles',
  });
  households.push(practice.householdId, far.id);
  const rights = { see: 'all', decide: 'none', approve: 'none', export: 'none' } as const;
  for (const [index, householdId] of [...households, practice.householdId].entries()) {
    await addMember({
      role: 'client',
      email: `reader${index}@year.example`,
      practiceId: practice.practiceId,
      householdId,
      standing: 'joint-owner',
      // One of them is told of two kinds of paper only.
      rights: index === 2 ? { ...rights, see: ['identity', 'insurance'] } : rights,
    });
  }
  owner = await app.signIn(practice.emails.owner, testPassword);
  for (const householdId of households) await addPapers(householdId);
}, 120_000);

afterAll(async () => {
  mailer.close();
  await app.close();
  await mail.close();
});

/** Twelve papers of the three kinds, whose dates lie about the year. */
async function addPapers(householdId: string): Promise<void> {
  await sayNoBusiness(owner, householdId);
  for (let month = 0; month < 12; month += 1) {
    const isoMonth = String(month + 1).padStart(2, '0');
    // November and December of the year before, so that every date falls into the year.
    const back = month < 10 ? 0 : 1;
    const expiry = (classId: string, day: string) =>
      enter(owner, householdId, classId, {
        facts: { dates: { expiry: `${2027 - back}-${isoMonth}-${day}` } },
      });
    const bill = await enter(owner, householdId, 'utility-bill', {
      // Kept for six years.
      facts: { dates: { issued: `${2021 - back}-${isoMonth}-05` } },
    });
    papers.push(
      await keep(await expiry('passport', '20'), 'use'),
      await keep(await expiry('insurance-policy', '11'), 'duty'),
      await keep(bill, 'duty', { answers: { usedForTax: false } }),
    );
  }
}

function keep(paper: Paper, keptBecause: string, more = {}): Promise<Paper> {
  return change(owner, paper, { pile: 'file-here', keptBecause, ...more });
}

/** What a queue hands out, twice over and to two workers at once. */
async function sendQueued(): Promise<void> {
  const ids = app.jobs.splice(0).flatMap(({ name, payload }) => {
    return name === 'send-mail' ? [(payload as { mailId: string }).mailId] : [];
  });
  const deps = { ...app.deps, mailer };
  for (const id of ids) await Promise.all([sendMail(id, deps), sendMail(id, deps)]);
}

async function liveOneDay(day: number): Promise<void> {
  app.clock.set(new Date(start + day * dayMs));
  if (day % 7 === 3) {
    const queue = { ...app.deps.queue, send: () => Promise.reject(new Error('killed')) };
    await sendReminders({ ...app.deps, queue }).catch((error: Error) => {
      expect(error.message).toBe('killed');
    });
  }
  await Promise.all([sendReminders(app.deps), sendReminders(app.deps)]);
  mail.refuseNext(day % 11 === 5 ? 3 : 0);
  await resumeMail(app.deps);
  await sendQueued();
  mail.refuseNext(0);
}

test('says each date to each person once in a year', async () => {
  for (let day = 0; day < days; day += 1) {
    await liveOneDay(day);
    const renewed = papers[day];
    // A passport that is renewed in time has a new date, of which nobody was told.
    if (day === 36 && renewed?.class === 'passport') {
      const now = (await owner.get(`/api/papers/${renewed.id}`)).body as Paper;
      await change(owner, now, { facts: { dates: { expiry: '2027-12-24' } } });
    }
  }
  // Whatever failed on the last days goes out on the next.
  for (let day = days; day < days + 3; day += 1) await liveOneDay(day);

  const lines = mail
    .messages()
    .flatMap(({ to, text }) =>
      [...text.matchAll(/\(paper \d+\)[^]*?\d{4}/g)].map(
        ([line]) => `${to.join()} ${findHousehold(text)} ${line.replace(/\s+/g, ' ')}`,
      ),
    );
  const duplicates = lines.length - new Set(lines).size;
  const messageIds = mail.messages().map(({ headers }) => headers['message-id']);
  const taken = await ReminderModel.count();
  process.stdout.write(
    `reminders: ${messageIds.length} messages in a year, ${lines.length} dates, duplicates ${duplicates}\n`,
  );
  expect(duplicates).toBe(0);
  expect(new Set(messageIds).size).toBe(messageIds.length);
  expect(lines).toHaveLength(taken);
  // Every bill, passport and policy was spoken of; those who see two kinds heard of no bill.
  const told = await ReminderModel.findAll({ attributes: ['paperId'] });
  const toldOf = new Set(told.map(({ paperId }) => paperId));
  const untold = papers.filter(({ id }) => !toldOf.has(id));
  expect(untold.map((paper) => [paper.class, paper.paperOn, paper.keepUntil])).toEqual([]);
  const limited = mail.messages().filter(({ to }) => to.includes('reader2@year.example'));
  expect(limited.length).toBeGreaterThan(0);
  expect(limited.map(({ text }) => text).join()).not.toMatch(/utility bill/i);
}, 240_000);

function findHousehold(text: string): string {
  return /other coast/.test(text) ? 'far' : 'near';
}
