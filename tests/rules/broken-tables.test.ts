/** Every broken table is refused with the words at its head, at the place where the fault is. */
import { cpSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { checkRuleTables, loadRuleTables, writeFault } from '../../server/rule-tables.ts';

const here = path.dirname(fileURLToPath(import.meta.url));
const brokenFolder = path.join(here, 'broken');
const shippedFolder = path.join(here, '../../rules');
const today = '2026-12-01';

const files = readdirSync(brokenFolder).filter((name) => name.endsWith('.yaml'));

/** The faults of the shipped tables when a broken one stands in for one of them. */
function checkWith(name: string, text: string): string[] {
  const folder = mkdtempSync(path.join(tmpdir(), 'tables-'));
  try {
    cpSync(shippedFolder, folder, { recursive: true });
    if (name === 'handling.yaml') rmSync(path.join(folder, 'handling.yaml'));
    else rmSync(path.join(folder, 'gb.yaml'));
    writeFileSync(path.join(folder, name), text);
    return checkRuleTables(folder, today).faults.map(writeFault);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** A table of one rule leaves gaps; only the one that is about gaps is asked about them. */
const isGap = (fault: string): boolean => fault.includes('leaves a gap: no rule for');

describe('broken tables', () => {
  it('are there', () => {
    expect(files.length).toBeGreaterThan(25);
  });

  it.each(files)('%s is refused with its words, and for nothing else', (name) => {
    const text = readFileSync(path.join(brokenFolder, name), 'utf8');
    const words = [...text.matchAll(/^# says: (.+)$/gm)].map((match) => match[1] ?? '');
    expect(words.length).toBeGreaterThan(0);
    const faults = checkWith(name, text);
    const meant = name.startsWith('gap-of-classes') ? faults : faults.filter((f) => !isGap(f));
    expect(meant, faults.join('\n')).toHaveLength(1);
    for (const word of words) expect(meant[0]).toContain(word);
    expect(meant[0]).toMatch(new RegExp(`^${name}:\\d+:\\d+ .+[.]$`));
  });

  it('points at the line and column of the fault', () => {
    const place = (name: string): string => {
      const text = readFileSync(path.join(brokenFolder, name), 'utf8');
      const fault = checkWith(name, text).find((entry) => !isGap(entry)) ?? '';
      const [, line = '1', column = '1'] = /^[^:]+:(\d+):(\d+) /.exec(fault) ?? [];
      return text.split('\n')[Number(line) - 1]?.slice(Number(column) - 1) ?? '';
    };
    expect(place('unknown-class.yaml')).toMatch(/^parchment\]/);
    expect(place('zero-period.yaml')).toMatch(/^P0Y/);
    expect(place('foreign-source.yaml')).toMatch(/^Internal Revenue Service/);
    expect(place('review-passed.yaml')).toMatch(/^2026-11-30/);
    expect(place('ends-before-it-begins.yaml')).toMatch(/^2020-01-01/);
  });

  it('says where a file stops being YAML', () => {
    const faults = checkWith(
      'gb.yaml',
      'country: GB\nrules:\n  - id: [gb.statement\n    title: x\n',
    );
    expect(faults).toHaveLength(1);
    expect(faults[0]).toMatch(/^gb\.yaml:4:5 This is not YAML: .+[.]$/);
  });

  it('says when the common table is not there', () => {
    const faults = checkWith('gb.yaml', 'country: common\n');
    expect(faults.join('\n')).toContain('is missing');
  });

  it('stop the product from starting', () => {
    expect(() => loadRuleTables(brokenFolder)).toThrow('The rule tables have faults');
  });
});

describe('the shipped tables', () => {
  it('have no fault on the day they were written', () => {
    expect(checkRuleTables(shippedFolder, today).faults).toEqual([]);
  });
});
