import type { AuditEntry, RecordKind } from '@shared/model/records';

import { type TrailVerification, verifyTrail } from '../../audit-trail/verify-trail';
import type { Context } from '../../context/context';
import type { Page } from '../../db/paging';
import { type AuditTrailQuery, listEntries } from './audit-trail-queries';

export function readTrail(
  ctx: Pick<Context, 'tx'>,
  query: AuditTrailQuery,
): Promise<Page<AuditEntry>> {
  return listEntries(ctx.tx, query);
}

/** Every entry that the filter finds, page by page, for an export. */
export async function* eachEntry(
  ctx: Pick<Context, 'tx'>,
  query: AuditTrailQuery,
): AsyncGenerator<AuditEntry> {
  let after = query.after;
  do {
    const page = await listEntries(ctx.tx, { ...query, after, limit: 200 });
    yield* page.rows;
    after = page.next ?? undefined;
  } while (after !== undefined);
}

/** What happened to one record. The caller has checked that the person may read the record. */
export function historyOf(
  ctx: Pick<Context, 'tx'>,
  record: { kind: RecordKind; id: string },
  page: { after?: string | undefined; limit: number },
): Promise<Page<AuditEntry>> {
  return listEntries(ctx.tx, { ...page, recordKind: record.kind, recordId: record.id });
}

export function checkTrail(ctx: Pick<Context, 'edges'>): Promise<TrailVerification> {
  return verifyTrail(ctx.edges);
}
