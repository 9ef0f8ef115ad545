import { isPublic, scopeOf } from '@shared/permissions/permissions';
import express, { type Request, type RequestHandler, type Response } from 'express';
import type * as z from 'zod';

import { countAttempt, forgetAttempts } from '../auth/attempt-limit';
import { actorOf, type Gate, isPasswordOf } from '../auth/gate';
import { hashOfSid } from '../auth/session-store';
import {
  type Acting,
  type Actor,
  type Context,
  type Edges,
  reading,
  SYSTEM,
} from '../context/context';
import { transact } from '../context/transact';
import type { CsrfGuard } from './csrf-guard';
import { type Download, sendDownload } from './download';
import {
  InvalidInput,
  NotAllowed,
  NotFound,
  NotSignedIn,
  ProofFailed,
  UnsupportedMedia,
} from './errors';
import { parseIfMatch } from './etag';
import { fieldErrors, wordsFor } from './field-errors';
import { limited, type RateLimiters } from './rate-limits';
import { type Call, isMutating, type Route, type Visit } from './route';
import { unstorableTexts } from './text-check';
import { discardUpload, receiveUpload } from './upload';

export interface Server {
  readonly edges: Edges;
  readonly gate: Gate;
  readonly csrf: CsrfGuard;
  readonly limiters: RateLimiters;
}

/** The whole way of a request through a declared route, in the order in which it may be refused. */
export function serveRoute(server: Server, route: Route): RequestHandler {
  const parseJson = express.json({ limit: route.maxBodyBytes, strict: true, type: isJson });
  return async (req, res) => {
    const actor = authorize(route, actorOf(req));
    if (isMutating(route.method)) server.csrf.require(req);
    if (route.limit) await limited(server.limiters[route.limit], req, res);
    const version = route.versioned ? parseIfMatch(req.get('if-match')) : 0;
    const upload = route.multipart
      ? await receiveUpload(req, res, {
          multipart: route.multipart,
          folder: server.edges.files.uploadFolder,
        })
      : undefined;
    try {
      if (!upload) await readBody(route, parseJson, { req, res });
      const input = parseInput(route, req);
      const proof = route.provesPresence ? await provePresence(server, req, actor) : null;
      const call = { ...input, version, upload, visit: visitOf(server, req, res) };
      const acting = {
        actor: actor ?? SYSTEM,
        requestId: String(req.id),
        ip: req.ip ?? '',
        via: 'web',
        proof,
      };
      const result = await run(server.edges, route, { acting, actor, call });
      await respond(route, result, res);
    } finally {
      if (upload) await discardUpload(upload.path);
    }
  };
}

/** Refuses whoever may not do this anywhere; the service then checks the record's place. */
function authorize(route: Route, actor: Actor | undefined): Actor | undefined {
  if (isPublic(route.action)) return actor;
  if (!actor) throw new NotSignedIn();
  if (scopeOf(route.action, actor.roles) === undefined) throw new NotAllowed();
  return actor;
}

async function readBody(
  route: Route,
  parseJson: RequestHandler,
  { req, res }: { req: Request; res: Response },
): Promise<void> {
  if (!isMutating(route.method)) return;
  const hasBody =
    req.headers['transfer-encoding'] !== undefined || Number(req.get('content-length')) > 0;
  const type = req.get('content-type');
  if ((hasBody || type !== undefined) && !(type !== undefined && isJson(req))) {
    throw new UnsupportedMedia('Send the body as application/json.');
  }
  await limited(parseJson, req, res);
}

function isJson(req: { headers: { 'content-type'?: string | undefined } }): boolean {
  return /^application\/json\s*(;\s*charset\s*=\s*"?utf-8"?\s*)?$/i.test(
    req.headers['content-type'] ?? '',
  );
}

type ParsedInput = Pick<Call<never, never>, 'params' | 'query' | 'body'>;

