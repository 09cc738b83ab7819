/** Words as they are compared: case folded, quotes and dashes made alike, outer punctuation gone. */
export function listWords(text: string): string[] {
  return text
    .normalize('NFKC')
    .replace(/[‘’]/g, "'")
    .replace(/[“”]/g, '"')
    .replace(/[–—]/g, '-')
    .toLowerCase()
    .split(/\s+/)
    .map((word) => word.replace(/^[^\p{L}\p{N}]+|[^\p{L}\p{N}]+$/gu, ''))
    .filter((word) => word !== '');
}

/** How many of the wanted words were found, each as often as it stands there; order does not matter. */
export function countFound(wanted: string[], found: string[]): number {
  const left = new Map<string, number>();
  for (const word of found) left.set(word, (left.get(word) ?? 0) + 1);
  let hits = 0;
  for (const word of wanted) {
    const count = left.get(word) ?? 0;
    if (count === 0) continue;
    left.set(word, count - 1);
    hits++;
  }
  return hits;
}
