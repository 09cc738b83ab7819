/**
 * `npm run measure:reader -- TRUTH.json [--only QUALITY] [--limit N] [--mistakes]`: reads all documents and
 * piles named there and prints how much was right. Writes nothing.
 */
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { parseArgs } from 'node:util';
import { createPageReader, type PageReader } from '../reading/page-reader.ts';
import { describeReadingError } from '../reading/pages/unreadable-file-error.ts';
import { readPapers } from '../reading/papers.ts';
import type { PageText } from '../reading/types.ts';
import {
  addPaper,
  scoreDuplicates,
  startDuplicateCheck,
  type DuplicateCheck,
} from './measuring/score-duplicates.ts';
import {
  scoreBoundaries,
  scorePaper,
  scoreWords,
  startScores,
  type Scores,
} from './measuring/score-papers.ts';
import { describeCount, type Tally } from './measuring/tally.ts';
import { loadTruth, type TrueDocument, type TrueStack, type Truth } from './measuring/truth.ts';

interface Settings {
  truthFile: string;
  only: string | null;
  limit: number;
  showMistakes: boolean;
}

function parseSettings(args: string[]): Settings {
  const { values, positionals } = parseArgs({
    args,
    allowPositionals: true,
    options: {
      only: { type: 'string' },
      limit: { type: 'string' },
      mistakes: { type: 'boolean', default: false },
    },
  });
  const [truthFile] = positionals;
  if (!truthFile) {
    throw new Error(
      'Usage: npm run measure:reader -- TRUTH.json [--only scan-200-grey] [--limit 10] [--mistakes]',
    );
  }
  const limit = values.limit === undefined ? Infinity : Number(values.limit);
  if (!(limit > 0)) throw new Error('Give --limit as a number of files.');
  return { truthFile, only: values.only ?? null, limit, showMistakes: values.mistakes };
}

interface Measured {
  scores: Scores;
  copies: DuplicateCheck;
}

async function readPages(reader: PageReader, file: string): Promise<PageText[]> {
  const opened = await reader.open(await readFile(file));
  try {
    return await Promise.all(
      Array.from({ length: opened.pageCount }, (_, index) => opened.readPage(index + 1)),
    );
  } finally {
    opened.close();
  }
}

function scoreDocument(
  { scores, copies }: Measured,
  document: TrueDocument,
  pages: PageText[],
  country: string,
) {
  const readings = readPapers(pages, { country });
  scorePaper(scores, document.file, document.quality, document, readings[0] ?? null);
  if (readings.length > 1) {
    scores.mistakes.push(`${document.file}: one paper, read as ${readings.length}`);
  }
  scoreWords(scores, document.quality, document, pages);
  const { file, household, duplicateOf } = document;
  addPaper(copies, file, household, pages, readings[0] ?? null, duplicateOf);
}

function scoreStack(
  { scores, copies }: Measured,
  stack: TrueStack,
  pages: PageText[],
  country: string,
) {
  const readings = readPapers(pages, { country });
  scoreBoundaries(scores, stack, readings);
  const quality = `pile ${stack.quality}`;
  for (const paper of stack.documents) {
    const reading = readings.find((candidate) => candidate.from === paper.from) ?? null;
    scorePaper(scores, `${stack.file} page ${paper.from}`, quality, paper, reading);
    const own = pages.filter((page) => page.number >= paper.from && page.number <= paper.to);
    scoreWords(scores, quality, paper, own);
    const name = `${stack.file}#${paper.from}`;
    addPaper(copies, name, stack.household, own, reading, paper.duplicateOf);
  }
}

