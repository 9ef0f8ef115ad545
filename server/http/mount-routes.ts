import type { Express, RequestHandler } from 'express';

import { MethodNotAllowed, NotFound } from './errors';
import type { Method, Route } from './route';
import { type Server, serveRoute } from './serve-route';

/** Mounts the declared routes, a 405 for other methods of their paths, and a 404 for the rest. */
export function mountRoutes(app: Express, server: Server, routes: readonly Route[]): void {
  for (const route of routes) app[route.method](route.path, serveRoute(server, route));
  for (const [path, methods] of methodsByPath(routes)) app.all(path, methodNotAllowed(methods));
  app.all('/api{/*path}', () => {
    throw new NotFound('address');
  });
}

/** Static paths before those with parameters: `/lasers/duplicates` is no laser's id. */
export function inMatchingOrder(routes: readonly Route[]): Route[] {
  return [...routes].sort((a, b) => parameterCount(a.path) - parameterCount(b.path));
}

function parameterCount(path: string): number {
  return path.split('/').filter((part) => part.includes(':')).length;
}

function methodsByPath(routes: readonly Route[]): Map<string, Method[]> {
  const methods = new Map<string, Method[]>();
  for (const { path, method } of routes) methods.set(path, [...(methods.get(path) ?? []), method]);
  return methods;
}

function methodNotAllowed(methods: readonly Method[]): RequestHandler {
  const allowed = methods.map((method) => method.toUpperCase());
  if (methods.includes('get')) allowed.push('HEAD');
  return (req) => {
    throw new MethodNotAllowed(req.method, allowed);
  };
}
