import { readFileSync } from 'node:fs';
import path from 'node:path';
import { gzipSync } from 'node:zlib';
import { beforeAll, describe, expect, test } from 'vitest';
import { ensureClientBuilt } from '../../server/commands/support/client-build.mjs';

interface Chunk {
  file: string;
  isEntry?: boolean;
  isDynamicEntry?: boolean;
  imports?: string[];
}

const largestSignInBytes = 150_000;
let manifest: Record<string, Chunk>;

beforeAll(async () => {
  await ensureClientBuilt(process.cwd(), () => undefined);
  const text = readFileSync(path.join('dist', '.vite', 'manifest.json'), 'utf8');
  manifest = JSON.parse(text) as Record<string, Chunk>;
});

/** A chunk and all it imports before it runs. */
function collectChunks(key: string, found = new Set<string>()): Set<string> {
  if (found.has(key)) return found;
  found.add(key);
  for (const next of manifest[key]?.imports ?? []) collectChunks(next, found);
  return found;
}

function measureGzip(keys: Iterable<string>): number {
  const files = new Set([...keys].map((key) => manifest[key]?.file ?? ''));
  return [...files]
    .filter((file) => file.endsWith('.js'))
    .reduce((sum, file) => sum + gzipSync(readFileSync(path.join('dist', file))).length, 0);
}

describe('what the browser loads', () => {
  test('for the sign-in screen is at most 150 kB of compressed JavaScript', () => {
    const signIn = Object.keys(manifest).filter((key) => key.endsWith('/sign-in-page.tsx'));
    expect(signIn).toHaveLength(1);
    const bytes = measureGzip([...collectChunks('index.html'), ...collectChunks(signIn[0]!)]);
    expect(bytes).toBeGreaterThan(50_000);
    expect(bytes).toBeLessThanOrEqual(largestSignInBytes);
  });

  test('for every other screen comes when it is opened', () => {
    const first = collectChunks('index.html');
    const pages = Object.keys(manifest).filter((key) => key.startsWith('src/app/pages/'));
    expect(pages.length).toBeGreaterThan(5);
    expect(pages.filter((key) => first.has(key) || !manifest[key]?.isDynamicEntry)).toEqual([]);
  });
});
