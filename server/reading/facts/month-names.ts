/** Months as words in the languages of the papers, and how to recognise one that was misread. */

const monthWords: Record<string, number> = {};

function addMonths(names: readonly (readonly string[])[]): void {
  names.forEach((variants, index) => {
    for (const variant of variants) monthWords[variant] = index + 1;
  });
}

addMonths([
  ['january', 'jan'],
  ['february', 'feb'],
  ['march', 'mar'],
  ['april', 'apr'],
  ['may'],
  ['june', 'jun'],
  ['july', 'jul'],
  ['august', 'aug'],
  ['september', 'sept', 'sep'],
  ['october', 'oct'],
  ['november', 'nov'],
  ['december', 'dec'],
]);
addMonths([
  ['eanáir', 'eanair', 'ean'],
  ['feabhra', 'feabh', 'feab'],
  ['márta', 'marta'],
  ['aibreán', 'aibrean', 'aib'],
  ['bealtaine', 'beal'],
  ['meitheamh', 'meith'],
  ['iúil', 'iuil'],
  ['lúnasa', 'lunasa'],
  ['meán fómhair'],
  ['deireadh fómhair'],
  ['samhain', 'samh'],
  ['nollaig', 'noll'],
]);
addMonths([
  ['januar', 'jänner'],
  ['februar'],
  ['märz', 'maerz', 'marz'],
  [],
  ['mai'],
  ['juni'],
  ['juli'],
  [],
  [],
  ['oktober', 'okt'],
  [],
  ['dezember', 'dez'],
]);
addMonths([
  ['janvier', 'janv'],
  ['février', 'fevrier', 'fév', 'fev', 'févr'],
  ['mars'],
  ['avril', 'avr'],
  [],
  ['juin'],
  ['juillet', 'juil'],
  ['août', 'aout'],
  ['septembre'],
  ['octobre'],
  ['novembre'],
  ['décembre', 'decembre', 'déc'],
]);

const longNames = Object.keys(monthWords).filter((name) => name.length >= 5);

/** Whether two words differ by at most `limit` letters put in, left out or changed. */
export function isWithinEdits(a: string, b: string, limit: number): boolean {
  if (a === b) return true;
  if (Math.abs(a.length - b.length) > limit) return false;
  let previous = Array.from({ length: b.length + 1 }, (_, index) => index);
  for (let i = 1; i <= a.length; i += 1) {
    const current = [i];
    let best = i;
    for (let j = 1; j <= b.length; j += 1) {
      const cost = a[i - 1] === b[j - 1] ? 0 : 1;
      const value = Math.min(
        (previous[j] ?? 0) + 1,
        (current[j - 1] ?? 0) + 1,
        (previous[j - 1] ?? 0) + cost,
      );
      current.push(value);
      if (value < best) best = value;
    }
    if (best > limit) return false;
    previous = current;
  }
  return (previous[b.length] ?? limit + 1) <= limit;
}

/** Month 1 to 12 of a word, also when a letter was misread; null when it is no month. */
export function findMonth(word: string): number | null {
  const plain = word
    .toLowerCase()
    .replace(/[.,]/g, '')
    .replace(/0/g, 'o')
    .replace(/[1|!]/g, 'l')
    .replace(/5/g, 's');
  const exact = monthWords[plain];
  if (exact !== undefined) return exact;
  if (plain.startsWith('l')) {
    const withI = monthWords[`j${plain.slice(1)}`];
    if (withI !== undefined) return withI;
  }
  const healed = monthWords[plain.replace(/rn/g, 'm')];
  if (healed !== undefined) return healed;
  if (plain.length < 5) return null;
  const near = longNames.filter((name) =>
    isWithinEdits(plain.replace(/rn/g, 'm'), name, name.length >= 7 ? 2 : 1),
  );
  const months = new Set(near.map((name) => monthWords[name]));
  const [only] = [...months];
  return months.size === 1 && only !== undefined ? only : null;
}
