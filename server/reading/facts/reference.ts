/** The number by which the issuer knows the paper: account, policy, invoice, notice. */
import type { TextFact } from '../../contract/readings.ts';
import { letterConfidence, placeOf } from './paper-lines.ts';
import type { PaperLine } from './paper-lines.ts';

const ending = '(?:\\s*(?:no|nr|number|num|#|ref|reference|id)\\b\\.?|\\s*#)';
/** Names of numbers, the more telling first; the number's weight falls with the place in the list. */
const kinds = [
  `(?:account|policy|invoice|claim|certificate and policy|certificate|notice|penalty charge notice|contract|member(?:ship)?|order|agreement|case|claim|title|loan|mortgage|plan|passport|licen[cs]e|registration|customer|client|contract|assessment|receipt|bill|file|parcel|permit|mot test|scheme|certificate of title|guarantee|warranty|fund|booking|grant|application|document|employee|staff|works|reference|repair order|recording|patient|nhs|student|payroll|statement|rechnungs|vertrags|kunden|konto|versicherungs)${ending}`,
  '(?:our|your|tax|customer|payment|unique taxpayer|contract|policy|claim|account|case|hmrc)\\s*ref(?:erence)?\\b\\.?',
  '(?:invoice|order|receipt|policy|account|claim|quote|repair order|work order|ticket|docket)\\s*:?\\s*#?(?=\\s*[A-Z0-9-]*\\d)',
  '(?:ref(?:erence)?|utr|pcn|abn|national insurance|social insurance|tax file|pps|aktenzeichen|steuernummer)\\b\\.?(?:\\s*(?:no|number))?\\.?',
  '(?:number|no\\.|nr\\.)',
];
const patterns = kinds.map(
  (kind) => new RegExp(`(?<![a-zà-ÿ])${kind}(?![a-zà-ÿ])\\s*[:.]?\\s*`, 'gi'),
);
const avoid =
  /omb|phone|tel\b|fax|mobile|vat|sort code|routing|page|serial|ein\b|company (?:no|number)|registered (?:no|number)|registration (?:no|number) gb|charity/i;
const value =
  /^[:#\s]*([A-Z0-9](?:[A-Z0-9/.-]*[A-Z0-9])?(?:\s[A-Z0-9/-]*\d[A-Z0-9/-]*|\s[A-Z]{1,2}(?=$|\s\d)){0,4})/;

/** A date that follows a number on its line is not part of it: "30417 18/12/2025", "0093 25 June". */
function cutDate(found: string, rest: string): string {
  const plain = found.replace(/\s\d{1,2}[/.-]\d{1,2}[/.-]\d{2,4}.*$/, '');
  const isDay = /^\s*(?:st|nd|rd|th)?\s*[A-Z][a-z]{2,8}\s+(?:19|20)\d{2}/.test(rest);
  return isDay ? plain.replace(/\s\d{1,2}$/, '') : plain;
}

function findValue(text: string): string | null {
  const match = value.exec(text);
  const found = match?.[1] ? cutDate(match[1].trim(), text.slice(match[0].length)) : undefined;
  if (!found || !/\d/.test(found) || found.replace(/\W/g, '').length < 3) return null;
  if (/^\d{1,2}[/.-]\d{1,2}[/.-]\d{2,4}$/.test(found)) return null;
  if (/^\d{1,3}(?:,?\d{3})*\.\d{2}$/.test(found)) return null;
  return found.length > 28 ? (found.split(' ')[0] ?? null) : found;
}

/** The paper's main reference, null when no number follows a name for one. */
export function findReference(lines: readonly PaperLine[]): TextFact | null {
  let best: (TextFact & { weight: number }) | null = null;
  for (const line of lines) {
    patterns.forEach((pattern, rank) => {
      for (const match of line.text.matchAll(pattern)) {
        const lead = line.text.slice(Math.max(0, match.index - 20), match.index + match[0].length);
        if (avoid.test(lead)) continue;
        const at = match.index + match[0].length;
        const own = findValue(line.text.slice(at));
        const spot = own
          ? { line, text: own, from: line.text.indexOf(own, at) }
          : findBelow(lines, line, match.index, at);
        if (!spot) continue;
        const weight =
          1 - rank * 0.15 - (line.page - 1) * 0.2 - line.index * 0.004 - (own ? 0 : 0.1);
        if (best && best.weight >= weight) continue;
        const end = spot.from + spot.text.length;
        best = {
          weight,
          value: spot.text,
          confidence: Math.round(0.8 * letterConfidence(spot.line, spot.from, end) * 1000) / 1000,
          seenAt: placeOf(spot.line, spot.from, end),
        };
      }
    });
  }
  if (!best) return null;
  const { value: text, confidence, seenAt }: TextFact = best;
  return { value: text, confidence, seenAt };
}

/** The value of a label that stands under it in the same column. */
function findBelow(
  lines: readonly PaperLine[],
  line: PaperLine,
  start: number,
  end: number,
): { line: PaperLine; text: string; from: number } | null {
  const label = placeOf(line, start, end).box;
  for (const other of lines.slice(line.index + 1, line.index + 8)) {
    if (other.page !== line.page) return null;
    const drop = other.box.y - (label.y + label.h);
    if (drop < -0.004 || drop > Math.max(label.h, 0.008) * 2.2) continue;
    const index = other.words.findIndex((word) => Math.abs(word.box.x - label.x) < 0.02);
    if (index < 0) continue;
    const from = other.starts[index] ?? 0;
    const text = findValue(other.text.slice(from));
    if (text) return { line: other, text, from };
  }
  return null;
}
