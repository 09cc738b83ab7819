/** The environment, read and checked once, at start. */
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { z } from 'zod';

const logLevels = ['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent'] as const;
export type LogLevel = (typeof logLevels)[number];

const projectDir = path.resolve(import.meta.dirname, '..');
/** Where the launcher keeps what it chose for this machine. Never read in production. */
const settingsFile = path.join(projectDir, '.data', 'settings.json');

const url = (words: string, ...protocols: string[]) =>
  z
    .string()
    .refine((text) => URL.canParse(text) && protocols.includes(new URL(text).protocol), words);

const whole = (smallest: number, largest: number, usual: number) =>
  z
    .string()
    .regex(/^\d+$/, 'must be a whole number')
    .transform(Number)
    .refine((value) => value >= smallest && value <= largest, {
      message: `must be between ${smallest} and ${largest}`,
    })
    .default(usual);

const megabyte = 1024 * 1024;

const environmentSchema = z.object({
  NODE_ENV: z.enum(['development', 'production', 'test']).default('development'),
  DATABASE_URL: url('must begin with postgres:// or postgresql://', 'postgres:', 'postgresql:'),
  SESSION_SECRET: z.string().min(32, 'must have at least 32 characters'),
  SMTP_URL: url('must begin with smtp:// or smtps://', 'smtp:', 'smtps:').optional(),
  MAIL_FROM: z.string().min(3).default('Slackwater <no-reply@slackwater.example>'),
  HOST: z.string().min(1).default('127.0.0.1'),
  PORT: whole(0, 65_535, 4180),
  PUBLIC_URL: url('must begin with http:// or https://', 'http:', 'https:').optional(),
  UPLOADS_DIR: z.string().min(1).default('uploads'),
  TRUST_PROXY: z
    .string()
    .regex(/^(\d+|loopback|[\d.:a-f/, ]+)$/i, 'must be a number of proxies or their addresses')
    .default('0'),
  READER_WORKERS: whole(1, 16, 2),
  MAX_FILE_BYTES: whole(1, 2000 * megabyte, 60 * megabyte),
  MAX_FILES: whole(1, 1000, 100),
  MAX_PAGES: whole(1, 5000, 300),
  MAX_PIXELS: whole(10_000, 1_000_000_000, 120_000_000),
  PAGE_TIMEOUT_MS: whole(1000, 600_000, 90_000),
  READER_MEMORY_MB: whole(64, 65_536, 1500),
  CLASS_CONFIDENCE: z
    .string()
    .regex(/^(0(\.\d+)?|1(\.0+)?)$/, 'must be a number from 0 to 1')
    .transform(Number)
    .default(0.5),
  LOG_LEVEL: z.enum(logLevels).default('info'),
});

/** Which settings the table in the README lists, in its order. */
export const settingNames = Object.keys(environmentSchema.shape);

export interface Config {
  environment: 'development' | 'production' | 'test';
  isProduction: boolean;
  databaseUrl: string;
  sessionSecret: string;
  /** Null when no mail can be sent. */
  smtpUrl: string | null;
  mailFrom: string;
  host: string;
  port: number;
  /** Without a slash at its end. */
  publicUrl: string;
  /** Cookies travel over TLS alone: always in production, elsewhere when PUBLIC_URL is https. */
  hasSecureCookies: boolean;
  uploadsDir: string;
  /** As Express takes it: a number of proxies, or addresses; false trusts none. */
  trustProxy: number | string | false;
  readerWorkers: number;
  limits: {
    maxFileBytes: number;
    maxFiles: number;
    maxPages: number;
    maxPixels: number;
    pageTimeoutMs: number;
    readerMemoryMb: number;
  };
  /** Below this a class is called unrecognised. */
  classConfidence: number;
  logLevel: LogLevel;
}

/** Everything that is wrong with the environment, one sentence a setting. */
export class ConfigError extends Error {
  readonly faults: string[];

  constructor(faults: string[]) {
    super(`The settings are not complete:\n${faults.map((fault) => `  - ${fault}`).join('\n')}`);
    this.name = 'ConfigError';
    this.faults = faults;
  }
}

/** What the launcher chose: used where the environment says nothing. */
export interface LauncherSettings {
  databaseUrl?: string | undefined;
  sessionSecret?: string | undefined;
  smtpUrl?: string | undefined;
}

/**
 * Reads the settings out of an environment.
 * @param fallback what the launcher chose; ignored in production
 * @throws ConfigError that lists every fault at once
 */
