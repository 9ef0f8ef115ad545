import { problemSchema } from '@shared/model/problem';
import { isPublic } from '@shared/permissions/permissions';
import * as z from 'zod';
import type { ZodOpenApiOperationObject, ZodOpenApiPathsObject } from 'zod-openapi';

import { isMutating, type Output, type Route } from '../../http/route';

/** The description of the API, made from the declared routes and nothing else. */
export async function describeApi(routes: readonly Route[], publicUrl: string) {
  const paths: ZodOpenApiPathsObject = {};
  for (const route of routes) {
    const path = route.path.replaceAll(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.method]: operationOf(route) };
  }
  // Loaded when somebody asks: a start does not wait for it.
  const { createDocument } = await import('zod-openapi');
  return createDocument({
    openapi: '3.1.0',
    info: {
      title: 'Limen',
      version: '1',
      description:
        'Every refusal is a problem document (RFC 9457). Changes need the session cookie, the ' +
        'value of the cookie XSRF-TOKEN as the header X-XSRF-TOKEN, and an Origin of this site.',
    },
    servers: [{ url: publicUrl }],
    paths,
    components: {
      schemas: { Problem: problemSchema },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'sid' } },
    },
  });
}

function operationOf(route: Route): ZodOpenApiOperationObject {
  const { params, query, body } = route.input;
  const header = headersOf(route);
  return {
    operationId: `${route.method} ${route.path}`,
    summary: route.summary,
    description: `Permission: ${route.action}.`,
    tags: [route.path.split('/')[2]?.replace(/\.\w+$/, '') ?? 'health'],
    security: isPublic(route.action) ? [] : [{ session: [] }],
    requestParams: {
      ...(params ? { path: params } : {}),
      ...(query ? { query } : {}),
      ...(header ? { header } : {}),
    },
    ...(body ? { requestBody: bodyOf(route, body) } : {}),
    responses: {
      [String(route.status) as '200']: answerOf(route.output),
      default: {
        description: 'A refusal',
        content: { 'application/problem+json': { schema: problemSchema } },
      },
    },
  };
}

function headersOf(route: Route): z.ZodObject | undefined {
  if (!isMutating(route.method)) return undefined;
  return z.object({
    'X-XSRF-TOKEN': z.string(),
    ...(route.versioned ? { 'If-Match': z.string().meta({ example: '"3"' }) } : {}),
  });
}

function bodyOf(route: Route, body: z.ZodType) {
  if (!route.multipart)
    return { required: true, content: { 'application/json': { schema: body } } };
  const file = z.string().meta({ override: { type: 'string', format: 'binary' } });
  const schema = z.object({ ...(body instanceof z.ZodObject ? body.shape : {}), file });
  return { required: true, content: { 'multipart/form-data': { schema } } };
}

function answerOf(output: Output) {
  switch (output.kind) {
    case 'json':
      return {
        description: 'Success',
        content: { 'application/json': { schema: output.schema } },
      };
    case 'file':
      return {
        description: 'A file',
        content: { [output.mediaType]: { schema: { type: 'string', format: 'binary' } as const } },
      };
    case 'nothing':
      return { description: 'Done' };
  }
}
