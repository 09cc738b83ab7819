/**
 * `npm run bench:reader -- TRUTH.json [--rounds 3] [--files 12] [--dpi 300] [--set photos]`: the same pages
 * through the product's reader and through `pdftoppm -gray` and `tesseract` (two processes,
 * OMP_THREAD_LIMIT=1), in turn, several rounds. Writes nothing but its own temporary folder.
 */
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { parseArgs } from 'node:util';
import { createPageReader, type PageReader } from '../reading/page-reader.ts';
import { readByPeer } from './measuring/peer-reader.ts';
import { findMedian } from '../reading/facts/paper-lines.ts';
import { loadTruth, type Truth } from './measuring/truth.ts';
import { countFound, listWords } from './measuring/words.ts';

interface BenchFile {
  file: string;
  wanted: string[];
}

interface Round {
  seconds: number;
  cpuSeconds: number;
  peakMegabytes: number;
  words: number;
  digits: number;
}

const { values, positionals } = parseArgs({
  args: process.argv.slice(2),
  allowPositionals: true,
  options: {
    rounds: { type: 'string', default: '3' },
    files: { type: 'string', default: '12' },
    dpi: { type: 'string', default: '300' },
    set: { type: 'string' },
  },
});

/** Mixed piles, feeder scans and phone photos; handwriting is left out where a file stands alone. */
function listSets(truth: Truth, folder: string, most: number): Map<string, BenchFile[]> {
  const words = (pages: string[][] | null | undefined) => listWords((pages ?? []).flat().join(' '));
  const alone = (quality: string) =>
    truth.documents
      .filter((item) => item.quality === quality && !item.handwritten && item.text)
      .slice(0, most)
      .map((item) => ({ file: path.join(folder, item.file), wanted: words(item.text) }));
  return new Map([
    [
      'piles',
      truth.stacks.map((stack) => ({
        file: path.join(folder, stack.file),
        wanted: stack.documents.flatMap((paper) => words(paper.text)),
      })),
    ],
    ['scans', alone('scan-200-grey')],
    ['photos', alone('phone-photo')],
  ]);
}

async function readByProduct(
  files: readonly BenchFile[],
): Promise<{ texts: Map<string, string>; pages: number; peakMegabytes: number }> {
  const reader = createPageReader({ workers: 2 });
  const texts = new Map<string, string>();
  let pages = 0;
  let peakMegabytes = 0;
  const watch = setInterval(() => {
    peakMegabytes = Math.max(peakMegabytes, process.memoryUsage.rss() / 1024 / 1024);
  }, 40);
  const queue = files.map(({ file }) => file);
  const work = async () => {
    for (let file = queue.shift(); file !== undefined; file = queue.shift()) {
      const texted = await readPagesOf(reader, file);
      pages += texted.length;
      texts.set(file, texted.join('\n'));
    }
  };
  try {
    await Promise.all([work(), work(), work()]);
  } finally {
    clearInterval(watch);
    await reader.close();
  }
  return { texts, pages, peakMegabytes };
}

async function readPagesOf(reader: PageReader, file: string): Promise<string[]> {
  const opened = await reader.open(await readFile(file));
  try {
    const pages = await Promise.all(
      Array.from({ length: opened.pageCount }, (_, index) => opened.readPage(index + 1)),
    );
    return pages.map((page) => page.text);
  } finally {
    opened.close();
  }
}

function measureRecall(files: readonly BenchFile[], texts: ReadonlyMap<string, string>) {
  const sums = { words: 0, wanted: 0, digits: 0, wantedDigits: 0 };
  for (const { file, wanted } of files) {
    const found = listWords(texts.get(file) ?? '');
    const hasDigit = (word: string) => /\d/.test(word);
    sums.words += countFound(wanted, found);
    sums.wanted += wanted.length;
    sums.digits += countFound(wanted.filter(hasDigit), found.filter(hasDigit));
    sums.wantedDigits += wanted.filter(hasDigit).length;
  }
  return { words: sums.words / sums.wanted, digits: sums.digits / Math.max(1, sums.wantedDigits) };
}

function print(line: string): void {
  process.stdout.write(`${line}\n`);
}

function describe(name: string, rounds: readonly Round[], pages: number): number {
  const median = (pick: (round: Round) => number) => findMedian(rounds.map(pick));
  const speed = (60 * pages) / median((round) => round.seconds);
  print(
    `  ${name.padEnd(9)} ${speed.toFixed(1).padStart(6)} pages/min  ` +
      `${(median((round) => round.cpuSeconds) / pages).toFixed(2).padStart(5)} CPU s/page  ` +
      `${median((round) => round.peakMegabytes)
        .toFixed(0)
        .padStart(4)} MB  ` +
      `words ${(100 * median((round) => round.words)).toFixed(1)} %  ` +
      `with digits ${(100 * median((round) => round.digits)).toFixed(1)} %`,
  );
  return median((round) => round.cpuSeconds);
}

async function benchSet(name: string, files: readonly BenchFile[], rounds: number, dpi: number) {
  const ours: Round[] = [];
  const theirs: Round[] = [];
  let pages = 0;
  for (let round = 1; round <= rounds; round++) {
    process.stderr.write(`${name}: round ${round} of ${rounds}\n`);
    const before = process.cpuUsage();
    let startedAt = performance.now();
    const own = await readByProduct(files);
    const spent = process.cpuUsage(before);
    pages = own.pages;
    ours.push({
      seconds: (performance.now() - startedAt) / 1000,
      cpuSeconds: (spent.user + spent.system) / 1e6,
      peakMegabytes: own.peakMegabytes,
      ...measureRecall(files, own.texts),
    });
    startedAt = performance.now();
    const peer = await readByPeer(
      files.map(({ file }) => file),
      dpi,
    );
    theirs.push({
      seconds: (performance.now() - startedAt) / 1000,
      ...peer.use,
      ...measureRecall(files, peer.texts),
    });
  }
  print(`\n${name}: ${files.length} files, ${pages} pages, median of ${rounds} rounds`);
  const own = describe('product', ours, pages);
  const peer = describe('commands', theirs, pages);
  const wall = ours.map((round, index) => (theirs[index]?.seconds ?? 0) / round.seconds);
  print(
    `  ratio     ${findMedian(wall).toFixed(2)} in pages/min, ${(peer / own).toFixed(2)} in CPU time (above 1 the product is faster)`,
  );
}

try {
  const [truthFile] = positionals;
  const rounds = Number(values.rounds);
  const most = Number(values.files);
  const dpi = Number(values.dpi);
  if (!truthFile || !(rounds >= 1) || !(most >= 1) || !(dpi >= 72)) {
    throw new Error(
      'Usage: npm run bench:reader -- TRUTH.json [--rounds 3] [--files 12] [--dpi 300] [--set piles|scans|photos]',
    );
  }
  const truth = await loadTruth(truthFile);
  for (const [name, files] of listSets(truth, path.dirname(truthFile), most)) {
    if (files.length === 0 || (values.set !== undefined && values.set !== name)) continue;
    await benchSet(name, files, rounds, dpi);
  }
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 2;
}
