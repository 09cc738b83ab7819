/** The calendar feed of a household: text after RFC 5545, with the refresh interval of RFC 7986. */
import ical, { ICalAlarmRelatesTo, ICalAlarmType, ICalEventTransparency } from 'ical-generator';
import type { IsoDate } from '../contract/dates.ts';
import { requireClass } from '../contract/document-classes.ts';
import type { Reach } from '../contract/permissions.ts';
import { reaches } from '../contract/permissions.ts';
import type { Reminder } from '../contract/reminders.ts';
import { addDays } from '../reminders/days.ts';
import type { DatedPaper } from '../reminders/paper-dates.ts';
import { findLeadDays, listPaperDates } from '../reminders/paper-dates.ts';

export interface CalendarFeedInput {
  papers: readonly DatedPaper[];
  household: { leadDays: Record<string, number> };
  /** Whose feed it is: the class groups that person may see. */
  reach?: Reach;
  /** DTSTAMP of every event: when the feed was written. */
  stampedAt: Date;
  /** Address of the page of a paper, opened after signing in. */
  paperUrl: (paperId: string) => string;
}

/** How often a calendar should ask again, in seconds: once a day. */
const refreshSeconds = 24 * 60 * 60;
/** Alarms ring at nine in the morning, in whatever time zone the reader's calendar has. */
const alarmSeconds = 9 * 60 * 60;
const daySeconds = 24 * 60 * 60;

interface FeedEvent {
  paper: DatedPaper;
  kind: Reminder['kind'];
  on: IsoDate;
  noticeDays: number;
}

/**
 * Writes the feed. An expiry stands on its own day with an alarm as many days before as the reminder; the end
 * of keeping stands on the day after, the first on which the paper may go, with an alarm on that day.
 * Titles give nothing away: neither the kind of paper nor an issuer nor a name.
 */
export function writeCalendarFeed(input: CalendarFeedInput): string {
  const calendar = ical({
    name: 'Slackwater: papers',
    description: 'Days on which a paper wants a look. General guidance; local law decides.',
    prodId: { company: 'Slackwater', product: 'Slackwater', language: 'EN' },
    ttl: refreshSeconds,
  });
  for (const event of listEvents(input)) addEvent(calendar, event, input);
  return calendar.toString();
}

/** Stable for a paper and kind: when the date moves, the event moves with it. */
export function calendarUid(kind: Reminder['kind'], paperId: string): string {
  return `${kind}-${paperId}@slackwater`;
}

function listEvents(input: CalendarFeedInput): FeedEvent[] {
  const { papers, household, reach = 'all' } = input;
  return papers
    .filter((paper) => reaches(reach, requireClass(paper.class).group))
    .flatMap((paper) =>
      listPaperDates(paper, household.leadDays).map(({ kind, about }) => ({
        paper,
        kind,
        on: kind === 'expiry' ? about : addDays(about, 1),
        noticeDays: kind === 'expiry' ? findLeadDays(paper.class, household.leadDays) : 0,
      })),
    )
    .sort((a, b) => a.on.localeCompare(b.on) || a.paper.number - b.paper.number);
}

function addEvent(
  calendar: ReturnType<typeof ical>,
  { paper, kind, on, noticeDays }: FeedEvent,
  { stampedAt, paperUrl }: CalendarFeedInput,
): void {
  const summary = `Paper ${paper.number}: look at it`;
  const alarmAfterStart = alarmSeconds - noticeDays * daySeconds;
  const event = calendar.createEvent({
    id: calendarUid(kind, paper.id),
    stamp: stampedAt,
    start: startOfDay(on),
    // RFC 5545 section 3.6.1: the end of an event is the first day that is no longer part of it.
    end: startOfDay(addDays(on, 1)),
    allDay: true,
    summary,
    // The link stands in the description: the library writes URL behind the alarm, where the grammar of
    // RFC 5545 section 3.6.1 allows no property any more.
    description: `See what it is about: ${paperUrl(paper.id)}\nGeneral guidance; local law decides.`,
    // It reminds, and takes up nobody's time.
    transparency: ICalEventTransparency.TRANSPARENT,
  });
  const alarm = event.createAlarm({
    type: ICalAlarmType.display,
    description: summary,
    ...(alarmAfterStart >= 0
      ? { triggerAfter: alarmAfterStart }
      : { triggerBefore: -alarmAfterStart }),
  });
  // Set apart: the constructor forgets it, and an alarm after the start would count from the end of the day.
  if (alarmAfterStart >= 0) alarm.relatesTo(ICalAlarmRelatesTo.start);
}

/** The library writes the UTC day of a `Date`, so this one stands at midnight UTC whatever the machine's zone. */
function startOfDay(day: IsoDate): Date {
  return new Date(`${day}T00:00:00Z`);
}
