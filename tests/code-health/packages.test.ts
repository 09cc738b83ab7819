import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, test } from 'vitest';

interface Manifest {
  dependencies: Record<string, string>;
  devDependencies: Record<string, string>;
  license?: string | { type?: string };
}

interface Locked {
  dev?: boolean;
  devOptional?: boolean;
}

function readJson<T>(file: string): T {
  return JSON.parse(readFileSync(file, 'utf8')) as T;
}

describe('the packages', () => {
  const manifest = readJson<Manifest>('package.json');

  test('are named with exact versions', () => {
    const all = Object.entries({ ...manifest.dependencies, ...manifest.devDependencies });
    expect(all.filter(([, version]) => !/^\d+\.\d+\.\d+$/.test(version))).toEqual([]);
  });

  test('that run with the product ask for no copyleft of the whole work', () => {
    const { packages } = readJson<{ packages: Record<string, Locked> }>('package-lock.json');
    const strict = Object.entries(packages)
      .filter(([place, entry]) => place !== '' && !entry.dev && !entry.devOptional)
      .map(([place]) => path.join(place, 'package.json'))
      .filter((file) => existsSync(file))
      .map((file) => {
        const { license } = readJson<Manifest>(file);
        return `${file}: ${typeof license === 'string' ? license : (license?.type ?? '')}`;
      })
      // A choice between licences is fine where one of them is permissive.
      .filter((line) => /: \(?A?GPL/.test(line) && !/ OR /.test(line));
    expect(strict).toEqual([]);
  });
});
