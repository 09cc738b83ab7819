/** Mending word breaks by the white that really stands between letters. */
import type { SeenSymbol, SeenWord } from './engine.ts';

/** Shares of the letter height: white wider than this parts words, narrower than that joins them. */
const PART_AT = 0.42;
const JOIN_AT = 0.16;
/** Letters with white of their own around them need more before they part. */
const slim = /[1iIl.,:;'’"“”!|/()[\]-]/;

/**
 * Parts words that were run together (`6in1`) and joins those that were torn apart (`f irm`), line by
 * line. `letterHeight` is the typical height of letters in pixels of the picture that was read. Evenly
 * spaced type with wide gaps between all letters is left alone.
 */
export function mendSpacing(words: SeenWord[], letterHeight: number): SeenWord[] {
  const lines = new Map<string, SeenWord[]>();
  for (const word of words) {
    const line = lines.get(word.line);
    if (line) line.push(word);
    else lines.set(word.line, [word]);
  }
  return [...lines.values()].flatMap((line) =>
    joinTorn(partGlued(line, letterHeight)).flatMap(partSmallWords),
  );
}

/** Small words that tight print runs together, and no word is spelled so. */
const glued =
  /^(of|to|in|is|and|for|by|on|at|with)(the|this|that|any|all|one|your|our|January|February|March|April|June|July|August|September|October|November|December)$/i;

function partSmallWords(word: SeenWord): SeenWord[] {
  const match = glued.exec(word.text);
  const lead = match?.[1]?.length;
  if (lead === undefined || word.symbols.map((symbol) => symbol.text).join('') !== word.text) {
    return [word];
  }
  // "Atone" is a word of its own.
  if (/^atone$/i.test(word.text)) return [word];
  return [makeWord(word, word.symbols.slice(0, lead)), makeWord(word, word.symbols.slice(lead))];
}

function partGlued(line: SeenWord[], letterHeight: number): SeenWord[] {
  const gaps = line.flatMap((word) => listGaps(word.symbols)).sort((a, b) => a - b);
  const usual = gaps[gaps.length >> 1] ?? 0;
  return line.flatMap((word) => {
    const height = Math.max(letterHeight * 0.7, Math.min(letterHeight * 3, word.height * 0.8));
    return partWord(word, Math.max(PART_AT * height, usual * 2.6));
  });
}

function listGaps(symbols: SeenSymbol[]): number[] {
  const gaps: number[] = [];
  for (let i = 1; i < symbols.length; i++) gaps.push(symbols[i]!.left - symbols[i - 1]!.right);
  return gaps.filter((gap) => gap >= 0);
}

function partWord(word: SeenWord, room: number): SeenWord[] {
  const { symbols } = word;
  if (symbols.map((symbol) => symbol.text).join('') !== word.text) return [word];
  const pieces: SeenSymbol[][] = [[]];
  symbols.forEach((symbol, index) => {
    const before = symbols[index - 1];
    if (before) {
      const needed = slim.test(before.text) || slim.test(symbol.text) ? room * 1.45 : room;
      if (symbol.left - before.right >= needed) pieces.push([]);
    }
    pieces.at(-1)?.push(symbol);
  });
  if (pieces.length === 1) return [word];
  return pieces.map((piece) => makeWord(word, piece));
}

function makeWord(word: SeenWord, symbols: SeenSymbol[]): SeenWord {
  const left = Math.min(...symbols.map((symbol) => symbol.left));
  const right = Math.max(...symbols.map((symbol) => symbol.right));
  const text = symbols.map((symbol) => symbol.text).join('');
  return { ...word, text, left, width: Math.max(1, right - left), symbols };
}

function joinTorn(line: SeenWord[]): SeenWord[] {
  const out: SeenWord[] = [];
  for (const word of line) {
    const before = out.at(-1);
    const gap = before ? word.left - (before.left + before.width) : Infinity;
    const height = Math.min(before?.height ?? 0, word.height);
    if (before && gap > -height && gap < JOIN_AT * height && belong(before, word)) {
      out[out.length - 1] = joinWords(before, word);
    } else out.push(word);
  }
  return out;
}

/** Letters or digits on both sides of the tear; a mark beside a word is left where it is. */
function belong(before: SeenWord, word: SeenWord): boolean {
  return /[\p{L}\p{N}]$/u.test(before.text) && /^[\p{L}\p{N}]/u.test(word.text);
}

function joinWords(before: SeenWord, word: SeenWord): SeenWord {
  const top = Math.min(before.top, word.top);
  const bottom = Math.max(before.top + before.height, word.top + word.height);
  const weight = before.text.length + word.text.length;
  return {
    ...before,
    text: before.text + word.text,
    top,
    height: bottom - top,
    width: word.left + word.width - before.left,
    confidence:
      (before.confidence * before.text.length + word.confidence * word.text.length) / weight,
    symbols: [...before.symbols, ...word.symbols],
  };
}
