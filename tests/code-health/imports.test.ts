import { existsSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, test } from 'vitest';
import { listCode, readImports } from './source-files.ts';
import type { ImportLine } from './source-files.ts';

const imports = listCode('server', 'src', 'tests').flatMap(readImports);

const within =
  (...folders: string[]) =>
  (file: string) =>
    folders.some((folder) => file === folder || file.startsWith(`${folder}/`));

function describeLine({ from, line, specifier }: ImportLine): string {
  return `${from}:${line} imports ${specifier}`;
}

/** The imports that stand in `folder` and are forbidden there. */
function findStrays(folder: string, isForbidden: (line: ImportLine) => boolean): string[] {
  const isInside = within(folder);
  return imports.filter((line) => isInside(line.from) && isForbidden(line)).map(describeLine);
}

const reaches =
  (...folders: string[]) =>
  ({ target }: ImportLine) =>
    target !== null && within(...folders)(target);

const usesPackage =
  (...names: string[]) =>
  ({ target, specifier }: ImportLine) =>
    target === null && names.some((name) => specifier === name || specifier.startsWith(`${name}/`));

const web = usesPackage('express', 'express-session', 'passport', 'multer', 'helmet');
const database = usesPackage('sequelize', 'pg', 'umzug');

describe('the walk over the imports', () => {
  test('sees static, type and dynamic imports', () => {
    expect(imports.length).toBeGreaterThan(100);
    expect(imports.some(({ from }) => from === 'server/app.ts')).toBe(true);
    const own = readImports('tests/code-health/imports.test.ts');
    expect(own.map(({ specifier, isTypeOnly }) => [specifier, isTypeOnly])).toEqual([
      ['node:fs', false],
      ['node:path', false],
      ['vitest', false],
      ['./source-files.ts', false],
      ['./source-files.ts', true],
    ]);
    const routes = readImports('src/app/router.tsx');
    expect(routes.some(({ target }) => target === 'src/app/pages/sign-in-page.tsx')).toBe(true);
  });
});

describe('every arrow between folders points the agreed way', () => {
  test('relative imports name a file that exists, with its ending', () => {
    const lost = imports.filter(({ target }) => target !== null && !existsSync(target));
    const bare = imports.filter(({ target }) => target !== null && path.extname(target) === '');
    expect([...lost, ...bare].map(describeLine)).toEqual([]);
  });

  test('server/contract imports zod alone', () => {
    const foreign = (line: ImportLine) =>
      line.target === null ? line.specifier !== 'zod' : !reaches('server/contract')(line);
    expect(findStrays('server/contract', foreign)).toEqual([]);
  });

  test('server/retention is pure: itself, the contract, zod and date arithmetic', () => {
    const foreign = (line: ImportLine) =>
      line.target === null
        ? !usesPackage('zod', 'date-fns')(line)
        : !reaches('server/retention', 'server/contract')(line);
    expect(findStrays('server/retention', foreign)).toEqual([]);
  });

  test('server/reading knows the contract and its own tools', () => {
    const foreign = (line: ImportLine) =>
      line.target === null
        ? web(line) || database(line)
        : !reaches('server/reading', 'server/contract')(line);
    expect(findStrays('server/reading', foreign)).toEqual([]);
  });

  test('server/use-cases knows no request, no model and no SQL', () => {
    const foreign = (line: ImportLine) =>
      web(line) ||
      (database(line) && !line.isTypeOnly) ||
      // The shape of a row may be named, the model behind it may not be used.
      (reaches('server/db/models')(line) && !line.isTypeOnly) ||
      reaches('server/routes', 'server/commands', 'server/app.ts')(line);
    expect(findStrays('server/use-cases', foreign)).toEqual([]);
  });

  test('server/routes knows no model, no SQL and none of the core', () => {
    const foreign = (line: ImportLine) =>
      database(line) ||
      reaches('server/db/models', 'server/db/repositories', 'server/commands')(line) ||
      (reaches('server/retention', 'server/reading')(line) && !line.isTypeOnly);
    expect(findStrays('server/routes', foreign)).toEqual([]);
  });

  test('only server/db takes Sequelize by its hand', () => {
    const outside = imports.filter(
      (line) =>
        /^(server|src)\//.test(line.from) &&
        !within('server/db')(line.from) &&
        usesPackage('sequelize', 'umzug')(line) &&
        !line.isTypeOnly,
    );
    expect(outside.map(describeLine)).toEqual([]);
  });

  test('server/db asks nobody above it', () => {
    const above = ['use-cases', 'routes', 'print', 'mail', 'reading', 'jobs', 'commands'];
    const isSeed = within('server/db/seeds');
    const foreign = (line: ImportLine) =>
      !isSeed(line.from) &&
      !line.isTypeOnly &&
      reaches(...above.map((folder) => `server/${folder}`))(line);
    expect(findStrays('server/db', foreign)).toEqual([]);
  });

  test.each(['server/print', 'server/mail'])(
    '%s is handed plain data and decides nothing',
    (folder) => {
      const others = ['db', 'routes', 'use-cases', 'retention', 'reading', 'jobs', 'commands'];
      const foreign = (line: ImportLine) =>
        web(line) || database(line) || reaches(...others.map((other) => `server/${other}`))(line);
      expect(findStrays(folder, foreign)).toEqual([]);
    },
  );

  test('the queue does not know who works', () => {
    const foreign = reaches('server/use-cases', 'server/jobs/handlers', 'server/routes');
    expect(findStrays('server/jobs/queue.ts', foreign)).toEqual([]);
  });

  test('the client takes nothing from the server but the contract', () => {
    const foreign = (line: ImportLine) =>
      reaches('server')(line) && !reaches('server/contract')(line);
    expect(findStrays('src', foreign)).toEqual([]);
  });

  test('a feature knows neither its neighbours nor the pages', () => {
    const foreign = (line: ImportLine) => {
      const feature = line.from.split('/').slice(0, 3).join('/');
      return reaches('src/app')(line) || (reaches('src/features')(line) && !reaches(feature)(line));
    };
    expect(findStrays('src/features', foreign)).toEqual([]);
  });

  test('components and lib know no feature and no page; lib knows no component', () => {
    const upwards = reaches('src/features', 'src/app');
    expect(findStrays('src/components', upwards)).toEqual([]);
    expect(
      findStrays('src/lib', (line) => upwards(line) || reaches('src/components')(line)),
    ).toEqual([]);
  });

  test('nothing that ships imports a test', () => {
    expect(findStrays('server', reaches('tests'))).toEqual([]);
    expect(findStrays('src', reaches('tests'))).toEqual([]);
  });

  test('there is no circle of imports', () => {
    expect(findCircles(imports)).toEqual([]);
  });
});

/** Circles through imports that exist when the program runs, each as one line. */
function findCircles(lines: ImportLine[]): string[] {
  const next = new Map<string, string[]>();
  for (const { from, target, isTypeOnly } of lines) {
    if (target === null || isTypeOnly) continue;
    next.set(from, [...(next.get(from) ?? []), target]);
  }
  const done = new Set<string>();
  const circles: string[] = [];
  const visit = (file: string, trail: string[]): void => {
    const start = trail.indexOf(file);
    if (start >= 0) {
      circles.push([...trail.slice(start), file].join(' → '));
      return;
    }
    if (done.has(file)) return;
    for (const target of next.get(file) ?? []) visit(target, [...trail, file]);
    done.add(file);
  };
  for (const file of next.keys()) visit(file, []);
  return circles;
}
