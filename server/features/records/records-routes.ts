import {
  type AuditEntry,
  auditTrailPageSchema,
  auditTrailQuerySchema,
  trailVerificationSchema,
} from '@shared/model/records';

import { type CsvColumn, csvDownload } from '../../http/csv';
import { file, json, route } from '../../http/route';
import { checkTrail, eachEntry, readTrail } from './records-service';

const COLUMNS: readonly CsvColumn<AuditEntry>[] = [
  { header: 'sequence', cell: (entry) => entry.sequence },
  { header: 'at', cell: (entry) => entry.at },
  { header: 'actorName', cell: (entry) => entry.actorName },
  { header: 'actorRole', cell: (entry) => entry.actorRole },
  { header: 'actingFor', cell: (entry) => entry.actingFor },
  { header: 'action', cell: (entry) => entry.action },
  { header: 'recordKind', cell: (entry) => entry.recordKind },
  { header: 'recordId', cell: (entry) => entry.recordId },
  { header: 'recordName', cell: (entry) => entry.recordName },
  { header: 'fromState', cell: (entry) => entry.fromState },
  { header: 'toState', cell: (entry) => entry.toState },
  { header: 'changes', cell: (entry) => JSON.stringify(entry.changes) },
  { header: 'reason', cell: (entry) => entry.reason },
  { header: 'requestId', cell: (entry) => entry.requestId },
  { header: 'via', cell: (entry) => entry.via },
  { header: 'hash', cell: (entry) => entry.hash },
];

export const RECORDS_ROUTES = [
  route({
    method: 'get',
    path: '/api/audit-trail',
    action: 'audit-trail.read',
    summary: 'The audit trail, newest entry first',
    input: { query: auditTrailQuerySchema },
    output: json(auditTrailPageSchema),
    handler: ({ ctx, query }) => readTrail(ctx, query),
  }),
  route({
    method: 'get',
    path: '/api/audit-trail.csv',
    action: 'audit-trail.read',
    summary: 'The same entries as CSV',
    input: { query: auditTrailQuerySchema },
    output: file('text/csv'),
    limit: 'export',
    handler: ({ ctx, query }) => csvDownload('audit-trail.csv', COLUMNS, eachEntry(ctx, query)),
  }),
  route({
    method: 'get',
    path: '/api/audit-trail/verification',
    action: 'audit-trail.verify',
    summary: 'Whether the audit trail is whole and unaltered',
    output: json(trailVerificationSchema),
    limit: 'export',
    handler: ({ ctx }) => checkTrail(ctx),
  }),
];
