/**
 * Machine-readable zones of travel documents: ICAO Doc 9303 parts 3 to 6 (TD1 3 x 30, TD2 2 x 36,
 * TD3 2 x 44). Letters and digits that a reader confuses are put right where the position or a check
 * digit decides.
 */
import type { Mrz } from '../../contract/readings.ts';
import { findIsoDate } from './calendar-days.ts';

const weights = [7, 3, 1];

/** The check digit of a field: digits as they are, A = 10 to Z = 35, `<` = 0, times 7, 3, 1, modulo 10. */
export function computeCheckDigit(field: string): number {
  let sum = 0;
  [...field].forEach((character, index) => {
    const code = character.charCodeAt(0);
    const value = character === '<' ? 0 : code >= 65 ? code - 55 : code - 48;
    sum += value * (weights[index % 3] ?? 0);
  });
  return sum % 10;
}

const toDigit: Record<string, string> = {
  O: '0',
  Q: '0',
  D: '0',
  I: '1',
  L: '1',
  Z: '2',
  S: '5',
  G: '6',
  B: '8',
};
const toLetter: Record<string, string> = {
  '0': 'O',
  '1': 'I',
  '2': 'Z',
  '5': 'S',
  '6': 'G',
  '8': 'B',
};

function asDigits(text: string): string {
  return [...text].map((character) => toDigit[character] ?? character).join('');
}

function asLetters(text: string): string {
  return [...text].map((character) => toLetter[character] ?? character).join('');
}

