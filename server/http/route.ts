import { idSchema } from '@shared/model/common';
import type { Action, PERMISSIONS } from '@shared/permissions/permissions';
import * as z from 'zod';

import type { Credentials } from '../auth/gate';
import type { Actor, Context } from '../context/context';
import type { Download } from './download';

export type Method = 'get' | 'post' | 'put' | 'delete';

type PublicAction = {
  [A in Action]: (typeof PERMISSIONS)[A] extends { scope: 'public' } ? A : never;
}[Action];

/** What a handler of a public route knows of its caller. */
export type OpenContext = Omit<Context, 'actor'> & { readonly actor: Actor | undefined };

type ContextOf<A extends Action> = A extends PublicAction ? OpenContext : Context;

/** Sign-in and sign-out, for the handlers of sessions. */
export interface Visit {
  readonly sidHash: string;
  check(credentials: Credentials): Promise<Actor | undefined>;
  /** Starts a session with a new id and a new CSRF token. */
  begin(personId: string): Promise<void>;
  end(): Promise<void>;
}

/** An uploaded file, checked by its content, in a temporary place that is emptied afterwards. */
export interface Upload {
  readonly path: string;
  /** Name on the person's computer: shown, never used as a path. */
  readonly name: string;
  readonly mediaType: string;
  readonly sizeBytes: number;
}

export type UploadKind = 'pdf' | 'png' | 'jpeg' | 'webp' | 'csv';

/** Extra limits beside the one for every request. */
export type LimitName = 'calculation' | 'export' | 'upload' | 'search';

/**
 * What a route answers: JSON of a schema, nothing (204), or a file of a media type.
 */
export type Output =
  | { readonly kind: 'json'; readonly schema: z.ZodType }
  | { readonly kind: 'nothing' }
  | { readonly kind: 'file'; readonly mediaType: string };

type Result<O extends Output> = O extends { kind: 'json'; schema: infer S extends z.ZodType }
  ? z.input<S>
  : O extends { kind: 'file' }
    ? Download
    : void;

type Parsed<S> = S extends z.ZodType ? z.output<S> : undefined;

export interface Input {
  readonly params?: z.ZodObject;
  readonly query?: z.ZodObject;
  readonly body?: z.ZodType;
}

/** What a handler gets: everything parsed, nothing of the request itself. */
export interface Call<A extends Action, I extends Input> {
  readonly ctx: ContextOf<A>;
  readonly params: Parsed<I['params']>;
  readonly query: Parsed<I['query']>;
  readonly body: Parsed<I['body']>;
  /** From If-Match; 0 in a route that is not versioned. */
  readonly version: number;
  readonly visit: Visit;
  /** The file of a multipart route. */
  readonly upload: Upload;
}

export interface RouteSpec<A extends Action, I extends Input, O extends Output> {
  readonly method: Method;
  /** Express form: `/api/areas/:id`. */
  readonly path: string;
  readonly action: A;
  /** One line for the description of the API. */
  readonly summary: string;
  readonly input?: I;
  readonly output: O;
  /** Needs If-Match; the service compares with `requireVersion`. */
  readonly versioned?: boolean;
  /**
   * How `ctx.tx` is opened: a transaction for writing (all but GET), the reading connection (GET),
   * or `own`: the reading connection, and the handler opens transactions by `transact`.
   */
  readonly transaction?: 'write' | 'read' | 'own';
  /** The body may carry `password`: it is checked before the transaction and gives `ctx.proof`. */
  readonly provesPresence?: boolean;
  readonly multipart?: { readonly maxBytes: number; readonly kinds: readonly UploadKind[] };
  readonly maxBodyBytes?: number;
  readonly limit?: LimitName;
  /** Status of success; 200 when absent, 204 for nothing. */
  readonly status?: 201 | 202;
  /** Address of what was created. */
  readonly location?: (result: Result<O>) => string;
  readonly handler: (call: Call<A, I>) => Promise<Result<O>> | Result<O>;
}

/** A declared route, its types erased: what router, OpenAPI and tests read. */
export interface Route {
  readonly method: Method;
  readonly path: string;
  readonly action: Action;
  readonly summary: string;
  readonly input: Input;
  readonly output: Output;
  readonly versioned: boolean;
  readonly transaction: 'write' | 'read' | 'own';
  readonly provesPresence: boolean;
  readonly multipart: RouteSpec<Action, Input, Output>['multipart'];
  readonly maxBodyBytes: number;
  readonly limit: LimitName | undefined;
  readonly status: number;
  readonly location: ((result: unknown) => string) | undefined;
  readonly handler: (call: Call<Action, Input>) => unknown;
}

const MAX_BODY_BYTES = 100_000;

export function route<A extends Action, const I extends Input, const O extends Output>(
  spec: RouteSpec<A, I, O>,
): Route {
  return {
    method: spec.method,
    path: spec.path,
    action: spec.action,
    summary: spec.summary,
    input: spec.input ?? {},
    output: spec.output,
    versioned: spec.versioned ?? false,
    transaction: spec.transaction ?? (spec.method === 'get' ? 'read' : 'write'),
    provesPresence: spec.provesPresence ?? false,
    multipart: spec.multipart,
    maxBodyBytes: spec.maxBodyBytes ?? MAX_BODY_BYTES,
    limit: spec.limit,
    status: spec.status ?? (spec.output.kind === 'nothing' ? 204 : 200),
    location: spec.location as Route['location'],
    handler: spec.handler as unknown as Route['handler'],
  };
}

export function json<S extends z.ZodType>(schema: S): { kind: 'json'; schema: S } {
  return { kind: 'json', schema };
}

export const NOTHING = { kind: 'nothing' } as const satisfies Output;

export function file(mediaType: string): { kind: 'file'; mediaType: string } {
  return { kind: 'file', mediaType };
}

/** `:id` in a path. */
export const idParams = z.strictObject({ id: idSchema });

export function isMutating(method: Method): boolean {
  return method !== 'get';
}
