/** The start of everything, in order, and its end in the opposite order. */
import path from 'node:path';
import process from 'node:process';
import { startChildren } from './child-plans.mjs';
import { createChildren, readLogTail } from './children.mjs';
import { ensureClientBuilt } from './client-build.mjs';
import { ensureDependencies } from './dependencies.mjs';
import { acquireInstanceLock } from './instance-lock.mjs';
import { ensureDatabase, startCluster } from './postgres-cluster.mjs';
import { requirePostgres } from './postgres-programs.mjs';
import { findFreePort, isPortFree, pause, PlainError, run } from './process.mjs';
import { dataDir, logDir, projectDir, tsxArgs } from './project.mjs';
import { prepareReadingModel } from './reading-model.mjs';
import { loadSettings, saveSettings } from './settings.mjs';
import { createShutdown } from './shutdown.mjs';
import { describeWelcome } from './welcome.mjs';

/** @typedef {import('./settings.mjs').Settings} Settings */
/** @typedef {import('./shutdown.mjs').Started} Started */

const databaseName = 'slackwater';

/** @param {string} line */
const say = (line) => console.log(line);

/** @param {{ isDevelopment: boolean }} options */
export async function launch({ isDevelopment }) {
  process.chdir(projectDir);
  /** @type {Started} */
  const started = { cluster: null, children: null, lock: null, isEnding: false, settled: null };
  const shutdown = createShutdown(started, say);
  const starting = start({ isDevelopment, started, shutdown });
  started.settled = starting.then(
    () => undefined,
    () => undefined,
  );
  try {
    await starting;
  } catch (error) {
    // Somebody who asked for the end needs no report on what did not get done.
    if (!started.isEnding) console.error(describeError(error));
    await shutdown(1);
  }
}

/**
 * @param {unknown} error
 * @returns {string} one sentence for what a person can mend, everything for the rest
 */
export function describeError(error) {
  if (error instanceof PlainError) return error.message;
  const { code, path: place, stack } = /** @type {NodeJS.ErrnoException} */ (error);
  if (code === 'ENOSPC') return 'The disk is full. Free some space and start again.';
  if (code === 'EACCES' || code === 'EPERM' || code === 'EROFS') {
    return (
      `This account may not write ${place ? path.relative(projectDir, place) || place : 'here'}. ` +
      'Start as the account that owns the project folder, or give it that folder.'
    );
  }
  return stack ?? String(error);
}

/**
 * @param {{ isDevelopment: boolean, started: Started, shutdown: (code: number) => Promise<void> }} context
 */
async function start({ isDevelopment, started, shutdown }) {
  const isProduction = process.env.NODE_ENV === 'production';
  if (isProduction) requireProductionSettings(isDevelopment);
  const host = process.env.HOST || '127.0.0.1';
  const port = parsePort(process.env.PORT);

  started.lock = await acquireInstanceLock(dataDir);
  await requireFreePort(port, host);
  await ensureDependencies(projectDir, say);
  requireGoingOn(started);
  const settings = loadSettings(dataDir);
  if (!isProduction) {
    await prepareReadingModel(settings.hasAskedForReadingModel === true, say);
    settings.hasAskedForReadingModel = true;
  }

  requireGoingOn(started);
  await prepareCluster(settings, started);
  requireGoingOn(started);
  await chooseMailPorts(settings, isProduction);
  saveSettings(dataDir, settings);

  const apiPort = isDevelopment ? await findFreePort(port + 1) : port;
  const address = (
    process.env.PUBLIC_URL || `http://${isEveryAddress(host) ? 'localhost' : host}:${port}`
  ).replace(/\/+$/, '');
  const env = {
    ...process.env,
    PORT: String(apiPort),
    HOST: isDevelopment ? '127.0.0.1' : host,
    ...(isProduction ? {} : { PUBLIC_URL: address }),
    ...(settings.databaseUrl ? { DATABASE_URL: settings.databaseUrl } : {}),
    ...(settings.smtpUrl ? { SMTP_URL: settings.smtpUrl } : {}),
    ...(isProduction
      ? {}
      : { SESSION_SECRET: process.env.SESSION_SECRET || settings.sessionSecret }),
  };

  await runStep('migrate.ts', ['--check-settings'], env);
  requireGoingOn(started);
  if (!isProduction) await runStep('seed.ts', ['--if-empty'], env);
  requireGoingOn(started);
  if (!isDevelopment) await ensureClientBuilt(projectDir, say);
  requireGoingOn(started);

  const showsEverything = isDevelopment || isProduction;
  const children = createChildren({
    projectDir,
    logDir: showsEverything ? null : logDir,
    say,
    onSpawn: (pid) => started.lock?.addChild(pid),
    onFatal: (name, code) => {
      const tail = showsEverything ? '' : `\n${readLogTail(logDir, name)}`;
      if (started.isEnding) return;
      console.error(`The ${name} ended unexpectedly (${code}); everything is stopped.${tail}`);
      void shutdown(1);
    },
  });
  started.children = children;
  startChildren({ children, env, settings, isDevelopment, port, host, apiPort });

  const visibleHost = isDevelopment || isEveryAddress(host) ? '127.0.0.1' : host;
  await awaitServer(`http://${visibleHost}:${apiPort}`, started);
  watchCluster(started);
  started.lock.setAddress(address);
  say(describeWelcome(address, settings, isProduction, showsEverything));
}

