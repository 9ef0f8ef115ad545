import { isDeepStrictEqual } from 'node:util';

import type { RecordKind } from '@shared/model/records';

import { type Context, SYSTEM } from '../context/context';
import type { AuditTrailTable } from './audit-trail-table';
import { appendEntry, lastEntry } from './audit-trail-repository';
import { signHead } from './checkpoint';
import { GENESIS_HASH, rowHash } from './row-hash';

/** Entries after which the head is signed at once; it is also signed by the hour and at a stop. */
const CHECKPOINT_EVERY = 1000;

export interface Change {
  readonly field: string;
  readonly before: unknown;
  readonly after: unknown;
}

/** One committed change, as a person will read it years later. */
export interface Happening {
  /** An action of the permission table or an event of a workflow. */
  readonly action: string;
  readonly recordKind: RecordKind;
  readonly recordId: string;
  /** What a person calls the record: L-16, B-204. */
  readonly recordName: string;
  readonly fromState?: string | null;
  readonly toState?: string | null;
  readonly changes?: readonly Change[];
  readonly reason?: string | null;
  /** The LSO for whom a deputy acts. */
  readonly actingFor?: string | null;
  /** The product did it as a consequence, not the person who caused it. */
  readonly bySystem?: boolean;
}

/** Writes the entry in the transaction of the change, chained to the entry before. */
export async function recordChange(ctx: Context, happening: Happening): Promise<void> {
  const last = await lastEntry(ctx.tx);
  const actor = happening.bySystem ? SYSTEM : ctx.actor;
  const row: Omit<AuditTrailTable, 'hash'> = {
    sequence: (last?.sequence ?? 0) + 1,
    at: ctx.now.toISOString(),
    actor_id: actor.id === SYSTEM.id ? null : actor.id,
    actor_name: actor.name,
    actor_role: actor.id === SYSTEM.id ? 'system' : actor.roles.join(', '),
    acting_for: happening.actingFor ?? null,
    action: happening.action,
    record_kind: happening.recordKind,
    record_id: happening.recordId,
    record_name: happening.recordName,
    from_state: happening.fromState ?? null,
    to_state: happening.toState ?? null,
    changes: JSON.stringify((happening.changes ?? []).map(withNulls)),
    reason: happening.reason ?? null,
    request_id: ctx.requestId,
    ip: ctx.ip,
    via: ctx.via,
  };
  await appendEntry(ctx.tx, { ...row, hash: rowHash(last?.hash ?? GENESIS_HASH, row) });
  ctx.journal.entries += 1;
  if (row.sequence % CHECKPOINT_EVERY === 0) ctx.afterCommit(() => signHead(ctx.edges));
}

/** The fields of two records of one kind that differ; either may be absent (created, removed). */
export function changesBetween(before: object | null, after: object | null): Change[] {
  const old = new Map<string, unknown>(Object.entries(before ?? {}));
  const now = new Map<string, unknown>(Object.entries(after ?? {}));
  return [...new Set([...old.keys(), ...now.keys()])]
    .filter((field) => !isDeepStrictEqual(old.get(field) ?? null, now.get(field) ?? null))
    .map((field) => ({ field, before: old.get(field) ?? null, after: now.get(field) ?? null }));
}

/** JSON leaves out undefined; an entry says null. */
function withNulls(change: Change): Change {
  return { field: change.field, before: change.before ?? null, after: change.after ?? null };
}
