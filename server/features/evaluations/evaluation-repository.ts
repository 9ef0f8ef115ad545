import type { ScenarioResult } from '@shared/model/evaluation-case';
import type { EvaluationInput, LaserInputs } from '@shared/model/evaluations';
import type { EvaluationState } from '@shared/workflow/evaluation-life-cycle';
import { sql } from 'kysely';

import type { Tx } from '../../db/database';
import type { EvaluationRecord, ResultSummary, Seal, StoredSignature } from './evaluation-record';
import type { EvaluationSignatureTable, EvaluationTable } from './evaluation-table';

type JoinedRow = EvaluationTable & {
  author_name: string;
  checker_name: string | null;
  approver_name: string | null;
};

function selectEvaluations(tx: Tx) {
  return tx
    .selectFrom('evaluations')
    .innerJoin('people as authors', 'authors.id', 'evaluations.author_id')
    .leftJoin('people as checkers', 'checkers.id', 'evaluations.checker_id')
    .leftJoin('people as approvers', 'approvers.id', 'evaluations.approver_id')
    .selectAll('evaluations')
    .select([
      'authors.name as author_name',
      'checkers.name as checker_name',
      'approvers.name as approver_name',
    ]);
}

export async function findEvaluation(tx: Tx, id: string): Promise<EvaluationRecord | undefined> {
  const row = await selectEvaluations(tx).where('evaluations.id', '=', id).executeTakeFirst();
  return row && toEvaluation(row);
}

/** Evaluations of a laser in one of these states, newest first. */
export async function findEvaluationsOf(
  tx: Tx,
  laserId: string,
  states: readonly EvaluationState[],
): Promise<EvaluationRecord[]> {
  const rows = await selectEvaluations(tx)
    .where('evaluations.laser_id', '=', laserId)
    .where('evaluations.state', 'in', states)
    .orderBy('evaluations.number', 'desc')
    .execute();
  return rows.map(toEvaluation);
}

export async function nextNumber(tx: Tx, laserId: string): Promise<number> {
  const { last } = await tx
    .selectFrom('evaluations')
    .select(sql<number>`coalesce(max(evaluations.number), 0)`.as('last'))
    .where('evaluations.laser_id', '=', laserId)
    .executeTakeFirstOrThrow();
  return last + 1;
}

export async function insertEvaluation(tx: Tx, evaluation: EvaluationRecord): Promise<void> {
  await tx
    .insertInto('evaluations')
    .values({
      ...contentColumns(evaluation),
      id: evaluation.id,
      laser_id: evaluation.laserId,
      number: evaluation.number,
      state: evaluation.state,
      round: evaluation.round,
      author_id: evaluation.author.id,
      checker_id: null,
      approver_id: null,
      sealed_at: null,
      signed_at: null,
      review_on: null,
      supersedes_id: evaluation.supersedesId,
      superseded_by_id: null,
      stale_reasons: JSON.stringify(evaluation.staleReasons),
      return_comment: evaluation.returnComment,
      created_at: evaluation.createdAt,
      updated_at: evaluation.updatedAt,
      version: evaluation.version,
    })
    .execute();
}

/** What the author decides, with the results that follow, in the next version. */
export async function updateEvaluationContent(
  tx: Tx,
  evaluation: EvaluationRecord,
  at: string,
): Promise<void> {
  await tx
    .updateTable('evaluations')
    .set({ ...contentColumns(evaluation), return_comment: null, updated_at: at })
    .set((column) => ({ version: column('version', '+', 1) }))
    .where('evaluations.id', '=', evaluation.id)
    .execute();
}

/** Fields that steps of the life cycle write. */
export interface EvaluationMarks {
  readonly state?: EvaluationState;
  readonly round?: number;
  readonly checkerId?: string | null;
  readonly approverId?: string;
  readonly sealedAt?: string;
  readonly signedAt?: string;
  readonly reviewOn?: string;
  readonly supersededById?: string;
  readonly staleReasons?: readonly string[];
  readonly returnComment?: string | null;
}

/** Marks of the life cycle, in the next version. */
export async function updateEvaluationMarks(
  tx: Tx,
  id: string,
  marks: EvaluationMarks & { at: string },
): Promise<void> {
  await tx
    .updateTable('evaluations')
    .set({ ...markColumns(marks), updated_at: marks.at })
    .set((column) => ({ version: column('version', '+', 1) }))
    .where('evaluations.id', '=', id)
    .execute();
}

export async function insertSignature(tx: Tx, signature: StoredSignature): Promise<void> {
  await tx
    .insertInto('evaluation_signatures')
    .values({
      id: signature.id,
      evaluation_id: signature.evaluationId,
      round: signature.round,
      meaning: signature.meaning,
      signer_id: signature.signerId,
      signer_name: signature.signerName,
      signer_role: signature.signerRole,
      acting_for: signature.actingFor,
      at: signature.at,
      zone: signature.zone,
      statement: signature.statement,
      comment: signature.comment,
      proof: signature.proof,
      content_sha256: signature.contentSha256,
      sha256: signature.sha256,
    })
    .execute();
}