async function measure(settings: Settings, truth: Truth): Promise<Measured> {
  const measured: Measured = { scores: startScores(), copies: startDuplicateCheck() };
  const { scores } = measured;
  const folder = path.dirname(settings.truthFile);
  const items = [...truth.documents, ...truth.stacks]
    .filter((item) => settings.only === null || item.quality === settings.only)
    .slice(0, settings.limit);
  const reader = createPageReader({ onFault: (detail) => process.stderr.write(`${detail}\n`) });
  const queue = [...items];
  const startedAt = performance.now();
  let pageCount = 0;
  const work = async () => {
    for (let item = queue.shift(); item; item = queue.shift()) {
      try {
        const pages = await readPages(reader, path.join(folder, item.file));
        pageCount += pages.length;
        const country = truth.households[item.household]?.country ?? 'GB';
        if ('documents' in item) scoreStack(measured, item, pages, country);
        else scoreDocument(measured, item, pages, country);
      } catch (error) {
        scores.mistakes.push(`${item.file}: ${describeReadingError(error)}`);
        if (!('documents' in item)) scorePaper(scores, item.file, item.quality, item, null);
      }
      process.stderr.write(`${items.length - queue.length} of ${items.length}: ${item.file}\n`);
    }
  };
  await Promise.all([work(), work(), work()]);
  await reader.close();
  const seconds = (performance.now() - startedAt) / 1000;
  print(`${items.length} files, ${pageCount} pages, ${seconds.toFixed(0)} s`);
  return measured;
}

function print(line: string): void {
  process.stdout.write(`${line}\n`);
}

function printTally(title: string, tally: Tally): void {
  print(`\n${title}`);
  let right = 0;
  let of = 0;
  for (const name of [...tally.counts.keys()].sort()) {
    const count = tally.counts.get(name) ?? { right: 0, of: 0 };
    right += count.right;
    of += count.of;
    print(`  ${name.padEnd(26)} ${describeCount(count)}`);
  }
  if (tally.counts.size > 1) print(`  ${'all'.padEnd(26)} ${describeCount({ right, of })}`);
}

function printDuplicates(copies: DuplicateCheck, scores: Scores): void {
  const { right, wanted, falsePairs, missed } = scoreDuplicates(copies);
  if (wanted === 0 && falsePairs.length === 0) return;
  print('\nCopies of one paper within a household');
  print(`  ${'found'.padEnd(26)} ${describeCount({ right, of: wanted })}`);
  print(`  ${'false pairs'.padEnd(26)} ${String(falsePairs.length).padStart(5)}`);
  scores.mistakes.push(
    ...missed.map((pair) => `copies not found: ${pair}`),
    ...falsePairs.map((pair) => `no copies: ${pair}`),
  );
}

function printScores({ scores, copies }: Measured, showMistakes: boolean): void {
  printTally('Class right, by quality', scores.classes);
  printTally('Class right, by group', scores.groups);
  printTally('Class right, by confidence', scores.reliability);
  const { sure } = scores;
  print('\nAt confidence 0.8 or more');
  print(`  ${'covered'.padEnd(26)} ${describeCount({ right: sure.of, of: sure.all })}`);
  print(`  ${'right of those'.padEnd(26)} ${describeCount({ right: sure.right, of: sure.of })}`);
  printTally('Key date right, by quality', scores.keyDates);
  printTally('Expiry right', scores.expiries);
  printTally('Country right', scores.countries);
  printTally('Printed words found, by quality (handwriting left out)', scores.words);
  const { right, found, wanted } = scores.boundaries;
  if (wanted > 0) {
    print('\nPile boundaries');
    print(`  ${'precision'.padEnd(26)} ${describeCount({ right, of: found })}`);
    print(`  ${'recall'.padEnd(26)} ${describeCount({ right, of: wanted })}`);
    print(`  ${'F1'.padEnd(26)} ${((2 * right) / Math.max(1, found + wanted)).toFixed(3)}`);
  }
  printDuplicates(copies, scores);
  if (showMistakes && scores.mistakes.length > 0) {
    print('\nMistakes');
    for (const mistake of [...scores.mistakes].sort()) print(`  ${mistake}`);
  }
}

try {
  const settings = parseSettings(process.argv.slice(2));
  printScores(await measure(settings, await loadTruth(settings.truthFile)), settings.showMistakes);
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 2;
}
