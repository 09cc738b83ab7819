/** Where the words of a vocabulary stand in a paper, also when letters were misread or words run together. */
import type { PaperLine } from '../facts/paper-lines.ts';
import { isWithinEdits } from '../facts/month-names.ts';
import { splitTokens } from './tokens.ts';
import type { Term, Vocabulary } from './vocabulary.ts';

export interface TermHit {
  term: Term;
  /** Whether it stands where headings stand: high on the first page, or in big letters. */
  inTitle: boolean;
  /** How often, counted up to three. */
  count: number;
}

interface IndexedPaper {
  /** For each token of the paper the words it may stand for. */
  tokens: string[][];
  positions: Map<string, number[]>;
  /** Whether the token stands in a heading. */
  inTitle: boolean[];
  glued: string;
  gluedTitle: string;
}

/** A line that reads as a heading: big letters, or few words near the top of the first page. */
function isTitleLine(line: PaperLine, order: number): boolean {
  if (line.relativeHeight >= 1.45 && line.page === 1) return true;
  const words = line.words.length;
  if (line.page !== 1 || words > 12) return false;
  if (order < 4) return true;
  const isLoud = line.text === line.text.toUpperCase() && /[A-Z]{4}/.test(line.text);
  return (line.box.y < 0.35 || order < 14) && (words <= 8 || isLoud);
}

function indexPaper(lines: readonly PaperLine[], vocabulary: Vocabulary): IndexedPaper {
  const tokens: string[][] = [];
  const inTitle: boolean[] = [];
  const near = new Map<string, string[]>();
  const byLength = groupByLength(vocabulary.words);
  let glued = '';
  let gluedTitle = '';
  lines.forEach((line, order) => {
    const isTitle = isTitleLine(line, order);
    for (const token of splitTokens(line.text)) {
      let meanings = near.get(token);
      if (!meanings) {
        meanings = [token, ...findNearWords(token, vocabulary.words, byLength)];
        near.set(token, meanings);
      }
      tokens.push(meanings);
      inTitle.push(isTitle);
      glued += token;
      if (isTitle) gluedTitle += token;
    }
  });
  const positions = new Map<string, number[]>();
  tokens.forEach((meanings, index) => {
    for (const word of meanings) {
      const list = positions.get(word);
      if (list) list.push(index);
      else positions.set(word, [index]);
    }
  });
  return { tokens, positions, inTitle, glued, gluedTitle };
}

function groupByLength(words: ReadonlySet<string>): Map<number, string[]> {
  const groups = new Map<number, string[]>();
  for (const word of words) {
    const list = groups.get(word.length);
    if (list) list.push(word);
    else groups.set(word.length, [word]);
  }
  return groups;
}

const digitLetters: Record<string, string> = {
  '0': 'o',
  '1': 'l',
  '5': 's',
  '8': 'b',
  '4': 'a',
  '6': 'g',
};

/** Words of the vocabulary that a misread word of six letters or more may have been. */
function findNearWords(
  token: string,
  known: ReadonlySet<string>,
  byLength: ReadonlyMap<number, string[]>,
): string[] {
  if (known.has(token)) return [];
  if (/^\d+$/.test(token) || token.length < 4) return [];
  const healed = token.replace(/[014568]/g, (digit) => digitLetters[digit] ?? digit);
  if (healed !== token && known.has(healed)) return [healed];
  const joined = healed.replace(/rn/g, 'm').replace(/vv/g, 'w').replace(/ii/g, 'u');
  if (joined !== token && known.has(joined)) return [joined];
  if (token.length < 6) return [];
  const limit = token.length >= 10 ? 2 : 1;
  const found: string[] = [];
  for (let length = token.length - limit; length <= token.length + limit; length += 1) {
    for (const word of byLength.get(length) ?? []) {
      if (word.length < 6) continue;
      if (word[0] !== healed[0] && word.at(-1) !== healed.at(-1)) continue;
      if (isWithinEdits(healed, word, limit)) found.push(word);
    }
  }
  return found.slice(0, 3);
}

function findTerm(term: Term, paper: IndexedPaper): { count: number; inTitle: boolean } {
  const [first] = term.tokens;
  let count = 0;
  let inTitle = false;
  for (const start of paper.positions.get(first ?? '') ?? []) {
    const fits = term.tokens.every((word, offset) => paper.tokens[start + offset]?.includes(word));
    if (!fits) continue;
    count += 1;
    if (paper.inTitle[start] && paper.inTitle[start + term.tokens.length - 1]) inTitle = true;
  }
  if (count === 0) {
    const glue = term.tokens.join('');
    if (glue.length >= 11 && paper.glued.includes(glue)) {
      return { count: 1, inTitle: paper.gluedTitle.includes(glue) };
    }
  }
  return { count, inTitle };
}

/** The terms of the vocabulary that stand in the paper. */
export function findTermHits(lines: readonly PaperLine[], vocabulary: Vocabulary): TermHit[] {
  const paper = indexPaper(lines, vocabulary);
  const hits: TermHit[] = [];
  for (const term of vocabulary.terms) {
    const { count, inTitle } = findTerm(term, paper);
    if (count > 0) hits.push({ term, inTitle, count: Math.min(count, 3) });
  }
  return hits;
}