/** Signatures of the present round, oldest first. */
export async function findSignatures(
  tx: Tx,
  { id, round }: { id: string; round: number },
): Promise<StoredSignature[]> {
  const rows = await tx
    .selectFrom('evaluation_signatures')
    .selectAll()
    .where('evaluation_signatures.evaluation_id', '=', id)
    .where('evaluation_signatures.round', '=', round)
    .orderBy('evaluation_signatures.at')
    .orderBy(sql`evaluation_signatures.rowid`)
    .execute();
  return rows.map(toSignature);
}

export async function insertSeal(tx: Tx, evaluationId: string, seal: Seal): Promise<void> {
  await tx
    .insertInto('evaluation_seals')
    .values({
      evaluation_id: evaluationId,
      canonical_json: seal.canonicalJson,
      sha256: seal.sha256,
      sealed_at: seal.sealedAt,
    })
    .execute();
}

export async function findSeal(tx: Tx, evaluationId: string): Promise<Seal | undefined> {
  const row = await tx
    .selectFrom('evaluation_seals')
    .selectAll()
    .where('evaluation_seals.evaluation_id', '=', evaluationId)
    .executeTakeFirst();
  return row && { canonicalJson: row.canonical_json, sha256: row.sha256, sealedAt: row.sealed_at };
}

function contentColumns(evaluation: EvaluationRecord) {
  const { summary } = evaluation;
  return {
    rule_set: evaluation.ruleSet,
    edition: evaluation.edition,
    input: JSON.stringify(evaluation.input),
    laser_inputs: JSON.stringify(evaluation.laserInputs),
    laser_inputs_hash: evaluation.laserInputsHash,
    engine_version: evaluation.engineVersion,
    results: JSON.stringify(evaluation.results),
    eye_distance_m: summary.eyeDistanceM,
    skin_distance_m: summary.skinDistanceM,
    optical_density: summary.opticalDensity,
  };
}

function markColumns(marks: EvaluationMarks) {
  const columns: readonly (readonly [column: keyof EvaluationTable, value: unknown])[] = [
    ['state', marks.state],
    ['round', marks.round],
    ['checker_id', marks.checkerId],
    ['approver_id', marks.approverId],
    ['sealed_at', marks.sealedAt],
    ['signed_at', marks.signedAt],
    ['review_on', marks.reviewOn],
    ['superseded_by_id', marks.supersededById],
    ['stale_reasons', marks.staleReasons && JSON.stringify(marks.staleReasons)],
    ['return_comment', marks.returnComment],
  ];
  const given = columns.filter(([, value]) => value !== undefined);
  return Object.fromEntries(given) as Partial<EvaluationTable>;
}

function toEvaluation(row: JoinedRow): EvaluationRecord {
  const summary: ResultSummary = {
    eyeDistanceM: row.eye_distance_m,
    skinDistanceM: row.skin_distance_m,
    opticalDensity: row.optical_density,
  };
  return {
    id: row.id,
    version: row.version,
    laserId: row.laser_id,
    number: row.number,
    state: row.state,
    round: row.round,
    author: { id: row.author_id, name: row.author_name },
    checker: personRef(row.checker_id, row.checker_name),
    approver: personRef(row.approver_id, row.approver_name),
    ruleSet: row.rule_set,
    edition: row.edition,
    input: JSON.parse(row.input) as EvaluationInput,
    laserInputs: JSON.parse(row.laser_inputs) as LaserInputs,
    laserInputsHash: row.laser_inputs_hash,
    engineVersion: row.engine_version,
    results: JSON.parse(row.results) as ScenarioResult[],
    summary,
    sealedAt: row.sealed_at,
    signedAt: row.signed_at,
    reviewOn: row.review_on,
    supersedesId: row.supersedes_id,
    supersededById: row.superseded_by_id,
    staleReasons: JSON.parse(row.stale_reasons) as string[],
    returnComment: row.return_comment,
    createdAt: row.created_at,
    updatedAt: row.updated_at,
  };
}

function personRef(id: string | null, name: string | null) {
  return id !== null && name !== null ? { id, name } : null;
}

function toSignature(row: EvaluationSignatureTable): StoredSignature {
  return {
    id: row.id,
    evaluationId: row.evaluation_id,
    round: row.round,
    meaning: row.meaning as StoredSignature['meaning'],
    signerId: row.signer_id,
    signerName: row.signer_name,
    signerRole: row.signer_role,
    actingFor: row.acting_for,
    at: row.at,
    zone: row.zone,
    statement: row.statement,
    comment: row.comment,
    proof: row.proof,
    contentSha256: row.content_sha256,
    sha256: row.sha256,
  };
}
