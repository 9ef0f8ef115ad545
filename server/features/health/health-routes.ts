import * as z from 'zod';

import { json, route } from '../../http/route';
import { checkReady } from './health-service';

const healthSchema = z.strictObject({ status: z.literal('ok') });

/** Both at the root, where supervisors look, and beside the rest of the API. */
export const HEALTH_ROUTES = ['', '/api'].flatMap((prefix) => [
  route({
    method: 'get',
    path: `${prefix}/healthz`,
    action: 'health.read',
    summary: 'Whether the process answers',
    output: json(healthSchema),
    handler: () => ({ status: 'ok' as const }),
  }),
  route({
    method: 'get',
    path: `${prefix}/readyz`,
    action: 'health.read',
    summary: 'Whether the database takes writes; 503 when not',
    output: json(healthSchema),
    handler: async ({ ctx }) => {
      await checkReady(ctx);
      return { status: 'ok' as const };
    },
  }),
]);
