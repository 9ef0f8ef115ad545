import type { RuleSetId } from '@shared/hazard/rule-sets/rule-set-ids';
import type { EvaluationState } from '@shared/workflow/evaluation-life-cycle';

export interface EvaluationTable {
  id: string;
  laser_id: string;
  number: number;
  state: EvaluationState;
  /** Counts how often it became a draft; signatures of former rounds no longer count. */
  round: number;
  author_id: string;
  checker_id: string | null;
  approver_id: string | null;
  rule_set: RuleSetId;
  edition: string;
  /** JSON: `EvaluationInput`. */
  input: string;
  /** JSON: `LaserInputs` as evaluated. */
  laser_inputs: string;
  laser_inputs_hash: string;
  engine_version: string;
  /** JSON: `ScenarioResult[]`. */
  results: string;
  eye_distance_m: number | null;
  skin_distance_m: number | null;
  optical_density: number | null;
  /** From here on a trigger refuses every change of what is sealed. */
  sealed_at: string | null;
  signed_at: string | null;
  review_on: string | null;
  supersedes_id: string | null;
  superseded_by_id: string | null;
  /** JSON: sentences. */
  stale_reasons: string;
  return_comment: string | null;
  created_at: string;
  updated_at: string;
  version: number;
}

export interface EvaluationSignatureTable {
  id: string;
  evaluation_id: string;
  round: number;
  meaning: string;
  signer_id: string;
  signer_name: string;
  signer_role: string;
  acting_for: string | null;
  at: string;
  zone: string;
  statement: string;
  comment: string | null;
  proof: string;
  /** Of the content of the evaluation that was signed. */
  content_sha256: string;
  /** Of the content's hash together with everything above. */
  sha256: string;
}

export interface EvaluationSealTable {
  evaluation_id: string;
  canonical_json: string;
  sha256: string;
  sealed_at: string;
}

declare module '../../db/database' {
  interface Database {
    evaluations: EvaluationTable;
    evaluation_signatures: EvaluationSignatureTable;
    evaluation_seals: EvaluationSealTable;
  }
}
