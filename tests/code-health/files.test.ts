import { existsSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, test } from 'vitest';
import { listCode, listFiles, readText } from './source-files.ts';

const folders = ['server', 'src', 'tests', 'rules'].filter((folder) => existsSync(folder));
const texts = [
  ...folders.flatMap(listFiles),
  ...[
    'README.md',
    'DEVELOPERS.md',
    'package.json',
    'vite.config.ts',
    'index.html',
    '.ci/run',
  ].filter((file) => existsSync(file)),
].filter(
  (file) =>
    !file.startsWith('tests/fixtures/') &&
    /\.(tsx?|mjs|json|ya?ml|md|html|css)$|\.ci\/run$/.test(file),
);

function findLines(pattern: RegExp, files: string[] = texts): string[] {
  return files.flatMap((file) =>
    readText(file)
      .split('\n')
      .flatMap((line, index) =>
        pattern.test(line) ? [`${file}:${index + 1} ${line.trim()}`] : [],
      ),
  );
}

describe('the files', () => {
  test('are small enough to be read in one sitting: 400 lines at most', () => {
    const data = ['server/contract/document-classes.ts'];
    const giants = listCode('server', 'src')
      .filter((file) => !data.includes(file))
      .map((file) => ({ file, lines: readText(file).split('\n').length - 1 }))
      .filter(({ lines }) => lines > 400)
      .map(({ file, lines }) => `${file} has ${lines} lines`);
    expect(giants).toEqual([]);
  });

  test('have names in kebab-case', () => {
    const odd = listCode(...folders).filter(
      (file) => !/^[a-z0-9]+(-[a-z0-9]+)*(\.test|\.d)?\.(tsx?|mjs)$/.test(path.basename(file)),
    );
    expect(odd).toEqual([]);
  });

  // The patterns are put together from halves, so that this file does not find itself.
  test.each([
    ['no silenced checker', new RegExp(`@ts-(?:${'ign'}ore|${'no'}check)|eslint-${'dis'}able`)],
    ['no unfinished mark', new RegExp(`\\b(?:TO${'DO'}|FIX${'ME'}|HA${'CK'})\\b`)],
    ['no path of somebody’s machine', new RegExp(`["'\`(\\s]/(?:wo${'rk'}|ho${'me'}|Us${'ers'})/`)],
    ['no package registry’s address', new RegExp(`regis${'try'}\\.[a-z]+js\\.org|npm${'mirror'}`)],
    [
      'no test that is switched off or alone',
      new RegExp(`\\b(?:test|it|describe)\\.(?:on${'ly'}|sk${'ip'})\\(`),
    ],
  ])('hold %s', (_name, pattern) => {
    expect(findLines(pattern)).toEqual([]);
  });

  test('never sleep in a test by a fixed time', () => {
    const tests = texts.filter((file) => file.endsWith('.test.ts') || file.endsWith('.test.tsx'));
    expect(findLines(/\bsetTimeout\(\s*resolve|waitForTimeout\(/, tests)).toEqual([]);
  });
});
