import { describe, expect, test } from 'vitest';
import type { ApprovalRequest } from '../../server/mail/approval-request.ts';
import { composeApprovalRequest } from '../../server/mail/approval-request.ts';
import { composeApprovedForYou } from '../../server/mail/approved-for-you.ts';
import { generalGuidance } from '../../server/mail/letter.ts';
import type { DigestItem } from '../../server/mail/reminder-digest.ts';
import { composeReminderDigest } from '../../server/mail/reminder-digest.ts';

const passport: DigestItem = {
  kind: 'expiry',
  about: '2027-10-01',
  paperNumber: 13,
  class: 'passport',
  boxCode: 'B-03',
  place: null,
};
const statement: DigestItem = {
  kind: 'keep-until',
  about: '2027-01-31',
  paperNumber: 12,
  class: 'bank-statement',
  boxCode: 'B-03',
  place: 'Desk, left drawer',
};
const marlow = {
  householdName: 'Marlow household',
  practiceName: 'Quiet Drawer Organising',
  url: 'https://slackwater.example/households/h1/reminders',
};
const request: ApprovalRequest = {
  personName: 'Ada Marlow',
  householdName: 'Marlow household',
  practiceName: 'Quiet Drawer Organising',
  listNumber: 7,
  papers: 12,
  sheets: 40,
  url: 'https://slackwater.example/shred-lists/s1',
};
const approved = {
  ...request,
  approvedByName: 'Robin Teal',
  version: 3,
  instruction: { how: 'phone', on: '2026-12-01', words: 'Yes, all of them may go.' },
  notBefore: '2026-12-09',
  lapsesOn: '2027-01-31',
};

const letters = {
  digest: composeReminderDigest({
    personName: 'Ada Marlow',
    households: [{ ...marlow, items: [passport, statement] }],
  }),
  request: composeApprovalRequest(request),
  approved: composeApprovedForYou(approved),
};

describe.each(Object.entries(letters))('the message "%s"', (_name, letter) => {
  test('says nothing private in its subject', () => {
    expect(letter.subject).not.toMatch(/passport|bank|statement|marlow|teal|quiet drawer|expire/i);
    expect(letter.subject).not.toMatch(/[\r\n]/);
  });

  test('asks for no password and no money, and links to our own address alone', () => {
    const all = letter.text + letter.html;
    expect(all).not.toMatch(/password|pay|money|card number|bank details/i);
    const links = all.match(/https?:\/\/[^\s"<]+/g) ?? [];
    expect(links.length).toBeGreaterThan(0);
    for (const link of links) expect(link).toMatch(/^https:\/\/slackwater\.example\//);
    expect(letter.html).not.toMatch(/<img|<script|url\(/);
  });

  test('says that it is general guidance and why one gets it, in both forms', () => {
    expect(letter.text.replace(/\s+/g, ' ')).toContain(generalGuidance);
    expect(letter.html).toContain(generalGuidance);
    expect(letter.text).toContain('You get this because');
    expect(letter.html).toContain('You get this because');
  });

  test('keeps plain lines short enough for a mail reader', () => {
    for (const line of letter.text.split('\n')) expect(line.length).toBeLessThanOrEqual(76);
  });
});

describe('the reminder digest', () => {
  test('names kind, number, date and place of each paper, soonest first', () => {
    const text = letters.digest.text.replace(/\s+/g, ' ');
    expect(text).toContain('Passport (paper 13): expires on 1 October 2027');
    expect(text).toContain('Bank statement (paper 12): was to be kept until 31 January 2027');
    expect(text.indexOf('paper 12')).toBeLessThan(text.indexOf('paper 13'));
    expect(text).toContain('Desk, left drawer');
  });

  test('says in the subject how many dates there are, and no more', () => {
    expect(letters.digest.subject).toBe('Slackwater: 2 dates to look at');
    const one = composeReminderDigest({
      personName: 'Ada',
      households: [
        { ...marlow, items: [passport] },
        { ...marlow, items: [] },
      ],
    });
    expect(one.subject).toBe('Slackwater: 1 date to look at');
  });

  test('is one message for several households, each with its own link', () => {
    const { text } = composeReminderDigest({
      personName: 'Ada',
      households: [
        { ...marlow, items: [passport] },
        { ...marlow, householdName: 'Quay house', url: 'https://x.example/2', items: [statement] },
      ],
    });
    expect(text).toContain(marlow.url);
    expect(text).toContain('https://x.example/2');
    expect(text).toContain('Quay house');
  });

  test('lists 25 papers of a household and counts the others', () => {
    const items = Array.from({ length: 30 }, (_, index) => ({ ...statement, paperNumber: index }));
    const { text } = composeReminderDigest({
      personName: 'Ada',
      households: [{ ...marlow, items }],
    });
    expect(text.match(/\(paper \d+\)/g)).toHaveLength(25);
    expect(text).toContain('And 5 more');
  });

  test('is not written without a date to speak of', () => {
    expect(() =>
      composeReminderDigest({ personName: 'Ada', households: [{ ...marlow, items: [] }] }),
    ).toThrow(/at least one date/);
  });

  test('shows names as they are and runs nothing that stands in them', () => {
    const { html, text } = composeReminderDigest({
      personName: 'Ada <script>\r\nBcc: all@example.org',
      households: [{ ...marlow, householdName: 'Marlow & "Søn" <b>', items: [passport] }],
    });
    expect(html).not.toContain('<script>');
    expect(html).toContain('Marlow &amp; &quot;Søn&quot; &lt;b&gt;');
    expect(text).toContain('Dear Ada <script> Bcc: all@example.org,');
  });
});

describe('the messages about a shred list', () => {
  test('ask for an answer and promise that nothing goes without it', () => {
    const text = letters.request.text.replace(/\s+/g, ' ');
    expect(text).toContain('shred list 7');
    expect(text).toContain('12 papers, 40 sheets');
    expect(text).toContain('Nothing is destroyed unless you approve');
    expect(letters.request.html).toContain(`href="${request.url}"`);
  });

  test('tell the client who approved for them, on which words, and how to object in time', () => {
    const text = letters.approved.text.replace(/\s+/g, ' ');
    expect(text).toContain(
      'Robin Teal of Quiet Drawer Organising approved shred list 7, version 3',
    );
    expect(text).toContain('by phone on 1 December 2026');
    expect(text).toContain('> Yes, all of them may go.');
    expect(text).toContain('If this is not what you said');
    expect(text).toContain('before 9 December 2026');
    expect(text).toContain('lapses after 31 January 2027');
  });
});
