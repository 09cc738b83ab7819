import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdirSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import net from 'node:net';
import type { AddressInfo } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { decideRestartDelay } from '../../server/commands/support/children.mjs';
import { hashSources } from '../../server/commands/support/client-build.mjs';
import { areDependenciesFresh } from '../../server/commands/support/dependencies.mjs';
import { acquireInstanceLock } from '../../server/commands/support/instance-lock.mjs';
import { describeError, parsePort } from '../../server/commands/support/launch.mjs';
import {
  findFreePort,
  findProcessStart,
  isAlive,
  PlainError,
} from '../../server/commands/support/process.mjs';
import { loadSettings, saveSettings } from '../../server/commands/support/settings.mjs';
import { describeWelcome } from '../../server/commands/support/welcome.mjs';

let folder: string;

beforeEach(() => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'launcher-'));
});

afterEach(() => {
  rmSync(folder, { recursive: true, force: true });
});

describe('the settings the launcher keeps', () => {
  test('begin with long secrets of their own and come back as they were saved', () => {
    const first = loadSettings(folder);
    expect(first.sessionSecret).toMatch(/^[0-9a-f]{64}$/);
    expect(first.postgresPassword).not.toBe(first.sessionSecret);
    expect(loadSettings(folder).sessionSecret).not.toBe(first.sessionSecret);
    saveSettings(folder, { ...first, postgresPort: 5544 });
    expect(loadSettings(folder)).toEqual({ ...first, postgresPort: 5544 });
  });

  test('are readable for their owner alone', () => {
    saveSettings(folder, loadSettings(folder));
    expect(statSync(path.join(folder, 'settings.json')).mode & 0o777).toBe(0o600);
  });

  test('are not replaced when damaged, or missing beside a database they unlock', () => {
    const file = path.join(folder, 'settings.json');
    writeFileSync(file, '{"postgresPassword": "x"');
    expect(() => loadSettings(folder)).toThrow(/damaged/);
    expect(readFileSync(file, 'utf8')).toBe('{"postgresPassword": "x"');
    rmSync(file);
    mkdirSync(path.join(folder, 'postgres'));
    writeFileSync(path.join(folder, 'postgres', 'PG_VERSION'), '15\n');
    expect(() => loadSettings(folder)).toThrow(/settings.json is missing/);
  });
});

describe('the lock of a folder', () => {
  test('refuses a second start beside a living one, naming its address', async () => {
    const lock = await acquireInstanceLock(folder);
    lock.setAddress('http://127.0.0.1:4180');
    await expect(acquireInstanceLock(folder)).rejects.toThrow(
      /already running from this folder at http:\/\/127\.0\.0\.1:4180/,
    );
    lock.release();
    const next = await acquireInstanceLock(folder);
    next.release();
  });

  test('of a killed launcher is taken over, and what it left running is ended', async () => {
    const leftover = spawn(process.execPath, ['-e', 'setTimeout(() => {}, 60000)'], {
      detached: true,
      stdio: 'ignore',
    });
    const pid = leftover.pid!;
    const ended = once(leftover, 'exit');
    const dead = { pid, startedAt: 'another time' };
    const child = { pid, startedAt: findProcessStart(pid) };
    writeFileSync(
      path.join(folder, 'running.json'),
      JSON.stringify({ ...dead, address: null, children: [child] }),
    );
    const lock = await acquireInstanceLock(folder);
    expect((await ended)[1]).toBe('SIGTERM');
    lock.release();
  });

  test('never ends a stranger who was given the id of an old child', async () => {
    const stranger = spawn(process.execPath, ['-e', 'setTimeout(() => {}, 60000)'], {
      stdio: 'ignore',
    });
    const pid = stranger.pid!;
    const mark = { pid, startedAt: 'another time' };
    writeFileSync(
      path.join(folder, 'running.json'),
      JSON.stringify({ ...mark, address: null, children: [mark] }),
    );
    const lock = await acquireInstanceLock(folder);
    expect(isAlive(pid)).toBe(true);
    stranger.kill('SIGKILL');
    lock.release();
  });
});

