/** Numbers written in words, as legal papers date themselves. */

const units = [
  'zero one two three four five six seven eight nine ten eleven twelve thirteen fourteen fifteen',
  'sixteen seventeen eighteen nineteen',
]
  .join(' ')
  .split(' ');
const tens = ['twenty', 'thirty', 'forty', 'fifty', 'sixty', 'seventy', 'eighty', 'ninety'];
const ordinals = [
  'first second third fourth fifth sixth seventh eighth ninth tenth eleventh twelfth thirteenth',
  'fourteenth fifteenth sixteenth seventeenth eighteenth nineteenth twentieth',
]
  .join(' ')
  .split(' ');

/** A number from 0 to 99 in words, hyphened or not; null when it is none. */
function findSmallNumber(words: readonly string[]): number | null {
  const [first, second, ...rest] = words;
  if (first === undefined || rest.length > 0) return null;
  const unit = units.indexOf(first);
  const ten = tens.indexOf(first);
  if (second === undefined) return unit >= 0 ? unit : ten >= 0 ? (ten + 2) * 10 : null;
  const last = units.indexOf(second);
  return ten >= 0 && last >= 1 && last <= 9 ? (ten + 2) * 10 + last : null;
}

/** Day of the month from an ordinal in words, `twenty-sixth` gives 26; null when it is none. */
export function findOrdinalDay(text: string): number | null {
  const words = text.toLowerCase().split(/[\s-]+/);
  const last = ordinals.indexOf(words.at(-1) ?? '') + 1;
  if (words.length === 1) {
    if (words[0] === 'thirtieth') return 30;
    return last > 0 ? last : null;
  }
  const ten = tens.indexOf(words[0] ?? '');
  if (words.length !== 2 || ten < 0 || ten > 1 || last < 1 || last > 9) return null;
  return (ten + 2) * 10 + last;
}

/** A year in words: `two thousand and fifteen`, `nineteen hundred and ninety-four`, `twenty twenty-five`. */
export function findYearInWords(text: string): number | null {
  const words = text
    .toLowerCase()
    .split(/[\s,-]+/)
    .filter((word) => word !== '' && word !== 'and' && word !== 'one' && word !== 'a');
  const thousand = words.indexOf('thousand');
  if (words[0] === 'two' && thousand === 1) {
    const rest = text
      .toLowerCase()
      .split(/[\s,-]+/)
      .filter((word) => word !== '' && word !== 'and')
      .slice(2);
    return rest.length === 0 ? 2000 : addTo(2000, findSmallNumber(rest));
  }
  const hundred = words.indexOf('hundred');
  if (hundred >= 1 && words[hundred - 1] === 'nineteen') {
    return addTo(1900, findSmallNumber(words.slice(hundred + 1)));
  }
  if (words.includes('thousand') && words.includes('nine') && hundred >= 0) {
    return addTo(1900, findSmallNumber(words.slice(hundred + 1)));
  }
  if (words[0] === 'nineteen' || words[0] === 'twenty') {
    const century = words[0] === 'nineteen' ? 1900 : 2000;
    return addTo(century, findSmallNumber(words.slice(1)));
  }
  return null;
}

function addTo(base: number, rest: number | null): number | null {
  return rest === null ? null : base + rest;
}
