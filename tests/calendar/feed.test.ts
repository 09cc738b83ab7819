import ICAL from 'ical.js';
import { describe, expect, test } from 'vitest';
import type { CalendarFeedInput } from '../../server/calendar/feed.ts';
import { writeCalendarFeed } from '../../server/calendar/feed.ts';
import { makePaper, passport, statement } from '../reminders/dated-paper.ts';

function writeFeed(changes: Partial<CalendarFeedInput> = {}): string {
  return writeCalendarFeed({
    papers: [statement, passport],
    household: { leadDays: {} },
    stampedAt: new Date('2026-12-01T06:00:00Z'),
    paperUrl: (paperId) => `https://slackwater.example/households/h/review/${paperId}`,
    ...changes,
  });
}

function parseEvents(feed: string) {
  const calendar = new ICAL.Component(ICAL.parse(feed));
  return calendar.getAllSubcomponents('vevent').map((component) => {
    const event = new ICAL.Event(component);
    const trigger = component.getFirstSubcomponent('valarm')?.getFirstProperty('trigger');
    return {
      uid: event.uid,
      summary: event.summary,
      start: event.startDate.toString(),
      end: event.endDate.toString(),
      isAllDay: event.startDate.isDate,
      stamp: String(component.getFirstPropertyValue('dtstamp')),
      alarmSeconds: (trigger?.getFirstValue() as ICAL.Duration).toSeconds(),
      alarmRelated: trigger?.getFirstParameter('related') ?? 'START',
      component,
    };
  });
}

const hours = 3600;
const days = 24 * hours;

describe('the calendar feed', () => {
  test('puts the end of keeping on the day after, the whole day', () => {
    const [first] = parseEvents(writeFeed());
    expect(first).toMatchObject({
      summary: 'Paper 12: look at it',
      start: '2027-02-01',
      end: '2027-02-02',
      isAllDay: true,
      stamp: '2026-12-01T06:00:00Z',
    });
  });

  test('puts an expiry on its own day, with the alarm at nine as many days before as the notice', () => {
    const event = parseEvents(writeFeed())[1];
    expect(event).toMatchObject({ start: '2027-10-01', end: '2027-10-02', isAllDay: true });
    expect(event?.alarmSeconds).toBe(-270 * days + 9 * hours);
    const sooner = parseEvents(writeFeed({ household: { leadDays: { passport: 10 } } }))[1];
    expect(sooner?.alarmSeconds).toBe(-10 * days + 9 * hours);
  });

  test('rings for the end of keeping at nine on the day itself', () => {
    const [first] = parseEvents(writeFeed());
    expect(first?.alarmSeconds).toBe(9 * hours);
    expect(first?.alarmRelated).toBe('START');
  });

  test('gives nothing away: no kind of paper, issuer or name', () => {
    const feed = writeFeed().replace(/\r\n /g, '');
    expect(feed).not.toMatch(/passport|bank|statement|expire|shred/i);
    for (const { summary } of parseEvents(writeFeed())) {
      expect(summary).toMatch(/^Paper \d+: look at it$/);
    }
  });

  test('keeps the id of an event when its date moves', () => {
    const before = parseEvents(writeFeed({ papers: [statement] }));
    const moved = { ...statement, keepUntil: '2028-01-31', shredFrom: '2028-02-01' };
    const after = parseEvents(writeFeed({ papers: [moved] }));
    expect(after.map(({ uid }) => uid)).toEqual(before.map(({ uid }) => uid));
    expect(after[0]?.start).toBe('2028-02-01');
  });

  test('gives every event of a paper an id of its own', () => {
    const both = makePaper({
      ...statement,
      class: 'insurance-policy',
      expiresOn: '2027-01-31',
    });
    const uids = parseEvents(writeFeed({ papers: [both, passport] })).map(({ uid }) => uid);
    expect(new Set(uids).size).toBe(3);
  });

  test('leaves out papers that the reader of the feed may not see, and those without a date', () => {
    const papers = [statement, passport, makePaper({ number: 14 })];
    const events = parseEvents(writeFeed({ papers, reach: ['banking'] }));
    expect(events.map(({ summary }) => summary)).toEqual(['Paper 12: look at it']);
  });

  // RFC 5545 section 3.1 (lines), 3.6.1 (properties stand before the alarm); RFC 7986 section 5.7.
  test('keeps to the form: CRLF, lines of 75 octets, refresh once a day', () => {
    const feed = writeFeed({
      paperUrl: (paperId) => `https://slackwater.example/${'ü'.repeat(90)}/${paperId}`,
    });
    expect(feed.replace(/\r\n/g, '')).not.toMatch(/[\r\n]/);
    for (const line of feed.split('\r\n')) {
      expect(Buffer.byteLength(line, 'utf8')).toBeLessThanOrEqual(75);
    }
    expect(feed).toContain('REFRESH-INTERVAL;VALUE=DURATION:P1D\r\n');
    expect(feed).toMatch(/END:VALARM\r\nEND:VEVENT/);
    const link = parseEvents(feed)[0]?.component.getFirstPropertyValue('description');
    expect(String(link)).toContain(`${'ü'.repeat(90)}/${statement.id}`);
  });

  test('is a valid calendar when there is nothing to say', () => {
    expect(parseEvents(writeFeed({ papers: [] }))).toEqual([]);
  });
});
