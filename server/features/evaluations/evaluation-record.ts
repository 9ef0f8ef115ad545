import type { RuleSetId } from '@shared/hazard/rule-sets/rule-set-ids';
import type { PersonRef } from '@shared/model/common';
import type { ScenarioResult } from '@shared/model/evaluation-case';
import type { EvaluationInput, LaserInputs, Signature } from '@shared/model/evaluations';
import type { EvaluationState } from '@shared/workflow/evaluation-life-cycle';

/** An evaluation as stored. */
export interface EvaluationRecord {
  readonly id: string;
  readonly version: number;
  readonly laserId: string;
  readonly number: number;
  readonly state: EvaluationState;
  readonly round: number;
  readonly author: PersonRef;
  readonly checker: PersonRef | null;
  readonly approver: PersonRef | null;
  readonly ruleSet: RuleSetId;
  readonly edition: string;
  readonly input: EvaluationInput;
  readonly laserInputs: LaserInputs;
  readonly laserInputsHash: string;
  readonly engineVersion: string;
  readonly results: readonly ScenarioResult[];
  readonly summary: ResultSummary;
  readonly sealedAt: string | null;
  readonly signedAt: string | null;
  readonly reviewOn: string | null;
  readonly supersedesId: string | null;
  readonly supersededById: string | null;
  readonly staleReasons: readonly string[];
  readonly returnComment: string | null;
  readonly createdAt: string;
  readonly updatedAt: string;
}

/** The worst of all situations, for lists; null while nothing is evaluated. */
export interface ResultSummary {
  readonly eyeDistanceM: number | null;
  readonly skinDistanceM: number | null;
  readonly opticalDensity: number | null;
}

/** The canonical JSON of a signed evaluation, and its SHA-256. */
export interface Seal {
  readonly canonicalJson: string;
  readonly sha256: string;
  readonly sealedAt: string;
}

/** A signature as stored: its hash covers all of it, and the content that was signed. */
export interface StoredSignature extends Omit<Signature, 'verified' | 'actingFor' | 'comment'> {
  readonly evaluationId: string;
  readonly round: number;
  readonly actingFor: string | null;
  readonly comment: string | null;
  readonly contentSha256: string;
}
