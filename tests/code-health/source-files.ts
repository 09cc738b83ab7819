import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';

export interface ImportLine {
  /** The file it stands in, relative to the project. */
  from: string;
  line: number;
  /** As written. */
  specifier: string;
  /** For relative imports the file they name, relative to the project. */
  target: string | null;
  isTypeOnly: boolean;
}

const codeEndings = new Set(['.ts', '.tsx', '.mjs']);

/** All files below a folder, relative to the project, sorted. */
export function listFiles(folder: string): string[] {
  return readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.relative('.', path.join(entry.parentPath, entry.name)))
    .sort();
}

/** All files with code below the given folders. */
export function listCode(...folders: string[]): string[] {
  return folders
    .flatMap(listFiles)
    .filter((file) => codeEndings.has(path.extname(file)))
    .filter((file) => !file.startsWith('tests/fixtures/'));
}

export function readText(file: string): string {
  return readFileSync(file, 'utf8');
}

const importPattern =
  /(?:^|\n)\s*(?:import|export)\s+(type\s)?(?:[\w*{}\s,$]+?\sfrom\s+)?['"]([^'"]+)['"]|\bimport\(\s*['"]([^'"]+)['"]\s*\)/g;

/** The imports of a file: static, re-exports, and dynamic ones with a fixed name. */
export function readImports(file: string): ImportLine[] {
  const text = readText(file);
  return [...text.matchAll(importPattern)].map((match) => {
    const specifier = match[2] ?? match[3] ?? '';
    const statement = match[0].trim();
    return {
      from: file,
      line: text.slice(0, match.index).split('\n').length + (match[0].startsWith('\n') ? 1 : 0),
      specifier,
      target: specifier.startsWith('.')
        ? path.join(path.dirname(file), specifier.split('?')[0] ?? '')
        : null,
      isTypeOnly:
        Boolean(match[1]) || /^import\s*\{(\s*type\s[^,}]+,?)+\s*\}\s*from/.test(statement),
    };
  });
}
