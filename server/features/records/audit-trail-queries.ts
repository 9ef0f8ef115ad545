import type { AuditEntry, auditTrailQuerySchema } from '@shared/model/records';
import type * as z from 'zod';

import type { AuditTrailTable } from '../../audit-trail/audit-trail-table';
import type { Change } from '../../audit-trail/record-change';
import type { Tx } from '../../db/database';
import { countRows, type Page, pageByKey } from '../../db/paging';

export type AuditTrailQuery = z.infer<typeof auditTrailQuerySchema>;

/** Entries, newest first. */
export async function listEntries(tx: Tx, query: AuditTrailQuery): Promise<Page<AuditEntry>> {
  let entries = tx.selectFrom('audit_trail').selectAll();
  if (query.recordKind) entries = entries.where('audit_trail.record_kind', '=', query.recordKind);
  if (query.recordId) entries = entries.where('audit_trail.record_id', '=', query.recordId);
  if (query.actorId) entries = entries.where('audit_trail.actor_id', '=', query.actorId);
  if (query.action) entries = entries.where('audit_trail.action', '=', query.action);
  if (query.from) entries = entries.where('audit_trail.at', '>=', query.from);
  if (query.to) entries = entries.where('audit_trail.at', '<', query.to);
  const page = await pageByKey(entries, {
    keys: [{ column: 'audit_trail.sequence', direction: 'desc', value: (row) => row.sequence }],
    after: query.after,
    limit: query.limit,
    total: await countRows(entries),
  });
  return { ...page, rows: page.rows.map(toEntry) };
}

function toEntry(row: AuditTrailTable): AuditEntry {
  return {
    sequence: row.sequence,
    at: row.at,
    actorId: row.actor_id,
    actorName: row.actor_name,
    actorRole: row.actor_role,
    actingFor: row.acting_for,
    action: row.action,
    recordKind: row.record_kind,
    recordId: row.record_id,
    recordName: row.record_name,
    fromState: row.from_state,
    toState: row.to_state,
    changes: JSON.parse(row.changes) as Change[],
    reason: row.reason,
    requestId: row.request_id,
    via: row.via,
    hash: row.hash,
  };
}