/**
 * Ends the start at the next step after somebody asked for the end.
 * @param {Started} started
 */
function requireGoingOn(started) {
  if (started.isEnding) throw new PlainError('Stopped before everything was started.');
}

/** @param {string} host */
function isEveryAddress(host) {
  return host === '0.0.0.0' || host === '::';
}

/**
 * Said before anything is installed or made.
 * @param {boolean} isDevelopment
 */
function requireProductionSettings(isDevelopment) {
  if (isDevelopment) throw new PlainError('NODE_ENV=production and --dev exclude each other.');
  const missing = ['DATABASE_URL', 'SESSION_SECRET', 'SMTP_URL', 'PUBLIC_URL'].filter(
    (name) => !process.env[name],
  );
  if (missing.length > 0) {
    throw new PlainError(
      `With NODE_ENV=production nothing is made up: set ${missing.join(', ')} and start again.`,
    );
  }
}

/**
 * @param {string | undefined} text
 * @returns {number}
 */
export function parsePort(text) {
  if (text === undefined || text === '') return 4180;
  if (!/^\d+$/.test(text) || Number(text) < 1 || Number(text) > 65_535) {
    throw new PlainError(`PORT must be a number from 1 to 65535, not "${text}".`);
  }
  return Number(text);
}

/**
 * @param {number} port
 * @param {string} host
 */
async function requireFreePort(port, host) {
  if (await isPortFree(port, host)) return;
  throw new PlainError(
    `Port ${port} on ${host} cannot be used: another program has it, or it is not allowed. ` +
      `Choose another, for example PORT=${port < 65_000 ? port + 10 : 4190}.`,
  );
}

/**
 * Starts the project's own cluster, unless the environment names a database.
 * @param {Settings} settings
 * @param {Started} started
 */
async function prepareCluster(settings, started) {
  if (process.env.DATABASE_URL) {
    delete settings.databaseUrl;
    return;
  }
  const programs = await requirePostgres(say);
  const password = settings.postgresPassword;
  // Kept before the cluster is made: a cluster whose password is lost is lost with it.
  saveSettings(dataDir, settings);
  const cluster = await startCluster({
    programs,
    dataDir: path.join(dataDir, 'postgres'),
    password,
    port: settings.postgresPort ?? 0,
  });
  started.cluster = cluster;
  settings.postgresPort = cluster.port;
  settings.databaseUrl = cluster.urlOf(databaseName);
  await ensureDatabase(programs, cluster, { name: databaseName, password });
}

/**
 * Brings the cluster back when it ended by itself; server and worker find it again on its port.
 * @param {Started} started
 */
function watchCluster(started) {
  const { cluster } = started;
  if (!cluster) return;
  let isBusy = false;
  setInterval(() => {
    if (isBusy || started.isEnding || cluster.isRunning()) return;
    isBusy = true;
    say('PostgreSQL ended; it is started again.');
    cluster.restart().then(
      () => {
        isBusy = false;
      },
      (/** @type {unknown} */ error) => {
        console.error(describeError(error));
        isBusy = false;
      },
    );
  }, 2000).unref();
}

/**
 * @param {Settings} settings
 * @param {boolean} isProduction
 */
async function chooseMailPorts(settings, isProduction) {
  if (isProduction || process.env.SMTP_URL) {
    delete settings.smtpUrl;
    return;
  }
  settings.smtpPort = await findFreePort(settings.smtpPort);
  settings.mailPagePort = await findFreePort(settings.mailPagePort);
  settings.smtpUrl = `smtp://127.0.0.1:${settings.smtpPort}`;
}

/**
 * Runs one of the commands to its end.
 * @param {string} file in server/commands
 * @param {string[]} args
 * @param {NodeJS.ProcessEnv} env
 */
async function runStep(file, args, env) {
  const { code, output } = await run(process.execPath, tsxArgs(`server/commands/${file}`, args), {
    cwd: projectDir,
    env,
  });
  if (code !== 0) throw new PlainError(output.trim() || `${file} ended with ${code}.`);
  if (output.trim()) say(output.trim());
}

/**
 * @param {string} origin
 * @param {Started} started
 */
async function awaitServer(origin, started) {
  for (let attempt = 0; attempt < 300; attempt += 1) {
    requireGoingOn(started);
    try {
      const response = await fetch(`${origin}/api/health`, { signal: AbortSignal.timeout(2000) });
      await response.body?.cancel();
      if (response.status === 200 || response.status === 503) return;
    } catch {
      // not listening yet
    }
    await pause(200);
  }
  throw new PlainError(`The server does not answer at ${origin}. Its log is in .data/logs.`);
}
