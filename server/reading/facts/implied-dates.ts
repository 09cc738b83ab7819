/** Days that a paper does not print and that follow from it: terms of payment, ends of guarantees. */
import type { IsoDate } from '../../contract/dates.ts';
import type { DateFact, Facts } from '../../contract/readings.ts';
import { addDays, addMonths } from './calendar-days.ts';
import type { PaperLine } from './paper-lines.ts';

type Dates = Facts['dates'];

/** A date that follows from another fact, no surer than that. */
export function implied(value: IsoDate, from: DateFact | null, confidence = 0.6): DateFact {
  return {
    value,
    confidence: round(Math.min(confidence, from?.confidence ?? 1)),
    seenAt: from?.seenAt ?? null,
    printed: from?.printed ?? null,
  };
}

/** A share from 0 to 1 with three places. */
export function round(value: number): number {
  return Math.round(Math.max(0, Math.min(1, value)) * 1000) / 1000;
}

/** "Payment within 30 days" counted from the date of the paper. */
export function addTermDays(dates: Dates, lines: readonly PaperLine[], issued: DateFact): void {
  for (const line of lines) {
    const match =
      /(?:within|net|terms:?|payable in|payment in)\s+(\d{1,2})\s*days|(\d{1,2})\s*days\s+(?:net|from (?:the )?(?:invoice|date))/i.exec(
        line.text,
      );
    const days = Number(match?.[1] ?? match?.[2]);
    if (!match || !/pay|terms|net|invoice|due|zahl/i.test(line.text) || !(days > 0)) continue;
    dates.due = {
      ...implied(addDays(issued.value, days), null, 0.5),
      seenAt: { page: line.page, box: line.box },
      printed: match[0],
    };
    return;
  }
}

const yearCounts: Record<string, number> = {
  one: 1,
  two: 2,
  three: 3,
  four: 4,
  five: 5,
  six: 6,
  seven: 7,
  eight: 8,
  ten: 10,
};

/** A guarantee of so many years or months runs from the purchase or installation; the last day is the day before. */
export function addWarrantyEnd(dates: Dates, lines: readonly PaperLine[]): void {
  const from = dates.eventDate ?? dates.periodStart ?? dates.issued;
  if (!from) return;
  for (const line of lines) {
    const match =
      /\b(\d{1,2}|one|two|three|four|five|six|seven|eight|ten)[ -](year|month)s?\b/i.exec(
        line.text,
      );
    if (!match || !/guarantee|warrant|cover|parts/i.test(line.text)) continue;
    const word = (match[1] ?? '').toLowerCase();
    const count = yearCounts[word] ?? Number(word);
    const months = /month/i.test(match[2] ?? '') ? count : count * 12;
    if (!(months > 0) || months > 480) continue;
    dates.expiry = implied(addDays(addMonths(from.value, months), -1), from, 0.5);
    return;
  }
}
