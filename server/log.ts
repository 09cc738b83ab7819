import { pino } from 'pino';
import type { DestinationStream, Logger } from 'pino';
import type { LogLevel } from './config.ts';

/** Papers are bank statements and medical letters: what could carry their matter is never written. */
const secretPaths = [
  'password',
  'token',
  'csrfToken',
  'secret',
  'email',
  'name',
  'text',
  'body',
  'facts',
  'req.body',
  'req.query',
  'req.headers',
  'req.remoteAddress',
  'req.remotePort',
  'res.headers',
  'err.sql',
  'err.parameters',
  'err.original',
  'err.parent',
  'err.fields',
  'err.errors',
  '*.password',
  '*.token',
  '*.email',
  '*.text',
];

/**
 * A log that keeps to ids, states and durations.
 * @param destination where the lines go; standard output when left out
 */
export function createLog(level: LogLevel, destination?: DestinationStream): Logger {
  const options = {
    level,
    base: null,
    redact: { paths: secretPaths, remove: true },
    serializers: {
      req: (request: { id?: unknown; method?: string; url?: string }) => ({
        id: request.id,
        method: request.method,
        path: describePath(request.url ?? ''),
      }),
      res: (response: { statusCode?: number }) => ({ status: response.statusCode }),
    },
  };
  return destination ? pino(options, destination) : pino(options);
}

/**
 * The path of a request without its query, in which searches and tokens travel, and without the
 * long random parts of a path, which are tokens too.
 */
export function describePath(url: string): string {
  const path = url.split('?')[0] ?? '';
  return path.replace(/\/[A-Za-z0-9_-]{40,}(?=\/|$)/g, '/…');
}

/** A log that says nothing, for tests. */
export const silentLog: Logger = pino({ level: 'silent' });

export type { Logger };
