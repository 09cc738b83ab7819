/** The sums that matter on a paper: totals, balances, refunds, with their currency. */
import type { AmountFact } from '../../contract/readings.ts';
import { letterConfidence, placeOf } from './paper-lines.ts';
import type { PaperLine } from './paper-lines.ts';

const names: { name: string; pattern: RegExp }[] = [
  {
    name: 'total due',
    pattern:
      /(?:total|amount|balance|payment|sum) (?:now )?(?:due|payable|to pay|outstanding)|amount you owe|please pay|zu zahlen|to pay/i,
  },
  { name: 'total', pattern: /(?:grand |invoice |order )?total|gesamt(?:betrag|summe)|endbetrag/i },
  { name: 'refund', pattern: /refund|erstattung/i },
  { name: 'net pay', pattern: /net (?:pay|wage|salary|amount paid)|take.?home|auszahlung/i },
  { name: 'gross pay', pattern: /gross (?:pay|wage|salary|earnings)|total pay|wages,? tips/i },
  {
    name: 'closing balance',
    pattern:
      /(?:closing|ending|new|final|current) (?:account )?(?:balance|value)|balance (?:at|on|carried)/i,
  },
  {
    name: 'opening balance',
    pattern:
      /(?:opening|beginning|previous|starting) (?:account )?(?:balance|value)|brought forward/i,
  },
  { name: 'premium', pattern: /premium/i },
  { name: 'tax', pattern: /(?:vat|gst|hst|sales tax|income tax|tax deducted|mwst)/i },
  { name: 'subtotal', pattern: /sub.?total/i },
  { name: 'deposit', pattern: /deposit/i },
  { name: 'rent', pattern: /\brent\b/i },
  { name: 'donation', pattern: /donation|gift amount|eligible amount/i },
  { name: 'penalty', pattern: /penalty|fine\b/i },
];

const money =
  /(?<![\w.,])([-–]\s?)?(£|€|\$|C\$|A\$|US\$|CA\$|AU\$|GBP|USD|EUR|CAD|AUD)?\s?([-–])?(\d{1,3}(?:[ ,.']\d{3})*|\d+)([.,]\d{2})(?!\d|[.,]\d|%)\s?(€|EUR|CR|DR)?|(£|€|\$)\s?(\d{1,3}(?:,\d{3})+|\d+)(?![\d.,]?\d)/g;

const currencies: Record<string, string> = {
  '£': 'GBP',
  '€': 'EUR',
  C$: 'CAD',
  CA$: 'CAD',
  A$: 'AUD',
  AU$: 'AUD',
  US$: 'USD',
};
const dollars: Record<string, string> = { US: 'USD', CA: 'CAD', AU: 'AUD' };
const homeCurrencies: Record<string, string> = {
  ...dollars,
  GB: 'GBP',
  IE: 'EUR',
  DE: 'EUR',
};

function findCurrency(sign: string | undefined, country: string | null): string | null {
  if (sign === '$') return country ? (dollars[country] ?? 'USD') : null;
  if (sign && /^[A-Z]{3}$/.test(sign)) return sign;
  if (sign && currencies[sign]) return currencies[sign];
  return country ? (homeCurrencies[country] ?? null) : null;
}

interface Money {
  value: number;
  currency: string | null;
  start: number;
  end: number;
}

/** All sums of money in a line, with two decimals or a currency sign. */
export function parseMoney(text: string, country: string | null): Money[] {
  return [...text.matchAll(money)].map((match) => {
    const [all, lead, sign, minus, whole, cents, tail, plainSign, plainWhole] = match;
    const digits = (whole ?? plainWhole ?? '').replace(/[ ,.']/g, '');
    const value = Number(`${digits}.${(cents ?? '.0').slice(1)}`);
    const isNegative = Boolean(lead ?? minus);
    const currencyTail = tail === '€' || tail === 'EUR' ? tail : undefined;
    return {
      value: isNegative ? -value : value,
      currency: findCurrency(sign ?? plainSign ?? currencyTail, country),
      start: match.index,
      end: match.index + all.length,
    };
  });
}

/** Up to eight named sums, one for each name, the first that carries it. */
export function findAmounts(lines: readonly PaperLine[], country: string | null): AmountFact[] {
  const found = new Map<string, AmountFact>();
  lines.forEach((line, index) => {
    for (const { name, pattern } of names) {
      const match = pattern.exec(line.text);
      if (!match || (name === 'total' && /sub.?total/i.test(line.text))) continue;
      const own = parseMoney(line.text, country).filter((sum) => sum.start >= match.index);
      const below = own.length > 0 ? null : lines[index + 1];
      const belowSums = below && below.page === line.page ? parseMoney(below.text, country) : [];
      const sum = own.at(name.startsWith('total') ? -1 : 0) ?? belowSums[0];
      if (!sum) continue;
      const home = own.length > 0 ? line : (below ?? line);
      if (found.has(name) && name !== 'total') return;
      found.set(name, {
        name,
        value: sum.value,
        currency: sum.currency,
        confidence: Math.round(0.8 * letterConfidence(home, sum.start, sum.end) * 1000) / 1000,
        seenAt: placeOf(home, sum.start, sum.end),
      });
      return;
    }
  });
  return [...found.values()].slice(0, 8);
}
