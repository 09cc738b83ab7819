import type { Typeface } from './typeface.ts';

const ellipsis = '…';

/** One line no wider than `width` points, ended with an ellipsis where it was cut. */
export function fitText(face: Typeface, text: string, size: number, width: number): string {
  const clean = face.clean(text);
  if (face.measure(clean, size) <= width) return clean;
  const letters = [...clean];
  const cutAt = (count: number) => `${letters.slice(0, count).join('').trimEnd()}${ellipsis}`;
  // The longest beginning that fits lies between one that does and one that does not.
  let fits = 0;
  let tooLong = letters.length;
  while (tooLong - fits > 1) {
    const half = Math.floor((fits + tooLong) / 2);
    if (face.measure(cutAt(half), size) <= width) fits = half;
    else tooLong = half;
  }
  return fits === 0 ? '' : cutAt(fits);
}

/**
 * Text broken into lines no wider than `width` points. A word too long for a line is broken inside.
 * @param mostLines what does not fit in so many lines is cut with an ellipsis
 */
export function wrapText(
  face: Typeface,
  text: string,
  size: number,
  width: number,
  mostLines = Number.POSITIVE_INFINITY,
): string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of face.clean(text).split(' ')) {
    const joined = line ? `${line} ${word}` : word;
    if (face.measure(joined, size) <= width) {
      line = joined;
      continue;
    }
    if (line) lines.push(line);
    const pieces = breakWord(face, word, size, width);
    lines.push(...pieces.slice(0, -1));
    line = pieces.at(-1) ?? '';
  }
  if (line) lines.push(line);
  if (lines.length <= mostLines) return lines;
  const kept = lines.slice(0, mostLines);
  const last = `${kept.at(-1) ?? ''}${ellipsis}`;
  kept[mostLines - 1] = fitText(face, last, size, width);
  return kept;
}

/** Breaks after a dot, hyphen, slash, at sign or underscore where there is one, else between letters. */
function breakWord(face: Typeface, word: string, size: number, width: number): string[] {
  if (face.measure(word, size) <= width) return [word];
  const pieces: string[] = [];
  let piece = '';
  for (const part of word.split(/(?<=[-./@_])/)) {
    for (const fragment of face.measure(part, size) <= width ? [part] : part) {
      if (piece && face.measure(piece + fragment, size) > width) {
        pieces.push(piece);
        piece = fragment;
      } else {
        piece += fragment;
      }
    }
  }
  pieces.push(piece);
  return pieces;
}
