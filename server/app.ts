import { createHmac } from 'node:crypto';
import { join } from 'node:path';

import express, { type Express } from 'express';

import { signHead } from './audit-trail/checkpoint';
import { purgeAttempts } from './auth/attempt-limit';
import { createGate } from './auth/gate';
import { PACKAGE_ROOT } from './config/package-root';
import type { Edges } from './context/context';
import { ACCOUNT_ROUTES } from './features/account/account-routes';
import { apiDescriptionRoutes } from './features/api-description/api-description-routes';
import { AREAS_ROUTES } from './features/areas/areas-routes';
import { EVALUATE_ROUTES } from './features/evaluate/evaluate-routes';
import { AGEING } from './features/evaluations/evaluation-jobs';
import { EVALUATION_REPORT_ROUTES } from './features/evaluations/evaluation-report-routes';
import { EVALUATIONS_ROUTES } from './features/evaluations/evaluations-routes';
import { HEALTH_ROUTES } from './features/health/health-routes';
import { LASER_IMPORTS_ROUTES } from './features/laser-imports/laser-imports-routes';
import { LASERS_ROUTES } from './features/lasers/lasers-routes';
import { PEOPLE_ROUTES } from './features/people/people-routes';
import { RECORDS_ROUTES } from './features/records/records-routes';
import { SESSION_ROUTES } from './features/session/session-routes';
import { SETTINGS_ROUTES } from './features/settings/settings-routes';
import { TODAY_ROUTES } from './features/today/today-routes';
import { createCsrfGuard } from './http/csrf-guard';
import { inMatchingOrder, mountRoutes } from './http/mount-routes';
import { problemDetails } from './http/problem-details';
import { createRateLimiters } from './http/rate-limits';
import { requestLog } from './http/request-log';
import type { Route } from './http/route';
import { securityHeaders } from './http/security-headers';
import { serveWebClient } from './http/web-client';
import { createJobRunner, type Job, type JobRunner } from './jobs/job-runner';

/** Every route of the product; router, description and tests are made from this list. */
export const ROUTES: readonly Route[] = withDescription([
  ...HEALTH_ROUTES,
  ...SESSION_ROUTES,
  ...ACCOUNT_ROUTES,
  ...PEOPLE_ROUTES,
  ...AREAS_ROUTES,
  ...SETTINGS_ROUTES,
  ...RECORDS_ROUTES,
  ...LASERS_ROUTES,
  ...LASER_IMPORTS_ROUTES,
  ...EVALUATIONS_ROUTES,
  ...EVALUATION_REPORT_ROUTES,
  ...EVALUATE_ROUTES,
  ...TODAY_ROUTES,
]);

export interface App {
  readonly http: Express;
  readonly jobs: JobRunner;
}

/** Puts the parts together; listens to nothing yet. */
export function createApp(edges: Edges, secret: Buffer): App {
  const gate = createGate(edges, keyFor('sessions', secret));
  const csrf = createCsrfGuard(edges.config, keyFor('csrf', secret));
  const limiters = createRateLimiters(edges.config);
  const http = express();
  http.disable('x-powered-by');
  http.set('query parser', 'simple');
  http.set('etag', false);
  http.set('trust proxy', edges.config.trustedProxies);
  http.use(requestLog(edges.log), ...securityHeaders(edges.config));
  http.use('/api', (_req, res, next) => {
    res.setHeader('Cache-Control', 'no-store');
    next();
  });
  http.use('/api', ...gate.handlers, limiters.api, csrf.offerAlways);
  mountRoutes(http, { edges, gate, csrf, limiters }, inMatchingOrder(ROUTES));
  serveWebClient(http, join(PACKAGE_ROOT, 'dist', 'web'));
  http.use(problemDetails(edges.log));

  const housekeeping: Job[] = [
    { name: 'sign-trail-head', periodS: 3600, run: signHead },
    {
      name: 'remove-ended-sessions',
      periodS: 300,
      run: async () => {
        await gate.store.purge();
        await purgeAttempts(edges);
      },
    },
    AGEING,
  ];
  return { http, jobs: createJobRunner(edges, housekeeping) };
}

function withDescription(routes: readonly Route[]): Route[] {
  return [...routes, ...apiDescriptionRoutes(routes)];
}

/** One secret, a key of its own for each purpose. */
function keyFor(purpose: string, secret: Buffer): Buffer {
  return createHmac('sha256', secret).update(purpose).digest();
}
