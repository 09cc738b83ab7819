/** The words that speak for and against each kind of paper: data in `rules/vocabulary`, checked here. */
import { readFileSync, readdirSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { join } from 'node:path';
import { LineCounter, isMap, isNode, parseDocument } from 'yaml';
import { z } from 'zod';
import { classGroups, classIdSchema } from '../../contract/document-classes.ts';
import type { ClassId } from '../../contract/document-classes.ts';
import { splitTokens } from './tokens.ts';

export const tiers = ['title', 'strong', 'clear', 'weak', 'against'] as const;
export type Tier = (typeof tiers)[number];

const termSchema = z.union([z.string().min(1), z.number()]).transform(String);
const termsSchema = z.array(termSchema).default([]);
const classWordsSchema = z.strictObject({
  title: termsSchema,
  strong: termsSchema,
  clear: termsSchema,
  weak: termsSchema,
  against: termsSchema,
});
const fileSchema = z.strictObject({
  group: z.enum(classGroups),
  classes: z.partialRecord(classIdSchema, classWordsSchema),
});

export interface Term {
  classId: ClassId;
  tier: Tier;
  /** As written in the file, for people. */
  text: string;
  tokens: string[];
}

export interface Vocabulary {
  classIds: ClassId[];
  terms: Term[];
  /** Every word of every term, to tell a misread word from a known one. */
  words: ReadonlySet<string>;
}

/** A vocabulary file that cannot be used; the message names file and line. */
export class VocabularyError extends Error {
  override name = 'VocabularyError';
}

const defaultFolder = fileURLToPath(new URL('../../../rules/vocabulary', import.meta.url));
const cache = new Map<string, Vocabulary>();

/**
 * Reads one file's text.
 * @throws VocabularyError naming the file and the line of the first fault
 */
export function parseVocabularyFile(name: string, text: string): Term[] {
  const counter = new LineCounter();
  const document = parseDocument(text, { lineCounter: counter });
  const fault = document.errors[0];
  if (fault) {
    throw new VocabularyError(`${name}:${counter.linePos(fault.pos[0]).line}: ${fault.message}`);
  }
  const parsed = fileSchema.safeParse(document.toJS());
  if (!parsed.success) {
    const issue = parsed.error.issues[0];
    const path = (issue?.path ?? []).map((part) => (typeof part === 'symbol' ? '' : part));
    const line = findLine(document, path, counter);
    throw new VocabularyError(
      `${name}:${line}: ${path.join(' > ') || 'file'}: ${issue?.message ?? 'not a vocabulary'}`,
    );
  }
  const terms: Term[] = [];
  for (const id of classIdSchema.options) {
    const words = parsed.data.classes[id];
    if (!words) continue;
    for (const tier of tiers) {
      for (const term of words[tier]) {
        const tokens = splitTokens(term);
        if (tokens.length > 0) terms.push({ classId: id, tier, text: term, tokens });
      }
    }
  }
  return terms;
}

/** The line of the deepest part of the path that the file holds. */
function findLine(
  document: ReturnType<typeof parseDocument>,
  path: readonly (string | number)[],
  counter: LineCounter,
): number {
  for (let length = path.length; length > 0; length -= 1) {
    const parent: unknown =
      length > 1 ? document.getIn(path.slice(0, length - 1), true) : document.contents;
    if (isMap(parent)) {
      const pair = parent.items.find((item) => String(item.key) === String(path[length - 1]));
      if (pair && isNode(pair.key) && pair.key.range)
        return counter.linePos(pair.key.range[0]).line;
    }
    const node: unknown = document.getIn(path.slice(0, length), true);
    if (isNode(node) && node.range) return counter.linePos(node.range[0]).line;
  }
  return 1;
}

/**
 * All vocabulary files of a folder, read once. Without a folder: the product's own.
 * @throws VocabularyError when a file is not as it should be
 */
export function loadVocabulary(folder: string = defaultFolder): Vocabulary {
  const known = cache.get(folder);
  if (known) return known;
  const files = readdirSync(folder)
    .filter((name) => name.endsWith('.yaml'))
    .sort();
  const terms = files.flatMap((name) =>
    parseVocabularyFile(name, readFileSync(join(folder, name), 'utf8')),
  );
  const vocabulary: Vocabulary = {
    classIds: [...new Set(terms.map((term) => term.classId))],
    terms,
    words: new Set(terms.flatMap((term) => term.tokens)),
  };
  cache.set(folder, vocabulary);
  return vocabulary;
}