export function loadConfig(
  env: Readonly<Record<string, string | undefined>>,
  fallback: LauncherSettings = {},
): Config {
  const isProduction = env.NODE_ENV === 'production';
  const given = Object.fromEntries(
    Object.entries(env).filter(([, value]) => value !== undefined && value !== ''),
  );
  const parsed = environmentSchema.safeParse({
    ...(isProduction
      ? {}
      : {
          DATABASE_URL: fallback.databaseUrl,
          SESSION_SECRET: fallback.sessionSecret,
          SMTP_URL: fallback.smtpUrl,
        }),
    ...given,
  });
  const faults = parsed.success ? [] : parsed.error.issues.map(describeIssue);
  if (isProduction && given.SMTP_URL === undefined) {
    faults.push('SMTP_URL is missing: in production the mail has to go somewhere.');
  }
  if (isProduction && given.PUBLIC_URL === undefined) {
    faults.push('PUBLIC_URL is missing: links in mails and printed codes need it.');
  }
  if (!parsed.success || faults.length > 0) throw new ConfigError(faults);
  return shapeConfig(parsed.data);
}

function shapeConfig(values: z.infer<typeof environmentSchema>): Config {
  const isProduction = values.NODE_ENV === 'production';
  const visibleHost = ['0.0.0.0', '::'].includes(values.HOST) ? 'localhost' : values.HOST;
  const publicUrl = values.PUBLIC_URL ?? `http://${visibleHost}:${values.PORT}`;
  return {
    environment: values.NODE_ENV,
    isProduction,
    databaseUrl: values.DATABASE_URL,
    sessionSecret: values.SESSION_SECRET,
    smtpUrl: values.SMTP_URL ?? null,
    mailFrom: values.MAIL_FROM,
    host: values.HOST,
    port: values.PORT,
    publicUrl: publicUrl.replace(/\/+$/, ''),
    hasSecureCookies: isProduction || publicUrl.startsWith('https:'),
    uploadsDir: path.resolve(projectDir, values.UPLOADS_DIR),
    trustProxy: parseTrustProxy(values.TRUST_PROXY),
    readerWorkers: values.READER_WORKERS,
    limits: {
      maxFileBytes: values.MAX_FILE_BYTES,
      maxFiles: values.MAX_FILES,
      maxPages: values.MAX_PAGES,
      maxPixels: values.MAX_PIXELS,
      pageTimeoutMs: values.PAGE_TIMEOUT_MS,
      readerMemoryMb: values.READER_MEMORY_MB,
    },
    classConfidence: values.CLASS_CONFIDENCE,
    logLevel: values.LOG_LEVEL,
  };
}

function describeIssue(issue: z.core.$ZodIssue): string {
  const name = String(issue.path[0] ?? 'The environment');
  if (issue.code === 'invalid_type' && issue.input === undefined) {
    return `${name} is missing${missingHints[name] ?? ''}.`;
  }
  if (issue.code === 'invalid_value') return `${name} must be one of ${issue.values.join(', ')}.`;
  return `${name} ${issue.message}.`;
}

const missingHints: Record<string, string> = {
  DATABASE_URL: ': run "npm start" once, or set it to the address of a PostgreSQL database',
  SESSION_SECRET: ': set it to a long random text, for example from "openssl rand -hex 32"',
};

function parseTrustProxy(text: string): number | string | false {
  if (!/^\d+$/.test(text)) return text;
  return Number(text) === 0 ? false : Number(text);
}

const launcherSettingsSchema = z.object({
  databaseUrl: z.string().optional(),
  sessionSecret: z.string().optional(),
  smtpUrl: z.string().optional(),
});

/** What the launcher wrote down on this machine; empty when it never ran here. */
export function readLauncherSettings(file: string = settingsFile): LauncherSettings {
  if (!existsSync(file)) return {};
  try {
    return launcherSettingsSchema.parse(JSON.parse(readFileSync(file, 'utf8')));
  } catch {
    return {};
  }
}

/** The configuration of this process, or its faults on standard error and exit status 1. */
export function loadConfigOrExit(): Config {
  return orExit(() => loadConfig(process.env, readLauncherSettings()));
}

/** For commands that touch the database alone: asks for no other setting. */
export function loadDatabaseUrlOrExit(): string {
  return orExit(() => {
    // The secret is not used; this one only satisfies the schema.
    const env = { ...process.env, SESSION_SECRET: '-'.repeat(32) };
    return loadConfig({ ...env, NODE_ENV: 'test' }, readSettingsFor(process.env.NODE_ENV))
      .databaseUrl;
  });
}

function readSettingsFor(environment: string | undefined): LauncherSettings {
  return environment === 'production' ? {} : readLauncherSettings();
}

function orExit<T>(load: () => T): T {
  try {
    return load();
  } catch (error) {
    if (!(error instanceof ConfigError)) throw error;
    process.stderr.write(`${error.message}\n`);
    process.exit(1);
  }
}
