/** Words as the classifier compares them: lower case, without accents, plurals and possessives. */

/** Lower case without accents. */
export function foldText(text: string): string {
  return text
    .toLowerCase()
    .normalize('NFD')
    .replace(/[\u0300-\u036f]/g, '')
    .replace(/ß/g, 'ss')
    .replace(/[’`´]/g, "'");
}

/** A word without possessive and plural ending; words of three letters stay as they are. */
export function stemWord(word: string): string {
  if (word.length <= 3 || !word.endsWith('s') || word.endsWith('ss')) return word;
  return word.slice(0, -1);
}

/** The words and figures of a text in order. */
export function splitTokens(text: string): string[] {
  const words = foldText(text)
    .replace(/'s?\b/g, '')
    .match(/[a-z0-9]+/g);
  return (words ?? []).map(stemWord);
}
