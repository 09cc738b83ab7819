/** Who issued a paper: a known authority, a letterhead, a firm with its legal form. */
import type { TextFact } from '../../contract/readings.ts';
import { letterConfidence, placeOf } from './paper-lines.ts';
import type { PaperLine } from './paper-lines.ts';
import { splitSegments } from './segments.ts';
import type { Segment } from './segments.ts';

const authorities: [RegExp, string][] = [
  [/\bHM Revenue|\bHMRC\b/, 'HM Revenue & Customs'],
  [/Driver (?:and|&) Vehicle Licensing|\bDVLA\b/i, 'Driver & Vehicle Licensing Agency'],
  [
    /Driver (?:and|&) Vehicle Standards|Vehicle\s+Standards Agency|\bDVSA\b/i,
    'Driver & Vehicle Standards Agency',
  ],
  [/Department for Work|Pension Service\b/i, 'Department for Work and Pensions'],
  [/HM Land Registry/i, 'HM Land Registry'],
  [/HM Passport Office/i, 'HM Passport Office'],
  [/Office of the Public Guardian/i, 'Office of the Public Guardian'],
  [/Companies House/i, 'Companies House'],
  [/HM Courts/i, 'HM Courts & Tribunals Service'],
  [/Internal Revenue Service|^IRS\b/, 'Internal Revenue Service'],
  [/Social Security Administration/i, 'Social Security Administration'],
  [/U\.?S\.? Department of State/i, 'U.S. Department of State'],
  [/Canada Revenue Agency|Canada Customs/i, 'Canada Revenue Agency'],
  [/Revenue Canada/i, 'Revenue Canada'],
  [/Service Canada/i, 'Service Canada'],
  [/Australian Taxation Office|AUSTRALIAN TAXATION/i, 'Australian Taxation Office'],
  [/Services Australia|Centrelink/i, 'Services Australia'],
  [/Revenue Commissioners|Irish Tax and Customs/i, 'Revenue Commissioners'],
  [/Health Service Executive|\bHSE\b/, 'Health Service Executive'],
  [/Department of Social Protection/i, 'Department of Social Protection'],
  [/General Register Office/i, 'General Register Office'],
];

const legalForm =
  /\b(?:ltd|limited|plc|llp|llc|inc|corp(?:oration)?|company|co|gmbh|ag|pty|dac|society|trust|trustees|bank|council|county|association|club|university|college|school|academy|institute|hospital|clinic|surgery|practice|pharmacy|solicitors|attorneys|insurance|assurance|mutual|energy|water|power|electric|gas|broadband|telecom|mobile|church|charity|foundation|fund|super|credit union|stores?|garage|motors|auto|services|group|brokerage|partners|court|registry|department|agency|authority|office|ministry|borough|city of|state of)\b/i;
const title =
  /\b(?:statement|invoice|bill|receipt|notice|certificate|policy|schedule|agreement|letter|report|page|date|account (?:no|number)|total|dear|your|our|to|the|from|tel|phone|fax|www|http|@|specimen|registered office|customer|statement of|contract note|payslip|pay advice|summary|form|copy|original|return|deed|will|lease|licence|license|passport|menu|guide|manual|membership|renewal|warranty|guarantee|tax year|private|confidential|recording|mail to)\b/i;

function weigh(segment: Segment): number {
  const { text, line } = segment;
  const letters = text.replace(/[^A-Za-zÀ-ÿ]/g, '').length;
  if (letters < 3 || text.length > 70) return -1;
  const digits = text.replace(/\D/g, '').length;
  let weight = Math.min(segment.relativeHeight, 3) * 0.8;
  weight += Math.max(0, 0.5 - segment.box.y) * 1.6 - line.index * 0.04;
  if (legalForm.test(text)) weight += 0.8;
  if (title.test(text)) weight -= 1.1;
  if (digits > 0) weight -= 0.25 * Math.min(digits, 6);
  if (/^(?:mr|mrs|ms|miss|dr|dear)\b/i.test(text)) weight -= 2;
  if (!/[A-ZÀ-Þ]/.test(text)) weight -= 0.4;
  if (/[,:]/.test(text)) weight -= 0.3;
  if (text.split(' ').length > 7) weight -= 0.8;
  return weight;
}

function toFact(
  line: PaperLine,
  text: string,
  start: number,
  end: number,
  confidence: number,
): TextFact {
  return {
    value: text,
    confidence: Math.round(confidence * letterConfidence(line, start, end) * 1000) / 1000,
    seenAt: placeOf(line, start, end),
  };
}

/** The issuer as printed; null when the top of the first page names nobody. */
export function findIssuer(lines: readonly PaperLine[]): TextFact | null {
  const first = lines.filter((line) => line.page === 1);
  const top = first.filter((line, index) => line.box.y < 0.4 || index < 12);
  for (const line of top) {
    for (const [pattern, name] of authorities) {
      const match = pattern.exec(line.text);
      if (match) return toFact(line, name, match.index, match.index + match[0].length, 0.9);
    }
  }
  let best: { segment: Segment; weight: number } | null = null;
  for (const segment of top.flatMap((line) => splitSegments(line))) {
    const weight = weigh(segment);
    if (!best || weight > best.weight) best = { segment, weight };
  }
  const named = findNamedFirm(lines);
  if (named && (!best || best.weight < 1.6)) return named;
  if (!best || best.weight < 0.6) return named;
  const { segment } = best;
  const confidence = Math.min(0.85, 0.35 + best.weight * 0.15);
  return toFact(segment.line, segment.text, segment.start, segment.end, confidence);
}

/** A firm named with its legal form in the small print, as in "X Limited. Registered office". */
function findNamedFirm(lines: readonly PaperLine[]): TextFact | null {
  const pattern =
    /((?:[A-Z][\w&'’-]*\s){1,5}(?:Limited|Ltd|plc|PLC|LLP|LLC|Inc|Corporation|GmbH|AG|Pty Ltd|DAC))\b\.?/;
  for (const line of lines) {
    const match = pattern.exec(line.text);
    if (!match?.[1] || !/registered|authorised|regulated|trading|©/i.test(line.text)) continue;
    return toFact(line, match[1], match.index, match.index + match[1].length, 0.6);
  }
  return null;
}
