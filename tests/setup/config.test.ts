import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { describe, expect, test } from 'vitest';
import { ConfigError, loadConfig, readLauncherSettings } from '../../server/config.ts';

const secret = 'a'.repeat(64);
const enough = { DATABASE_URL: 'postgres://u:p@127.0.0.1:5433/slackwater', SESSION_SECRET: secret };
const production = {
  ...enough,
  NODE_ENV: 'production',
  SMTP_URL: 'smtps://mail.example',
  PUBLIC_URL: 'https://paper.example/',
};

function listFaults(env: Record<string, string>, fallback = {}): string[] {
  try {
    loadConfig(env, fallback);
  } catch (error) {
    if (error instanceof ConfigError) return error.faults;
    throw error;
  }
  return [];
}

describe('the settings', () => {
  test('need a database and a secret, everything else has a usual value', () => {
    const config = loadConfig(enough);
    expect(config).toMatchObject({
      environment: 'development',
      host: '127.0.0.1',
      port: 4180,
      publicUrl: 'http://127.0.0.1:4180',
      smtpUrl: null,
      hasSecureCookies: false,
      trustProxy: false,
      readerWorkers: 2,
      logLevel: 'info',
    });
    expect(path.basename(config.uploadsDir)).toBe('uploads');
    expect(path.isAbsolute(config.uploadsDir)).toBe(true);
  });

  test('are refused with every fault at once, each naming its setting', () => {
    const faults = listFaults({
      DATABASE_URL: 'mysql://127.0.0.1/x',
      PORT: '70000',
      SMTP_URL: 'mail.example',
      READER_WORKERS: 'two',
      LOG_LEVEL: 'loud',
      CLASS_CONFIDENCE: '1.5',
      TRUST_PROXY: 'everybody!',
    });
    expect(faults).toEqual([
      'DATABASE_URL must begin with postgres:// or postgresql://.',
      'SESSION_SECRET is missing: set it to a long random text, for example from "openssl rand -hex 32".',
      'SMTP_URL must begin with smtp:// or smtps://.',
      'PORT must be between 0 and 65535.',
      'TRUST_PROXY must be a number of proxies or their addresses.',
      'READER_WORKERS must be a whole number.',
      'CLASS_CONFIDENCE must be a number from 0 to 1.',
      'LOG_LEVEL must be one of fatal, error, warn, info, debug, trace, silent.',
    ]);
  });

  test('never repeat a secret that is wrong', () => {
    const faults = listFaults({ ...enough, SESSION_SECRET: 'hunter2' });
    expect(faults).toEqual(['SESSION_SECRET must have at least 32 characters.']);
  });

  test('treat an empty text as not given', () => {
    expect(loadConfig({ ...enough, PORT: '', SMTP_URL: '' })).toMatchObject({
      port: 4180,
      smtpUrl: null,
    });
  });

  test('fall back to what the launcher chose, and the environment wins over it', () => {
    const fallback = {
      databaseUrl: enough.DATABASE_URL,
      sessionSecret: secret,
      smtpUrl: 'smtp://a',
    };
    expect(loadConfig({}, fallback)).toMatchObject({ smtpUrl: 'smtp://a' });
    expect(loadConfig({ SMTP_URL: 'smtp://b' }, fallback)).toMatchObject({ smtpUrl: 'smtp://b' });
  });

  test('take nothing from the launcher in production', () => {
    const fallback = {
      databaseUrl: enough.DATABASE_URL,
      sessionSecret: secret,
      smtpUrl: 'smtp://a',
    };
    const faults = listFaults({ NODE_ENV: 'production' }, fallback);
    expect(faults.map((fault) => fault.split(' ')[0])).toEqual([
      'DATABASE_URL',
      'SESSION_SECRET',
      'SMTP_URL',
      'PUBLIC_URL',
    ]);
  });

  test('give secure cookies in production and under https', () => {
    expect(loadConfig(production)).toMatchObject({ hasSecureCookies: true, isProduction: true });
    expect(loadConfig({ ...production, NODE_ENV: 'development' }).hasSecureCookies).toBe(true);
  });

  test('keep PUBLIC_URL without a slash at its end, and name this machine when HOST is every address', () => {
    expect(loadConfig(production).publicUrl).toBe('https://paper.example');
    expect(loadConfig({ ...enough, HOST: '0.0.0.0', PORT: '81' }).publicUrl).toBe(
      'http://localhost:81',
    );
  });

  test.each([
    ['0', false],
    ['2', 2],
    ['loopback', 'loopback'],
    ['10.0.0.1, 10.0.0.2', '10.0.0.1, 10.0.0.2'],
  ])('TRUST_PROXY %s reaches Express as %s', (text, expected) => {
    expect(loadConfig({ ...enough, TRUST_PROXY: text }).trustProxy).toBe(expected);
  });
});

describe('what the launcher wrote down', () => {
  test('is read from its file, and a missing or broken file counts as empty', () => {
    const folder = mkdtempSync(path.join(os.tmpdir(), 'settings-'));
    try {
      const file = path.join(folder, 'settings.json');
      expect(readLauncherSettings(file)).toEqual({});
      writeFileSync(file, '{"databaseUrl": "postgres://x", "postgresPort": 5}');
      expect(readLauncherSettings(file)).toEqual({ databaseUrl: 'postgres://x' });
      writeFileSync(file, '{"databaseUrl": ');
      expect(readLauncherSettings(file)).toEqual({});
    } finally {
      rmSync(folder, { recursive: true });
    }
  });
});
