/** Who issued a paper: a known authority, a letterhead, a firm with its legal form. */
import type { TextFact } from '../../contract/readings.ts';
import { findAddressee } from './addressee.ts';
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
  /\b(?:statement|invoice|bill|receipt|notice|certificate|policy|schedule|agreement|letter|report|page|date|account (?:no|number)|total|dear|your|our|to|the|from|tel|phone|fax|www|http|@|specimen|registered office|customer|statement of|contract note|payslip|pay advice|summary|form|copy|original|return|deed|will|lease|licence|license|passport|menu|guide|manual|membership|renewal|warranty|guarantee|tax year|private|confidential|recording|mail to|payments?|deductions|department$|description|amount|details|balance|meter|readings?|units|quantity|items?|inv|delivered|first[- ]class|last will|testament|open|sale|off|menu|record|final|notice to|questions|how we|what you|specimen|order)\b/i;
const generic =
  /^(?:the|and|of|&|bank|plc|ltd|limited|inc|llc|llp|company|co|energy|water|power|insurance|society|trust|council|group|services?|brokerage|broadband|building)$/i;

/** Marks of a logo that were read as letters, and what a reader of letters makes of "plc". */
function cleanName(text: string): string {
  let name = text
    .replace(/\b(?:ple|pic)$/, 'plc')
    .replace(/\bple\b/g, 'plc')
    .replace(/\bL[il1]m[il1]ted\b/gi, 'Limited');
  name = name.replace(/^(\p{Lu}) (\p{Ll}{3,})/u, '$1$2');
  for (let before = ''; before !== name;) {
    before = name;
    name = name.replace(
      /^(?:[^\p{L}\p{N}]+|\(?\p{L}{1,3}\)|\p{Ll}{1,2}(?=\s)|\p{Ll}\p{Lu}(?=\s)|\p{L}\s?\|)\s*/u,
      '',
    );
  }
  return name.replace(/,\s*(?:\d|P\.?O\.? Box).*$/i, '').replace(/[\s,;:|*-]+$/, '');
}

/** Letters by chance: no word of four letters with a vowel, or more marks than letters. */
function looksLikeNoise(text: string): boolean {
  const words = text.match(/\p{L}{3,}/gu) ?? [];
  const letters = text.replace(/[^\p{L}]/gu, '').length;
  const isWord = words.some((word) => /[aeiouyáéíóú]/i.test(word) && word.length >= 4);
  const isInitials = /^[A-Z]{3,5}$/.test(text);
  return (!isWord && !isInitials) || letters < text.replace(/\s/g, '').length * 0.6;
}

function weigh(segment: Segment, name: string, addressee: string): number {
  const text = name;
  const { line } = segment;
  const letters = text.replace(/[^A-Za-zÀ-ÿ]/g, '').length;
  if (letters < 3 || text.length > 70 || looksLikeNoise(text)) return -1;
  const digits = text.replace(/\D/g, '').length;
  let weight = Math.min(segment.relativeHeight, 3) * 0.8;
  weight += Math.max(0, 0.5 - segment.box.y) * 1.6 - line.index * 0.04;
  if (legalForm.test(text)) weight += 0.8;
  if (/\b(?:ltd|limited|plc|llp|llc|inc|pty|pllc|dac|solicitors)\b/i.test(text)) weight += 0.6;
  if (title.test(text)) weight -= 1.1;
  if (/\b(?:agreement|certificate|licen[cs]e|report|contract|record|passport|will)\b/i.test(text))
    weight -= 0.6;
  if (digits > 0) weight -= 0.25 * Math.min(digits, 6);
  if (/^(?:mr|mrs|ms|miss|dr|dear)\b/i.test(text)) weight -= 2;
  if (addressee.length > 4 && addressee.includes(text.toLowerCase())) weight -= 1.2;
  if (!/[A-ZÀ-Þ]/.test(text)) weight -= 0.4;
  if (/[,:]/.test(text)) weight -= 0.3;
  if (text.split(' ').length > 7) weight -= 0.8;
  if (letterConfidence(line, segment.start, segment.end) < 0.55) weight -= 0.8;
  return weight;
}

