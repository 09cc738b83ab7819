/** Builds the web application without listening. */
import { existsSync } from 'node:fs';
import path from 'node:path';
import express, { type Express, type RequestHandler } from 'express';
import helmet from 'helmet';
import { requireCsrfToken } from './auth/csrf.ts';
import { createPassport, createSessions } from './auth/sign-in.ts';
import type { Deps } from './deps.ts';
import { NotFoundError } from './errors.ts';
import { accountRoutes } from './routes/account-routes.ts';
import { activityRoutes } from './routes/activity-routes.ts';
import { boxRoutes } from './routes/box-routes.ts';
import { calendarRoutes } from './routes/calendar-routes.ts';
import { filingRoutes } from './routes/filings-routes.ts';
import { healthRoutes } from './routes/health-routes.ts';
import { holdRoutes } from './routes/holds-routes.ts';
import { householdRoutes } from './routes/household-routes.ts';
import { outflowRoutes } from './routes/outflow-routes.ts';
import { paperRoutes } from './routes/papers-routes.ts';
import { createProblemHandler } from './routes/problem-handler.ts';
import { reminderRoutes } from './routes/reminder-routes.ts';
import { ruleTableRoutes } from './routes/rule-table-routes.ts';
import { scanRoutes } from './routes/scan-routes.ts';
import { sessionRoutes } from './routes/session-routes.ts';
import { shredListRoutes } from './routes/shred-lists-routes.ts';
import { subjectRoutes } from './routes/subjects-routes.ts';

export interface App {
  express: Express;
  /** Closes what the application itself opened (not what it was given). */
  close(): Promise<void>;
}

const clientFolder = path.resolve(import.meta.dirname, '..', 'dist');

/** Wires routes to what they need. Everything that touches the outside comes in through `deps`. */
export function createApp(deps: Deps): App {
  const { config, log, clock } = deps;
  const app = express();
  const sessions = createSessions(config, log);
  const passport = createPassport(config, clock);

  app.disable('x-powered-by');
  app.set('trust proxy', config.trustProxy);
  app.set('query parser', 'simple');
  app.use(
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          defaultSrc: ["'self'"],
          baseUri: ["'none'"],
          connectSrc: ["'self'"],
          fontSrc: ["'self'"],
          formAction: ["'self'"],
          frameAncestors: ["'none'"],
          imgSrc: ["'self'", 'blob:', 'data:'],
          objectSrc: ["'none'"],
          scriptSrc: ["'self'"],
          // Dialogs and messages place themselves with inline styles.
          styleSrc: ["'self'", "'unsafe-inline'"],
          workerSrc: ["'self'"],
        },
      },
      strictTransportSecurity: config.hasSecureCookies,
      referrerPolicy: { policy: 'same-origin' },
    }),
  );

  const api = express.Router();
  // Answers hold people's papers: no shared cache keeps them.
  api.use('/api', (_request, response, next) => {
    response.set('Cache-Control', 'private, no-store');
    next();
  });
  api.use(healthRoutes(deps));
  api.use(calendarRoutes(deps));
  api.use('/api', express.json({ limit: '1mb' }), sessions.handler);
  api.use('/api', passport.initialize() as RequestHandler, passport.session() as RequestHandler);
  api.use('/api', (request, _response, next) => {
    request.caller = request.user;
    next();
  });
  api.use('/api', requireCsrfToken);
  api.use(sessionRoutes(passport));
  api.use(accountRoutes(deps));
  api.use(householdRoutes(deps));
  api.use(outflowRoutes(deps));
  api.use(boxRoutes(deps));
  api.use(scanRoutes(deps));
  api.use(paperRoutes(deps));
  api.use(holdRoutes(deps));
  api.use(subjectRoutes(deps));
  api.use(filingRoutes(deps));
  api.use(shredListRoutes(deps));
  api.use(reminderRoutes(deps));
  api.use(activityRoutes(deps));
  api.use(ruleTableRoutes(deps));
  app.use(api);
  app.use('/api', () => {
    throw new NotFoundError();
  });

  serveClient(app);
  app.use(createProblemHandler(log));
  return { express: app, close: () => sessions.close() };
}

/** The built client; every address that is not a file opens it. */
function serveClient(app: Express): void {
  if (!existsSync(path.join(clientFolder, 'index.html'))) return;
  app.use(
    '/assets',
    express.static(path.join(clientFolder, 'assets'), {
      immutable: true,
      maxAge: '1y',
      index: false,
    }),
  );
  app.use(express.static(clientFolder, { index: false }));
  app.get('/{*any}', (_request, response) => {
    response.set('Cache-Control', 'no-cache').sendFile(path.join(clientFolder, 'index.html'));
  });
}
