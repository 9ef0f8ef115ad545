import { createHash } from 'node:crypto';

import { canonicalJson, sha256OfJson } from '../../audit-trail/row-hash';
import type { EvaluationRecord, Seal, StoredSignature } from './evaluation-record';

/** The laser as it was called when the evaluation was sealed. */
export interface SealedLaser {
  readonly id: string;
  readonly tag: string;
  readonly maker: string;
  readonly model: string;
  readonly serial: string | null;
  readonly areaCode: string | null;
  readonly areaName: string | null;
  readonly declaredClass: string | null;
  readonly verifiedClass: string | null;
}

interface SealDocument {
  readonly format: 'limen-evaluation-seal';
  readonly formatVersion: 1;
  readonly content: ReturnType<typeof signedContent>;
  readonly laser: SealedLaser;
  readonly signatures: readonly StoredSignature[];
  readonly checkerId: string | null;
  readonly approverId: string | null;
  readonly signedAt: string | null;
  readonly reviewOn: string | null;
}

/** Everything of an evaluation that a signature vouches for. */
function signedContent(evaluation: EvaluationRecord) {
  return {
    evaluationId: evaluation.id,
    laserId: evaluation.laserId,
    number: evaluation.number,
    authorId: evaluation.author.id,
    supersedesId: evaluation.supersedesId,
    ruleSet: evaluation.ruleSet,
    edition: evaluation.edition,
    engineVersion: evaluation.engineVersion,
    input: evaluation.input,
    laserInputs: evaluation.laserInputs,
    laserInputsHash: evaluation.laserInputsHash,
    results: evaluation.results,
    summary: evaluation.summary,
  };
}

export function contentHash(evaluation: EvaluationRecord): string {
  return sha256OfJson(signedContent(evaluation));
}

/** The hash of a signature: of who, when, what it means and the hash of what was signed. */
export function signatureHash(signature: Omit<StoredSignature, 'sha256'>): string {
  // Named one by one: a signature read back must not bring its own hash along.
  const { id, evaluationId, round, meaning, signerId, signerName, signerRole } = signature;
  const { actingFor, at, zone, statement, comment, proof, contentSha256 } = signature;
  return sha256OfJson({
    ...{ id, evaluationId, round, meaning, signerId, signerName, signerRole },
    ...{ actingFor, at, zone, statement, comment, proof, contentSha256 },
  });
}

/** The canonical JSON of a signed evaluation, and its SHA-256. */
export function sealOf(
  evaluation: EvaluationRecord,
  laser: SealedLaser,
  signatures: readonly StoredSignature[],
): Seal {
  const document: SealDocument = {
    format: 'limen-evaluation-seal',
    formatVersion: 1,
    content: signedContent(evaluation),
    laser,
    signatures: signatures.filter((signature) => SEALED_MEANINGS.has(signature.meaning)),
    checkerId: evaluation.checker?.id ?? null,
    approverId: evaluation.approver?.id ?? null,
    signedAt: evaluation.signedAt,
    reviewOn: evaluation.reviewOn,
  };
  const text = canonicalJson(document);
  return { canonicalJson: text, sha256: sha256(text), sealedAt: evaluation.sealedAt ?? '' };
}

const SEALED_MEANINGS: ReadonlySet<string> = new Set(['prepared', 'reviewed', 'approved']);

/** Whether the seal is whole and the stored evaluation is still what was sealed. */
export function isSealIntact(
  seal: Seal,
  evaluation: EvaluationRecord,
  signatures: readonly StoredSignature[],
): boolean {
  if (sha256(seal.canonicalJson) !== seal.sha256) return false;
  const sealed = JSON.parse(seal.canonicalJson) as SealDocument;
  const now = sealOf({ ...evaluation, reviewOn: sealed.reviewOn }, sealed.laser, signatures);
  const wasConfirmed = signatures.some(({ meaning }) => meaning === 'confirmed-unchanged');
  return (
    now.sha256 === seal.sha256 &&
    seal.sealedAt === evaluation.sealedAt &&
    (wasConfirmed || evaluation.reviewOn === sealed.reviewOn)
  );
}

/** Whether each signature is whole, and signs what the evaluation says now. */
export function intactSignatures(
  signatures: readonly StoredSignature[],
  evaluation: EvaluationRecord,
): readonly boolean[] {
  const content = signatures.length > 0 ? contentHash(evaluation) : '';
  return signatures.map(
    (signature) =>
      signature.evaluationId === evaluation.id &&
      signature.contentSha256 === content &&
      signature.sha256 === signatureHash(signature),
  );
}

function sha256(text: string): string {
  return createHash('sha256').update(text).digest('hex');
}
