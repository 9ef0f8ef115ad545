import type { Evaluation, Signature } from '@shared/model/evaluations';
import { changedInputs } from '@shared/model/laser-inputs';

import { isInScope } from '../../auth/scope';
import type { Context } from '../../context/context';
import { offeredEvents } from '../../workflow/transition';
import { hashOfInputs, inputsOf, placementOf } from '../lasers/laser-standing-service';
import {
  type EvaluationSubject,
  EVALUATION_WORKFLOW,
  nextStatement,
} from './evaluation-life-cycle';
import type { StoredSignature } from './evaluation-record';
import { findSeal, findSignatures } from './evaluation-repository';
import { changedResults } from './evaluation-results';
import { intactSignatures, isSealIntact } from './evaluation-seal';

/** The evaluation as its page shows it: signatures verified now, inputs compared now. */
export async function evaluationView(
  ctx: Context,
  subject: EvaluationSubject,
): Promise<Evaluation> {
  const { evaluation, laser } = subject;
  const { input, area } = laser;
  const place = placementOf(laser);
  const laserInputsHashNow = hashOfInputs(laser);
  const differs = laserInputsHashNow !== evaluation.laserInputsHash;
  const today = inputsOf(laser);
  const stored = await findSignatures(ctx.tx, evaluation);
  const seal = await findSeal(ctx.tx, evaluation.id);
  const isIntact = seal ? isSealIntact(seal, evaluation, stored) : evaluation.sealedAt === null;
  const intact = intactSignatures(stored, evaluation);
  const isOpen = EDITABLE.has(evaluation.state);
  return {
    id: evaluation.id,
    version: evaluation.version,
    number: evaluation.number,
    laser: {
      id: laser.id,
      tag: laser.tag,
      maker: input.maker,
      model: input.model,
      ...(area ? { areaCode: area.code, areaName: area.name } : {}),
      ...(input.declaredClass ? { declaredClass: input.declaredClass } : {}),
      ...(input.verifiedClass ? { verifiedClass: input.verifiedClass } : {}),
    },
    state: evaluation.state,
    author: evaluation.author,
    ...(evaluation.checker ? { checker: evaluation.checker } : {}),
    ...(evaluation.approver ? { approver: evaluation.approver } : {}),
    input: evaluation.input,
    laserInputs: evaluation.laserInputs,
    laserInputsHash: evaluation.laserInputsHash,
    laserInputsHashNow,
    engineVersion: evaluation.engineVersion,
    results: evaluation.results.map((result) => ({
      ...result,
      conversions: [...result.conversions],
      assumptions: [...result.assumptions],
    })),
    createdAt: evaluation.createdAt,
    updatedAt: evaluation.updatedAt,
    ...(evaluation.signedAt ? { signedAt: evaluation.signedAt } : {}),
    ...(evaluation.reviewOn ? { reviewOn: evaluation.reviewOn } : {}),
    ...(evaluation.supersedesId ? { supersedesId: evaluation.supersedesId } : {}),
    ...(evaluation.supersededById ? { supersededById: evaluation.supersededById } : {}),
    staleReasons: [...evaluation.staleReasons],
    whatChanged: differs && !isOver(evaluation.state) ? changedResults(evaluation, today) : [],
    inputsChanged: differs ? changedInputs(evaluation.laserInputs, today) : [],
    signatures: stored.map((signature, index) =>
      signatureView(signature, isIntact && intact[index] === true),
    ),
    ...(seal ? { sealSha256: seal.sha256 } : {}),
    ...(evaluation.returnComment ? { returnComment: evaluation.returnComment } : {}),
    statement: nextStatement(ctx, subject),
    offered: isInScope(ctx, 'evaluation.transition', place)
      ? offeredEvents(ctx, EVALUATION_WORKFLOW, subject)
      : [],
    mayEdit:
      isOpen && evaluation.author.id === ctx.actor.id && isInScope(ctx, 'evaluation.update', place),
  };
}

const EDITABLE: ReadonlySet<string> = new Set(['draft', 'in-check', 'checked']);

function isOver(state: string): boolean {
  return EVALUATION_WORKFLOW.machine.terminal.includes(state as never);
}

function signatureView(signature: StoredSignature, verified: boolean): Signature {
  const { id, meaning, signerId, signerName, signerRole, actingFor } = signature;
  const { at, zone, statement, comment, proof, sha256 } = signature;
  return {
    ...{ id, meaning, signerId, signerName, signerRole, at, zone, statement, proof, sha256 },
    ...(actingFor ? { actingFor } : {}),
    ...(comment ? { comment } : {}),
    verified,
  };
}
