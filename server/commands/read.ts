/**
 * `npm run --silent read -- [--country GB] [--region R] [--role R] [--on DAY] FILE…`: the whole reader and
 * the retention sum on files, without server or database. One JSON line a paper on standard output,
 * progress on standard error; a file that cannot be read prints its error and the exit status is 1.
 */
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { parseArgs } from 'node:util';
import { systemClock } from '../clock.ts';
import { caseRoleSchema, countrySchema, type CaseRole } from '../contract/cases.ts';
import { isoDateSchema } from '../contract/dates.ts';
import type { DateRole } from '../contract/readings.ts';
import { dateRoles } from '../contract/readings.ts';
import { createPageReader, type PageReader } from '../reading/page-reader.ts';
import { readPapers } from '../reading/papers.ts';
import { describeReadingError } from '../reading/pages/unreadable-file-error.ts';
import type { PageText, PaperReading } from '../reading/types.ts';
import { assess } from '../retention/assess.ts';
import { loadRuleTables } from '../rule-tables.ts';
import { caseInputsFromFacts } from '../use-cases/case-from-facts.ts';

const usage =
  'Usage: npm run --silent read -- [--country GB] [--region R] [--role R] [--on 2026-12-01] FILE…';

interface Request {
  country: string;
  region: string | null;
  role: CaseRole | null;
  on: string;
  files: string[];
}

type RuleTables = Awaited<ReturnType<typeof loadRuleTables>>;

function parseRequest(args: string[]): Request {
  const { values, positionals } = parseArgs({
    args,
    allowPositionals: true,
    options: {
      country: { type: 'string', default: 'GB' },
      region: { type: 'string' },
      role: { type: 'string' },
      on: { type: 'string' },
    },
  });
  const country = countrySchema.safeParse(values.country.toUpperCase());
  if (!country.success) throw new Error('Give --country as two letters, for example GB.');
  const role = caseRoleSchema.optional().safeParse(values.role);
  if (!role.success) {
    throw new Error(`Give --role as one of ${caseRoleSchema.options.join(', ')}.`);
  }
  const on = isoDateSchema.optional().safeParse(values.on);
  if (!on.success) throw new Error('Give --on as a day, for example 2026-12-01.');
  if (positionals.length === 0) throw new Error(usage);
  return {
    country: country.data,
    region: values.region ?? null,
    role: role.data ?? null,
    on: on.data ?? systemClock.todayIn(Intl.DateTimeFormat().resolvedOptions().timeZone),
    files: positionals,
  };
}

/** Reads all pages of a file; throws when one of them cannot be read. */
async function readPages(reader: PageReader, file: string): Promise<PageText[]> {
  const bytes = await readFile(file).catch(() => null);
  if (!bytes) throw new Error('There is no such file, or it may not be read.');
  const opened = await reader.open(bytes);
  try {
    let done = 0;
    return await Promise.all(
      Array.from({ length: opened.pageCount }, async (_, index) => {
        const page = await opened.readPage(index + 1);
        done++;
        if (opened.pageCount > 4) {
          process.stderr.write(`  page ${done} of ${opened.pageCount}, ${path.basename(file)}\n`);
        }
        return page;
      }),
    );
  } finally {
    opened.close();
  }
}

function describePaper(
  file: string,
  pages: PageText[],
  paper: PaperReading,
  request: Request,
  tables: RuleTables,
): object {
  const country = paper.country ?? request.country;
  const { facts } = paper;
  const inputs = caseInputsFromFacts(paper.class, country, facts, {
    ...(request.role ? { role: request.role } : {}),
    ...(request.region && country === request.country ? { region: request.region } : {}),
  });
  const answer = assess({ country, class: paper.class, on: request.on, inputs }, tables);
  const dates = Object.fromEntries(
    dateRoles.map((role: DateRole) => [role, facts.dates[role]?.value ?? null]),
  );
  return {
    file,
    fromPage: paper.from,
    toPage: paper.to,
    class: paper.class,
    confidence: roundConfidence(paper.confidence),
    candidates: paper.candidates.map(({ class: id, confidence, evidence }) => ({
      class: id,
      confidence: roundConfidence(confidence),
      evidence,
    })),
    country,
    dates,
    taxYear: facts.taxYear,
    keyDate: facts.keyDate,
    reference: facts.reference?.value ?? null,
    issuer: facts.issuer?.value ?? null,
    text: pages
      .filter((page) => page.number >= paper.from && page.number <= paper.to)
      .map((page) => page.text)
      .join('\n'),
    keepUntil: answer.keepUntil,
    shredFrom: answer.shredFrom,
    permanent: answer.permanent,
    open: answer.open,
    rule:
      (answer.rules.find((rule) => rule.keepUntil === answer.keepUntil) ?? answer.rules[0])?.id ??
      null,
  };
}

function roundConfidence(value: number): number {
  return Math.round(value * 1000) / 1000;
}

/** Reads the files in their order; true when all could be read. */
async function readFiles(request: Request): Promise<boolean> {
  const tables = loadRuleTables();
  const reader = createPageReader({ onFault: (detail) => process.stderr.write(`${detail}\n`) });
  let allRead = true;
  // The next file is opened and read while the last one's papers are worked out.
  const ahead = 3;
  const started = new Map<number, Promise<PageText[]>>();
  const start = (index: number) => {
    const file = request.files[index];
    if (file === undefined || started.has(index)) return;
    const pages = readPages(reader, file);
    pages.catch(() => undefined);
    started.set(index, pages);
  };
  for (const [index, file] of request.files.entries()) {
    for (let i = index; i < index + ahead; i++) start(i);
    process.stderr.write(`${index + 1} of ${request.files.length}: ${file}\n`);
    try {
      const pages = (await started.get(index)) ?? [];
      started.delete(index);
      for (const paper of readPapers(pages, { country: request.country })) {
        process.stdout.write(
          `${JSON.stringify(describePaper(file, pages, paper, request, tables))}\n`,
        );
      }
    } catch (error) {
      allRead = false;
      process.stdout.write(`${JSON.stringify({ file, error: nameError(error) })}\n`);
    }
  }
  await reader.close();
  return allRead;
}

function nameError(error: unknown): string {
  if (error instanceof Error && error.constructor === Error) return error.message;
  return describeReadingError(error);
}

try {
  const complete = await readFiles(parseRequest(process.argv.slice(2)));
  process.exitCode = complete ? 0 : 1;
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 2;
}
