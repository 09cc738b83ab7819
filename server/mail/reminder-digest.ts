import type { IsoDate } from '../contract/dates.ts';
import { classLabel } from '../contract/document-classes.ts';
import type { Reminder } from '../contract/reminders.ts';
import type { ComposedMail, LetterPart } from './letter.ts';
import { generalGuidance, greet, tidyLine, writeLetter } from './letter.ts';
import { sayCount, sayDay } from './say-day.ts';

export interface DigestItem {
  kind: Reminder['kind'];
  about: IsoDate;
  paperNumber: number;
  class: string;
  boxCode: string | null;
  place: string | null;
}

/** What one household has to say to one person; `url` opens its reminders after signing in. */
export interface DigestHousehold {
  householdName: string;
  practiceName: string;
  url: string;
  items: DigestItem[];
}

/** More than this in one household are counted, not listed. */
const listedAtMost = 25;

/**
 * One message for all that is due to one person. The subject gives a number away and nothing else; the
 * body names the kind of paper, its number and its date, never an issuer or another person.
 */
export function composeReminderDigest(input: {
  personName: string;
  households: DigestHousehold[];
}): ComposedMail {
  const households = input.households.filter((household) => household.items.length > 0);
  const count = households.reduce((sum, household) => sum + household.items.length, 0);
  if (count === 0) throw new RangeError('A reminder message needs at least one date to speak of.');
  return writeLetter({
    subject: `Slackwater: ${sayCount(count, 'date')} to look at`,
    greeting: greet(input.personName),
    parts: [
      {
        kind: 'paragraph',
        words:
          count === 1
            ? 'A date for one of the papers is coming up or has come.'
            : 'Dates for some of the papers are coming up or have come.',
      },
      ...households.flatMap(describeHousehold),
      {
        kind: 'paragraph',
        words:
          'Nothing happens by itself: every paper stays where it is until somebody decides about it.',
      },
    ],
    smallPrint: [generalGuidance, ...households.map(explainWhy)],
  });
}

function describeHousehold(household: DigestHousehold): LetterPart[] {
  const items = [...household.items].sort(
    (a, b) => a.about.localeCompare(b.about) || a.paperNumber - b.paperNumber,
  );
  const more = items.length - listedAtMost;
  return [
    { kind: 'heading', words: tidyLine(household.householdName) },
    { kind: 'lines', lines: items.slice(0, listedAtMost).map(describeItem) },
    ...(more > 0
      ? [{ kind: 'paragraph' as const, words: `And ${more} more: the page below shows them all.` }]
      : []),
    { kind: 'link', words: 'See the dates', url: household.url },
  ];
}

function describeItem(item: DigestItem): { lead: string; detail: string } {
  const where = item.place ?? (item.boxCode ? `box ${item.boxCode}` : null);
  const date =
    item.kind === 'expiry'
      ? `expires on ${sayDay(item.about)}`
      : `was to be kept until ${sayDay(item.about)}; please look whether it may go`;
  return {
    lead: `${classLabel(item.class)} (paper ${item.paperNumber})`,
    detail: where ? `${date}. Where it is: ${tidyLine(where)}` : date,
  };
}

function explainWhy(household: DigestHousehold): string {
  const { householdName, practiceName } = household;
  return `You get this because you belong to the household "${tidyLine(householdName)}", whose papers ${tidyLine(practiceName)} keeps in Slackwater with you. Each date is mentioned to you once.`;
}
