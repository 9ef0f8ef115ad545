import * as z from 'zod';
import { idSchema, instantSchema, pageOf, pageQuery } from './common';

export const RECORD_KINDS = [
  'account',
  'area',
  'evaluation',
  'laser',
  'laser-file',
  'laser-import',
  'person',
  'session',
  'settings',
] as const;
export const recordKindSchema = z.enum(RECORD_KINDS);
export type RecordKind = z.infer<typeof recordKindSchema>;

/** One entry of the audit trail: append-only, each chained to the one before by SHA-256. */
export const auditEntrySchema = z.strictObject({
  sequence: z.int(),
  at: instantSchema,
  /** Null for what the system did by itself. */
  actorId: idSchema.nullable(),
  actorName: z.string(),
  actorRole: z.string(),
  /** The LSO for whom a deputy acted. */
  actingFor: z.string().nullable(),
  /** What was done: an action of the permission table or an event of a workflow. */
  action: z.string(),
  recordKind: recordKindSchema,
  recordId: z.string(),
  /** What a person calls the record: L-16, B-204. */
  recordName: z.string(),
  fromState: z.string().nullable(),
  toState: z.string().nullable(),
  /** Fields that changed, old value and new value. */
  changes: z.array(z.strictObject({ field: z.string(), before: z.unknown(), after: z.unknown() })),
  reason: z.string().nullable(),
  requestId: z.string(),
  via: z.string(),
  hash: z.string(),
});
export type AuditEntry = z.infer<typeof auditEntrySchema>;

export const auditTrailQuerySchema = z.strictObject({
  ...pageQuery,
  recordKind: recordKindSchema.optional(),
  recordId: idSchema.optional(),
  actorId: idSchema.optional(),
  action: z.string().max(80).optional(),
  /** From this instant, included. */
  from: instantSchema.optional(),
  /** Up to this instant, not included. */
  to: instantSchema.optional(),
});
export const auditTrailPageSchema = pageOf(auditEntrySchema);

export const trailVerificationSchema = z.strictObject({
  intact: z.boolean(),
  entries: z.int(),
  checkpoints: z.int(),
  headHash: z.string(),
  /** First bad entry and what is wrong with it. */
  firstBad: z.strictObject({ sequence: z.int(), problem: z.string() }).nullable(),
});