describe('the installed packages', () => {
  const locked = {
    '': { version: '1.0.0' },
    'node_modules/a': { version: '1.2.3', integrity: 'sha512-a' },
    'node_modules/b-darwin': { version: '2.0.0', integrity: 'sha512-b', optional: true },
  };

  test('are fresh when each is the locked one; those for other systems may be missing', () => {
    const installed = { 'node_modules/a': { version: '1.2.3', integrity: 'sha512-a' } };
    expect(areDependenciesFresh(locked, installed)).toBe(true);
  });

  test.each([
    ['nothing was installed', null],
    ['one is missing', {}],
    ['one has another version', { 'node_modules/a': { version: '1.2.4', integrity: 'sha512-a' } }],
    ['one has other contents', { 'node_modules/a': { version: '1.2.3', integrity: 'sha512-x' } }],
  ])('are stale when %s', (_case, installed) => {
    expect(areDependenciesFresh(locked, installed)).toBe(false);
  });
});

describe('the fingerprint of the client’s sources', () => {
  test('changes with a content, a name and a new file, and with nothing else', () => {
    const src = path.join(folder, 'src');
    mkdirSync(path.join(src, 'deep'), { recursive: true });
    writeFileSync(path.join(src, 'deep', 'a.ts'), 'one');
    const hash = () => hashSources(folder, ['src', 'not-there']);
    const first = hash();
    expect(hash()).toBe(first);
    writeFileSync(path.join(folder, 'elsewhere.ts'), 'x');
    expect(hash()).toBe(first);
    writeFileSync(path.join(src, 'deep', 'a.ts'), 'two');
    const second = hash();
    writeFileSync(path.join(src, 'b.ts'), '');
    expect(new Set([first, second, hash()]).size).toBe(3);
  });
});

describe('a fault at start', () => {
  test.each([
    [new PlainError('Do this.'), 'Do this.'],
    [Object.assign(new Error('x'), { code: 'ENOSPC' }), /disk is full/],
    [
      Object.assign(new Error('x'), { code: 'EACCES', path: '/nowhere/x' }),
      /may not write .*Start as/,
    ],
  ])('is one sentence that says what to do: %s', (error, sentence) => {
    const text = describeError(error);
    expect(text).toMatch(sentence);
    expect(text.split('\n')).toHaveLength(1);
  });

  test.each(['0', '70000', 'http', '-1', '80.5'])('PORT=%s is refused', (text) => {
    expect(() => parsePort(text)).toThrow(/PORT must be a number from 1 to 65535/);
  });

  test('an empty PORT is the usual one', () => {
    expect([parsePort(undefined), parsePort(''), parsePort('81')]).toEqual([4180, 4180, 81]);
  });
});

describe('a port', () => {
  test('is the wanted one when it is free and another when it is taken', async () => {
    const taken = net.createServer().listen(0, '127.0.0.1');
    await once(taken, 'listening');
    const { port } = taken.address() as AddressInfo;
    expect(await findFreePort(port)).not.toBe(port);
    taken.close();
    await once(taken, 'close');
    expect(await findFreePort(port)).toBe(port);
  });
});

describe('a crashed worker', () => {
  test('comes back after a second, then later and later, half a minute at most', () => {
    expect([1, 2, 3, 4, 5, 6, 20].map(decideRestartDelay)).toEqual([
      1000, 2000, 4000, 8000, 16_000, 30_000, 30_000,
    ]);
  });
});

describe('the greeting', () => {
  const settings = {
    postgresPassword: 'pg',
    sessionSecret: 's',
    smtpUrl: 'smtp://x',
    mailPagePort: 8,
  };

  test('names the address, the demo sign-ins and where mail is read, and no secret', () => {
    const text = describeWelcome('http://127.0.0.1:4180', settings, false, false);
    for (const part of ['http://127.0.0.1:4180', 'owner@demo.example', 'adviser@demo.example']) {
      expect(text).toContain(part);
    }
    expect(text).toContain('http://127.0.0.1:8/');
    expect(text).not.toContain('smtp://');
  });

  test('names no demo sign-in in production', () => {
    expect(describeWelcome('https://x.example', settings, true, true)).not.toContain('demo');
  });
});