function parseInput(route: Route, req: Request): ParsedInput {
  const { params, query, body } = route.input;
  // An id that cannot be one is the address of nothing.
  const parsedParams = params?.safeParse(req.params);
  if (parsedParams?.success === false) throw new NotFound();
  const errors = [...unstorableTexts(req.query), ...unstorableTexts(req.body)];
  if (errors.length > 0) throw new InvalidInput(errors);
  const parsedQuery = parseQuery(query, req.query);
  const parsedBody = body
    ? parse(body, req.body ?? {})
    : { value: undefined, errors: unknownBody(route, req) };
  const all = [...parsedQuery.errors, ...parsedBody.errors];
  if (all.length > 0) throw new InvalidInput(all);
  return {
    params: parsedParams?.data,
    query: parsedQuery.value,
    body: parsedBody.value,
  } as unknown as ParsedInput;
}

function parse(schema: z.ZodType, value: unknown) {
  const parsed = schema.safeParse(value, { error: wordsFor });
  return parsed.success
    ? { value: parsed.data, errors: [] }
    : { value: undefined, errors: fieldErrors(parsed.error) };
}

function parseQuery(schema: z.ZodType | undefined, query: Request['query']) {
  const given = Object.entries(query);
  const twice = given.filter(([, value]) => Array.isArray(value));
  const unexpected = schema ? twice : given;
  if (unexpected.length === 0 && schema) return parse(schema, query);
  const words = schema ? 'is given more than once; give it once' : 'is not known here';
  const errors = unexpected.map(([path]) => ({ path, message: `${path} ${words}.` }));
  return { value: undefined, errors };
}

function unknownBody(route: Route, req: Request) {
  if (!isMutating(route.method)) return [];
  const body: unknown = req.body;
  const keys = typeof body === 'object' && body !== null ? Object.keys(body) : [];
  return keys.map((path) => ({ path, message: `${path} is not known here.` }));
}

/** Outside the transaction: a failed proof must count although nothing else is stored. */
async function provePresence(
  { edges, gate }: Server,
  req: Request,
  actor: Actor | undefined,
): Promise<string | null> {
  const { password } = (req.body ?? {}) as { password?: unknown };
  if (!actor || typeof password !== 'string' || password === '') return null;
  const account = `proof ${actor.id}`;
  const ip = req.ip ?? '';
  try {
    await countAttempt(edges, account, ip);
  } catch (error) {
    // Whoever fails this often may not be the person: the session ends.
    await gate.end(req);
    throw error;
  }
  if (!(await isPasswordOf(edges, actor.id, password))) throw new ProofFailed();
  await forgetAttempts(edges, account, ip);
  return 'password';
}

function visitOf({ gate, csrf }: Server, req: Request, res: Response): Visit {
  return {
    // Routes outside /api have no session.
    sidHash: hashOfSid(req.sessionID ?? ''),
    check: (credentials) => gate.check(req, res, credentials),
    begin: async (personId) => {
      await gate.begin(req, personId);
      csrf.offer(req, res, req.sessionID);
    },
    end: async () => {
      await gate.end(req);
      res.clearCookie(gate.sessionCookie, { path: '/' });
      csrf.offer(req, res, undefined);
    },
  };
}

async function run(
  edges: Edges,
  route: Route,
  given: { acting: Acting; actor: Actor | undefined; call: object },
): Promise<unknown> {
  const handle = (ctx: Context): unknown => {
    // In a public route the handler sees that nobody is signed in; entries then name the system.
    const seen = isPublic(route.action) ? { ...ctx, actor: given.actor } : ctx;
    return route.handler({ ...given.call, ctx: seen } as unknown as Parameters<
      Route['handler']
    >[0]);
  };
  if (route.transaction === 'write') {
    return transact(edges, given.acting, async (ctx) => handle(ctx));
  }
  return handle(reading(edges, given.acting));
}

async function respond(route: Route, result: unknown, res: Response): Promise<void> {
  res.status(route.status);
  if (route.location) res.setHeader('Location', route.location(result));
  if (route.output.kind === 'nothing') {
    res.end();
    return;
  }
  if (route.output.kind === 'file') {
    await sendDownload(res, result as Download);
    return;
  }
  const body: unknown = route.output.schema.parse(result);
  const version = (body as { version?: unknown } | null)?.version;
  if (typeof version === 'number') res.setHeader('ETag', `"${version}"`);
  res.type('application/json').send(JSON.stringify(body));
}
