/** Reads and checks the rule tables once at start. A fault is told with file, line and column. */
import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { LineCounter, parseDocument } from 'yaml';
import type { Document } from 'yaml';
import type { z } from 'zod';
import type { IsoDate } from './contract/dates.ts';
import { classIds } from './contract/document-classes.ts';
import { findOverdueReviews, findTableFaults } from './retention/check-tables.ts';
import type { TableFault } from './retention/check-tables.ts';
import { buildRuleSet } from './retention/rule-set.ts';
import type { RuleSet } from './retention/rule-set.ts';
import { handlingSchema, ruleTableSchema } from './retention/rule-schema.ts';
import type { Handling, RuleTable } from './retention/rule-schema.ts';

const shippedFolder = fileURLToPath(new URL('../rules', import.meta.url));
const handlingFile = 'handling.yaml';
const missingCommon =
  'The common rule table is missing or cannot be read; the tables were not held against each other.';

export interface RuleFault {
  readonly file: string;
  readonly line: number;
  readonly column: number;
  readonly message: string;
}

/** Thrown when a table cannot be relied on; `faults` lists every one of them. */
export class RuleTableError extends Error {
  readonly faults: readonly RuleFault[];

  constructor(faults: readonly RuleFault[]) {
    super(`The rule tables have faults:\n${faults.map(writeFault).join('\n')}`);
    this.name = 'RuleTableError';
    this.faults = faults;
  }
}

/** A fault in one line: `gb.yaml:12:7 message`. */
export function writeFault(fault: RuleFault): string {
  return `${fault.file}:${fault.line}:${fault.column} ${fault.message}`;
}

interface ParsedFile {
  readonly file: string;
  readonly document: Document;
  readonly lines: LineCounter;
}

/** Line and column of the node at a path, or of the nearest node above it. */
function locate(
  parsed: ParsedFile,
  where: readonly PropertyKey[],
): { line: number; column: number } {
  for (let length = where.length; length >= 0; length -= 1) {
    const node: unknown =
      length === 0 ? parsed.document.contents : parsed.document.getIn(where.slice(0, length), true);
    if (node && typeof node === 'object' && 'range' in node && Array.isArray(node.range)) {
      const { line, col } = parsed.lines.linePos(Number(node.range[0]));
      return { line, column: col };
    }
  }
  return { line: 1, column: 1 };
}

function faultAt(parsed: ParsedFile, where: readonly PropertyKey[], message: string): RuleFault {
  return { file: parsed.file, ...locate(parsed, where), message };
}

/** The parser's first line, ended like a sentence. */
function describeSyntax(message: string): string {
  const first = message.split('\n')[0] ?? '';
  return `This is not YAML: ${first.replace(/[:.\s]+$/, '')}.`;
}

function describeIssue(issue: z.core.$ZodIssue, value: unknown): string {
  const field = issue.path.map(String).join('.') || 'the table';
  if (issue.code === 'invalid_value' && issue.path.includes('classes')) {
    return `Unknown class ${JSON.stringify(value)} in ${field}; use an id of the class list.`;
  }
  if (issue.code === 'invalid_value' && value !== undefined) {
    const known = issue.values.map(String);
    const list = known.length > 16 ? `one of the ${known.length} known ones` : known.join(', ');
    return `Unknown value ${JSON.stringify(value)} in ${field}; use ${list}.`;
  }
  if (issue.code === 'unrecognized_keys') {
    return `Unknown key ${issue.keys.map((key) => `"${key}"`).join(', ')} in ${field}; remove it or correct its name.`;
  }
  if (value === undefined) return `${field} is missing.`;
  return `${field}: ${issue.message.replace(/\.$/, '')}.`;
}

function valueAt(root: unknown, where: readonly PropertyKey[]): unknown {
  let value = root;
  for (const key of where) {
    if (typeof value !== 'object' || value === null) return undefined;
    value = (value as Record<PropertyKey, unknown>)[key];
  }
  return value;
}

function parseFile<T>(
  file: string,
  text: string,
  schema: z.ZodType<T>,
  faults: RuleFault[],
): { parsed: ParsedFile; data: T } | null {
  const lines = new LineCounter();
  const document = parseDocument(text, { lineCounter: lines, version: '1.2', merge: true });
  const parsed = { file, document, lines };
  for (const error of document.errors) {
    const { line, col } = lines.linePos(error.pos[0]);
    faults.push({ file, line, column: col, message: describeSyntax(error.message) });
  }
  if (document.errors.length > 0) return null;
  const raw: unknown = document.toJS();
  const result = schema.safeParse(raw);
  if (result.success) return { parsed, data: result.data };
  for (const issue of result.error.issues) {
    faults.push(faultAt(parsed, issue.path, describeIssue(issue, valueAt(raw, issue.path))));
  }
  return null;
}

export interface CheckedTables {
  readonly tables: RuleTable[];
  readonly handling: Handling;
  /** Hash of the content of all files, 16 hex digits. */
  readonly version: string;
  readonly faults: RuleFault[];
}

/** Reads a folder of tables and finds every fault; review dates are judged against `on` when given. */
export function checkRuleTables(folder = shippedFolder, on: IsoDate | null = null): CheckedTables {
  const faults: RuleFault[] = [];
  const hash = createHash('sha256');
  const files: ParsedFile[] = [];
  const tables: RuleTable[] = [];
  let handling: Handling | null = null;
  const names = readdirSync(folder)
    .filter((name) => name.endsWith('.yaml'))
    .sort();
  if (names.length === 0) throw new Error(`There are no rule tables in ${folder}.`);
  for (const name of names) {
    const text = readFileSync(path.join(folder, name), 'utf8');
    hash.update(name).update('\0').update(text).update('\0');
    if (name === handlingFile) {
      handling = parseFile(name, text, handlingSchema, faults)?.data ?? null;
      continue;
    }
    const result = parseFile(name, text, ruleTableSchema, faults);
    if (!result) continue;
    files.push(result.parsed);
    tables.push(result.data);
  }
  const tell = (fault: TableFault): void => {
    const parsed = files[fault.table];
    if (parsed) faults.push(faultAt(parsed, fault.path, fault.message));
  };
  // Without the common table every country would seem to leave gaps.
  if (tables.some((table) => table.country === 'common')) findTableFaults(tables).forEach(tell);
  else faults.push({ file: 'common.yaml', line: 1, column: 1, message: missingCommon });
  const known = handling?.classes;
  const unhandled = known ? classIds.filter((id) => !known[id]) : [];
  if (unhandled.length > 0) {
    const message = `Nothing says how these leave: ${unhandled.join(', ')}. Give each a level and a disposal.`;
    faults.push({ file: handlingFile, line: 1, column: 1, message });
  }
  if (on) findOverdueReviews(tables, on).forEach(tell);
  return {
    tables,
    handling: handling ?? { classes: {} },
    version: hash.digest('hex').slice(0, 16),
    faults,
  };
}

/** The rule tables of a folder, by default the shipped one; throws RuleTableError when they have faults. */
export function loadRuleTables(folder = shippedFolder): RuleSet {
  const { tables, handling, version, faults } = checkRuleTables(folder);
  if (faults.length > 0) throw new RuleTableError(faults);
  return buildRuleSet(tables, handling, version);
}
