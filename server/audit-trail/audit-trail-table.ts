import type { RecordKind } from '@shared/model/records';

export interface AuditTrailTable {
  sequence: number;
  at: string;
  actor_id: string | null;
  actor_name: string;
  actor_role: string;
  acting_for: string | null;
  action: string;
  record_kind: RecordKind;
  record_id: string;
  record_name: string;
  from_state: string | null;
  to_state: string | null;
  /** JSON: fields with their old and new value. */
  changes: string;
  reason: string | null;
  request_id: string;
  ip: string;
  via: string;
  /** SHA-256 of the hash before and the canonical JSON of this row without its hash. */
  hash: string;
}

export interface TrailCheckpointTable {
  sequence: number;
  hash: string;
  at: string;
  /** Ed25519 over the canonical JSON of the three fields above, base64. */
  signature: string;
}

declare module '../db/database' {
  interface Database {
    audit_trail: AuditTrailTable;
    trail_checkpoints: TrailCheckpointTable;
  }
}
