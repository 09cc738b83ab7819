/** To whom a paper is addressed, from the address block, labels or the salutation. */
import type { TextFact } from '../../contract/readings.ts';
import { letterConfidence, placeOf } from './paper-lines.ts';
import type { PaperLine } from './paper-lines.ts';
import { splitSegments } from './segments.ts';
import type { Segment } from './segments.ts';

const honorific = /^(?:mr|mrs|ms|miss|mx|dr|prof|rev|sir|lady|messrs|herr|frau|m\.|mme)\b\.?\s+\S/i;
const labelled =
  /(?:^|\s)(?:bill(?:ed)? to|invoice to|sold to|ship to|deliver to|customer(?: name)?|patient(?: name)?|employee(?: name)?|name of employee|taxpayer|account holder|named insured|policyholder|name of policyholder|insured|member|client|recipient|payee|tenant|buyer|registered keeper|name|for|to|owner|issued to|student|pupil)\s*[:.]?\s+((?:[A-ZÀ-Þ][\w.'’-]*,?\s?(?:&\s?)?){1,6})/;
const salutation = /^dear\s+(.{3,40}?)[,:]?$/i;
const postal =
  /\b[A-Z]{1,2}\d[A-Z\d]?\s?\d[A-Z]{2}\b|\b[A-Z]{2}\.?\s\d{5}(?:-\d{4})?\b|\b[A-Z]\d[A-Z]\s?\d[A-Z]\d\b|\b(?:NSW|VIC|QLD|SA|WA|TAS|ACT|NT)\s\d{4}\b|\bCo\.?\s[A-Z][a-z]+|\b\d{5}\s[A-ZÄÖÜ]/i;
const business = /\b(?:t\/a|trading as|ltd|limited|llp|llc|inc|plc|gmbh|& sons?|& co)\b/i;

function toFact(segment: Segment, text: string, confidence: number): TextFact {
  const { line, start, end } = segment;
  return {
    value: text.trim().replace(/[,:]$/, ''),
    confidence: Math.round(confidence * letterConfidence(line, start, end) * 1000) / 1000,
    seenAt: placeOf(line, start, end),
  };
}

/** The addressee of a paper, null when none is printed. */
export function findAddressee(lines: readonly PaperLine[]): TextFact | null {
  const first = lines.filter((line) => line.page === 1);
  const segments = first.flatMap((line) => splitSegments(line));
  const titled = segments.find(
    (segment) => honorific.test(segment.text) && segment.text.length < 50 && segment.box.y < 0.6,
  );
  if (titled) return toFact(titled, titled.text, 0.85);
  const block = findAddressBlock(segments);
  if (block) return toFact(block, block.text, 0.7);
  for (const line of first) {
    const match = labelled.exec(line.text);
    if (!match?.[1] || match[1].length < 5) continue;
    const [segment] = splitSegments(line, 1);
    if (segment) return toFact(segment, match[1], 0.55);
  }
  for (const segment of segments) {
    const match = salutation.exec(segment.text);
    if (match?.[1] && !/sir|madam|customer|resident|parent/i.test(match[1])) {
      return toFact(segment, match[1], 0.6);
    }
  }
  return null;
}

/** The first line of a left-aligned block that ends in a postal code within six lines. */
function findAddressBlock(segments: readonly Segment[]): Segment | null {
  for (let index = 0; index < segments.length; index += 1) {
    const end = segments[index];
    if (!end || !postal.test(end.text) || end.box.y > 0.55) continue;
    const column = segments
      .slice(Math.max(0, index - 14), index)
      .filter((segment) => Math.abs(segment.box.x - end.box.x) < 0.025)
      .filter((segment) => end.box.y - segment.box.y < 0.16)
      .slice(-5);
    const name = column.find(
      (segment) =>
        /^[A-ZÀ-Þ][\w.'’&,-]*(?:\s[A-ZÀ-Þ&][\w.'’,-]*){1,5}$/.test(segment.text) &&
        !/\d/.test(segment.text),
    );
    if (name && column.length >= 2 && column[0] === name) return name;
  }
  return null;
}

/** Whether the block under or beside the addressee names a trade or firm. */
export function isAddressedToBusiness(
  lines: readonly PaperLine[],
  addressee: TextFact | null,
  businessNames: readonly string[] = [],
): boolean {
  const place = addressee?.seenAt;
  const near = place
    ? lines.filter(
        (line) =>
          line.page === place.page &&
          line.box.y >= place.box.y - 0.03 &&
          line.box.y <= place.box.y + 0.07 &&
          Math.abs(line.box.x - place.box.x) < 0.3,
      )
    : [];
  const text = [addressee?.value ?? '', ...near.map((line) => line.text)].join('\n').toLowerCase();
  if (businessNames.some((name) => name && text.includes(name.toLowerCase()))) return true;
  return business.test(text);
}
