/** What a page says of its place: "page 2 of 3", "Sheet 2", a bare "2/3" at its edge. */
export interface PageMarker {
  page: number;
  /** How many pages there are, null where only the page's own number is printed. */
  of: number | null;
}

const figure = '(\\d{1,2}|[lI|])';
/** "of" as a reader of letters returns it. */
const joint = '(?:[o0]\\s?[o0]?f|\\/|von|de)';
const full = new RegExp(
  `\\b(?:pages?|pg|sheet|seite|leaf)\\b\\s*(?:no\\.?|number)?\\s*[:.]?\\s*${figure}\\s*${joint}\\s*${figure}(?![\\d/-])`,
  'i',
);
const glued = new RegExp(`\\bpage${figure}\\s*${joint}\\s*${figure}(?!\\d)`, 'i');
const bareFull = new RegExp(`^\\W*${figure}\\s*(?:of|0f|\\/)\\s*${figure}\\W*$`, 'i');
const single = /(?:^|\s|\W)(?:page|sheet|seite)\s*(?:no\.?|number)?\s*[:.]?\s*(\d{1,2})\W*$/i;
const bareSingle = /^[-–—]\s*(\d{1,2})\s*[-–—]$/;

function toNumber(text: string | undefined): number {
  return text === undefined ? Number.NaN : /^\d+$/.test(text) ? Number(text) : 1;
}

function toMarker(page: number, of: number | null): PageMarker | null {
  if (!(page >= 1) || page > 60) return null;
  if (of !== null && (!(of >= page) || of > 60)) return null;
  return { page, of };
}

/** The page's own number, null where it prints none. */
export function findPageMarker(lines: readonly string[]): PageMarker | null {
  for (const line of lines) {
    const match = full.exec(line) ?? glued.exec(line);
    const marker = match && toMarker(toNumber(match[1]), toNumber(match[2]));
    if (marker) return marker;
  }
  // The number may have been torn from its label: only the edges of the page count then.
  const edges = [...lines.slice(0, 4), ...lines.slice(-4)];
  for (const line of edges) {
    const match = bareFull.exec(line);
    const marker = match && toMarker(toNumber(match[1]), toNumber(match[2]));
    if (marker) return marker;
  }
  for (const line of edges) {
    const match = single.exec(line) ?? bareSingle.exec(line);
    const marker = match && toMarker(toNumber(match[1]), null);
    if (marker) return marker;
  }
  return null;
}