/** A printed line as MRZ characters: no spaces, guillemets and brackets as fillers. */
function normaliseLine(text: string): string {
  return text
    .toUpperCase()
    .replace(/[«»]/g, '<<')
    .replace(/[‹›([{]/g, '<')
    .replace(/[^A-Z0-9<]/g, '');
}

/** Tries the confusable characters of a document number until its check digit is right. */
function repairNumber(field: string, check: string): string {
  if (!/^\d$/.test(check) || computeCheckDigit(field) === Number(check)) return field;
  const spots = [...field]
    .map((character, index) => ({ index, other: toDigit[character] ?? toLetter[character] }))
    .filter((spot): spot is { index: number; other: string } => spot.other !== undefined);
  const change = (text: string, spot: { index: number; other: string }): string =>
    text.slice(0, spot.index) + spot.other + text.slice(spot.index + 1);
  const singles = spots.map((spot) => change(field, spot));
  const doubles = spots.flatMap((first, index) =>
    spots.slice(index + 1).map((second) => change(change(field, first), second)),
  );
  const right = [...singles, ...doubles].filter(
    (candidate) => computeCheckDigit(candidate) === Number(check),
  );
  return right[0] ?? field;
}

/** A date field yymmdd: an expiry lies in this century; a birth at least five years before the expiry. */
function readDate(field: string, latestYear: number | null): string | null {
  if (!/^\d{6}$/.test(field)) return null;
  const short = Number(field.slice(0, 2));
  const year = latestYear !== null && 2000 + short > latestYear - 5 ? 1900 + short : 2000 + short;
  return findIsoDate(year, Number(field.slice(2, 4)), Number(field.slice(4, 6)));
}

interface Fields {
  lines: string[];
  number: string;
  numberCheck: string;
  birth: string;
  birthCheck: string;
  expiry: string;
  expiryCheck: string;
  optional: string | null;
  optionalCheck: string | null;
  compositeOver: string;
  composite: string;
  state: string;
  names: string;
}

function toMrz(fields: Fields): Mrz {
  const isRight = (field: string, check: string): boolean =>
    /^\d$/.test(check) && computeCheckDigit(field) === Number(check);
  const checks = [
    { field: 'documentNumber', valid: isRight(fields.number, fields.numberCheck) },
    { field: 'birthDate', valid: isRight(fields.birth, fields.birthCheck) },
    { field: 'expiryDate', valid: isRight(fields.expiry, fields.expiryCheck) },
  ];
  if (fields.optional !== null && fields.optionalCheck !== null) {
    const isEmpty = /^<*$/.test(fields.optional) && fields.optionalCheck === '<';
    checks.push({
      field: 'optional',
      valid: isEmpty || isRight(fields.optional, fields.optionalCheck),
    });
  }
  checks.push({ field: 'composite', valid: isRight(fields.compositeOver, fields.composite) });
  const expiryDate = readDate(fields.expiry, null);
  const [surname, given] = splitNames(fields.names);
  return {
    lines: fields.lines,
    valid: checks.every((check) => check.valid),
    documentNumber: fields.number.replace(/</g, '') || null,
    issuingState: fields.state.replace(/</g, '') || null,
    surname,
    givenNames: given,
    birthDate: readDate(fields.birth, expiryDate ? Number(expiryDate.slice(0, 4)) : 2050),
    expiryDate,
    checks,
  };
}

function splitNames(names: string): [string | null, string | null] {
  const at = names.indexOf('<<');
  const surname = (at < 0 ? names : names.slice(0, at)).replace(/</g, ' ').trim();
  const rest = at < 0 ? '' : names.slice(at + 2);
  const stop = rest.indexOf('<<');
  const given = (stop < 0 ? rest : rest.slice(0, stop))
    .replace(/</g, ' ')
    .trim()
    .replace(/(?: [KCLES]{1,12})+$/, (tail) => (/^(?: [KCL]+)+$/.test(tail) ? '' : tail));
  return [surname || null, given || null];
}

const lineTwo =
  /([A-Z0-9<]{9})([0-9OQDILZSGB<])([A-Z0-9<]{3})([0-9OQDILZSGB]{6})([0-9OQDILZSGB])([MFX<H])([0-9OQDILZSGB]{6})([0-9OQDILZSGB])(.*)$/;

/** The optional part and the last check digit(s), also when fillers were lost, doubled or misread. */
function repairTail(tail: string, optionalLength: number, hasOwnCheck: boolean): string {
  const full = optionalLength + (hasOwnCheck ? 2 : 1);
  if (tail.length === full && /[0-9]$/.test(tail) && /^[A-Z0-9<]*$/.test(tail)) {
    if (!/^[<KCLE]+/.test(tail)) return tail;
  }
  const digits = /([0-9OQDSBZIL<]?)([0-9OQDSBZIL])$/.exec(tail);
  const content = /^([A-Z0-9]*[0-9][A-Z0-9]*)(?=<|[KCLE]*<)/.exec(tail)?.[1] ?? '';
  const optional = content.slice(0, optionalLength).padEnd(optionalLength, '<');
  const last = asDigits(digits?.[2] ?? '<');
  if (!hasOwnCheck) return optional + last;
  const own = content === '' ? emptyCheck(digits?.[1]) : String(computeCheckDigit(optional));
  return optional + own + last;
}

/** The check of an empty field may be printed as `0` or left as a filler. */
function emptyCheck(printed: string | undefined): string {
  return printed === '<' ? '<' : '0';
}

function readTwoLines(first: string, second: string, length: 44 | 36): Mrz | null {
  const match = lineTwo.exec(second);
  if (!match) return null;
  const [, rawNumber = '', rawCheck = '', nationality = '', birth = '', birthCheck = ''] = match;
  const [, , , , , , sex = '<', expiry = '', expiryCheck = '', tail = ''] = match;
  const numberCheck = asDigits(rawCheck);
  const number = repairNumber(rawNumber, numberCheck);
  const dates = {
    birth: asDigits(birth),
    birthCheck: asDigits(birthCheck),
    expiry: asDigits(expiry),
    expiryCheck: asDigits(expiryCheck),
  };
  const optionalLength = length === 44 ? 14 : 7;
  const head = `${number}${numberCheck}`;
  const middle = `${dates.birth}${dates.birthCheck}`;
  const end = `${dates.expiry}${dates.expiryCheck}`;
  let rest = repairTail(tail, optionalLength, length === 44);
  const compositeOf = (text: string): number => computeCheckDigit(`${head}${middle}${end}${text}`);
  if (length === 44 && compositeOf(rest.slice(0, 15)) !== Number(rest.slice(15))) {
    const swapped = /^<{14}0/.test(rest) ? `${'<'.repeat(15)}${rest.slice(15)}` : rest;
    if (compositeOf(swapped.slice(0, 15)) === Number(swapped.slice(15))) rest = swapped;
  }
  const composite = rest.slice(-1);
  const fixedFirst = repairFirst(first, length);
  return toMrz({
    lines: [fixedFirst, `${head}${asLetters(nationality)}${middle}${sex}${end}${rest}`],
    number,
    numberCheck,
    ...dates,
    optional: length === 44 ? rest.slice(0, 14) : null,
    optionalCheck: length === 44 ? rest.slice(14, 15) : null,
    compositeOver: `${head}${middle}${end}${rest.slice(0, -1)}`,
    composite,
    state: asLetters(fixedFirst.slice(2, 5)),
    names: fixedFirst.slice(5),
  });
}

/** The name line in full length; a run of misread fillers at its end becomes fillers again. */
function repairFirst(line: string, length: number): string {
  const start = line.search(/[PIACV][A-Z<K]/);
  const own = (start > 0 ? line.slice(start) : line).replace(/<[<KCLES]*$/, (tail) =>
    tail.length >= 3 ? '<'.repeat(tail.length) : tail,
  );
  const head = own.slice(0, 1) + (/[A-Z]/.test(own[1] ?? '') && own[1] !== 'K' ? own[1] : '<');
  const body = asLetters(own.slice(2));
  return `${head}${body}`.slice(0, length).padEnd(length, '<');
}

const cardLineTwo =
  /^([0-9OQDILZSGB]{6})([0-9OQDILZSGB])([MFX<H])([0-9OQDILZSGB]{6})([0-9OQDILZSGB])([A-Z0-9<]{3})(.*)$/;

function readCard(first: string, second: string, third: string): Mrz | null {
  const match = cardLineTwo.exec(second);
  const head = /^([IAC][A-Z<])([A-Z0-9<]{3})([A-Z0-9<]{9})([0-9OQDILZSGB<])(.*)$/.exec(first);
  if (!match || !head) return null;
  const [, code = '', state = '', rawNumber = '', rawCheck = '', extra = ''] = head;
  const [
    ,
    birth = '',
    birthCheck = '',
    sex = '<',
    expiry = '',
    expiryCheck = '',
    nation = '',
    tail = '',
  ] = match;
  const numberCheck = asDigits(rawCheck);
  const number = repairNumber(rawNumber, numberCheck);
  const optionalOne = extra
    .replace(/[KCLE<]*$/, '')
    .slice(0, 15)
    .padEnd(15, '<');
  const composite = asDigits(/(.)$/.exec(tail)?.[1] ?? '<');
  const optionalTwo = tail
    .slice(0, -1)
    .replace(/[KCLE<]*$/, '')
    .slice(0, 11)
    .padEnd(11, '<');
  const dates = {
    birth: asDigits(birth),
    birthCheck: asDigits(birthCheck),
    expiry: asDigits(expiry),
    expiryCheck: asDigits(expiryCheck),
  };
  const lineOne = `${code}${asLetters(state)}${number}${numberCheck}${optionalOne}`;
  const born = `${dates.birth}${dates.birthCheck}`;
  const ends = `${dates.expiry}${dates.expiryCheck}`;
  return toMrz({
    lines: [
      lineOne,
      `${born}${sex}${ends}${asLetters(nation)}${optionalTwo}${composite}`,
      asLetters(third).slice(0, 30).padEnd(30, '<'),
    ],
    number,
    numberCheck,
    ...dates,
    optional: null,
    optionalCheck: null,
    compositeOver: `${lineOne.slice(5, 30)}${born}${ends}${optionalTwo}`,
    composite,
    state: asLetters(state),
    names: asLetters(third),
  });
}

/** Reads the machine-readable zone among the lines of a page; null when there is none. */
export function findMrz(texts: readonly string[]): Mrz | null {
  const lines = texts.map(normaliseLine);
  let best: Mrz | null = null;
  const consider = (candidate: Mrz | null): void => {
    if (!candidate) return;
    const right = (mrz: Mrz): number => mrz.checks.filter((check) => check.valid).length;
    if (right(candidate) < 2) return;
    if (!best || right(candidate) > right(best)) best = candidate;
  };
  lines.forEach((line, index) => {
    if (line.length < 24 || line.length > 60) return;
    const before = lines.slice(Math.max(0, index - 3), index).reverse();
    const name = before.find((text) => text.length >= 20 && /<|^[PIACV][<K]/.test(text)) ?? '';
    if (line.length >= 38) consider(readTwoLines(name, line, 44));
    if (line.length >= 30 && line.length <= 38) consider(readTwoLines(name, line, 36));
    if (line.length <= 34) {
      const first = before.find((text) => text.length >= 24 && /^[IAC]/.test(text));
      const third = lines.slice(index + 1, index + 3).find((text) => text.length >= 10) ?? '';
      if (first) consider(readCard(first, line, third));
    }
  });
  return best;
}
