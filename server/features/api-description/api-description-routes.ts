import * as z from 'zod';

import { file, json, type Route, route } from '../../http/route';
import { apiPage } from './api-page';
import { describeApi } from './open-api';

/** The description of all routes, these two included. */
export function apiDescriptionRoutes(others: readonly Route[]): Route[] {
  const all: Route[] = [];
  let document: Awaited<ReturnType<typeof describeApi>> | undefined;
  const own = [
    route({
      method: 'get',
      path: '/api/openapi.json',
      action: 'api-description.read',
      summary: 'The contract of the API, OpenAPI 3.1',
      output: json(z.record(z.string(), z.unknown())),
      handler: async ({ ctx }) => {
        document ??= await describeApi(all, ctx.edges.config.publicUrl);
        return { ...document };
      },
    }),
    route({
      method: 'get',
      path: '/api/docs',
      action: 'api-description.read',
      summary: 'The same as a page to read',
      output: file('text/html'),
      handler: () => ({
        fileName: 'api.html',
        mediaType: 'text/html; charset=utf-8',
        body: apiPage(all),
        inline: true,
      }),
    }),
  ];
  all.push(...others, ...own);
  return own;
}