/** "Bank plc" alone names nobody: the other half of the name stands above it. */
function joinWithAbove(segment: Segment, name: string, others: readonly Segment[]): string {
  if (!name.split(' ').every((word) => generic.test(word))) return name;
  const above = others.filter(
    (other) =>
      other !== segment &&
      other.box.y < segment.box.y &&
      segment.box.y - (other.box.y + other.box.h) < segment.box.h * 1.5 &&
      Math.abs(other.box.x - segment.box.x) < 0.06,
  );
  const lead = cleanName(above.at(-1)?.text ?? '');
  return lead.length >= 3 && !/\d/.test(lead) ? `${lead} ${name}` : name;
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
  const addressee = findAddressee(lines)?.value.toLowerCase() ?? '';
  const segments = top.flatMap((line) => splitSegments(line));
  let best: { segment: Segment; name: string; weight: number } | null = null;
  for (const segment of segments) {
    const name = joinWithAbove(segment, cleanName(segment.text), segments);
    const weight = weigh(segment, name, addressee);
    if (!best || weight > best.weight) best = { segment, name, weight };
  }
  const named = findNamedFirm(lines);
  if (named && (!best || best.weight < 1.6)) return named;
  if (!best || best.weight < 0.6) return named;
  const { segment, name } = best;
  const confidence = Math.min(0.85, 0.35 + best.weight * 0.15);
  return toFact(segment.line, name, segment.start, segment.end, confidence);
}

const employerLabel =
  /(?:employer|payer|company)(?:['’]s)?(?: full)?(?: name)?(?: and address)?(?:, address.*)?/i;

/** The employer of a yearly slip of pay: the name beside or under its label; the form is the authority's. */
export function findEmployer(lines: readonly PaperLine[]): TextFact | null {
  for (const line of lines) {
    const match = employerLabel.exec(line.text);
    if (!match || !/name/i.test(line.text.slice(match.index, match.index + 40))) continue;
    const at = line.text.indexOf('name', match.index) + 4;
    const beside = /^\W*((?:[A-Z][\w&'’.-]*\s?){2,6})/.exec(
      line.text.slice(at).replace(/^ and address/, ''),
    );
    if (beside?.[1] && legalForm.test(beside[1])) {
      return toFact(line, cleanName(beside[1].trim()), at, line.text.length, 0.7);
    }
    const label = placeOf(line, match.index, match.index + match[0].length).box;
    for (const below of lines.slice(line.index + 1, line.index + 3)) {
      if (below.page !== line.page) continue;
      const segment = splitSegments(below).find((item) => Math.abs(item.box.x - label.x) < 0.04);
      const name = segment && cleanName(segment.text);
      if (!segment || !name || looksLikeNoise(name) || /\d{3}/.test(name)) continue;
      return toFact(below, name, segment.start, segment.end, 0.65);
    }
  }
  return null;
}

/** A firm named with its legal form in the small print, as in "X Limited. Registered office". */
function findNamedFirm(lines: readonly PaperLine[]): TextFact | null {
  const pattern =
    /((?:[A-Z][\w&'’-]*\s){1,5}(?:Limited|Ltd|plc|PLC|LLP|LLC|Inc|Corporation|GmbH|AG|Pty Ltd|DAC))\b\.?/;
  for (const line of lines) {
    const match = pattern.exec(line.text);
    if (!match?.[1] || !/registered|authorised|regulated|trading|©/i.test(line.text)) continue;
    return toFact(line, cleanName(match[1]), match.index, match.index + match[1].length, 0.6);
  }
  return null;
}

/** Who makes out papers that name nobody on their face. */
const usual: Partial<Record<string, Record<string, string>>> = {
  passport: {
    GB: 'HM Passport Office',
    US: 'U.S. Department of State',
    IE: 'Department of Foreign Affairs',
    CA: 'Passport Canada',
    AU: 'Australian Passport Office',
  },
  'driving-licence': {
    GB: 'Driver & Vehicle Licensing Agency',
    IE: 'Road Safety Authority',
  },
  'birth-certificate': { GB: 'General Register Office' },
  'marriage-certificate': { GB: 'General Register Office' },
  'death-certificate': { GB: 'General Register Office' },
};

/** The authority that issues papers of a class in a country, null where there are many. */
export function findUsualIssuer(classId: string, country: string | null): TextFact | null {
  const value = usual[classId]?.[country ?? ''];
  return value ? { value, confidence: 0.6, seenAt: null } : null;
}
