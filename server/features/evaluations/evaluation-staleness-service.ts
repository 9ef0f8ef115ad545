import { changedInputs } from '@shared/model/laser-inputs';

import type { Context } from '../../context/context';
import { NotFound } from '../../http/errors';
import { transition } from '../../workflow/transition';
import {
  hashOfInputs,
  inputsOf,
  laserIdsIn,
  type LaserRecord,
  refreshStanding,
  requireLaser,
} from '../lasers/laser-standing-service';
import { evaluationSubject, EVALUATION_WORKFLOW } from './evaluation-life-cycle';
import type { EvaluationRecord } from './evaluation-record';
import { findEvaluation, findEvaluationsOf, updateEvaluationMarks } from './evaluation-repository';

/**
 * What the evaluations of a laser become when its inputs are no longer theirs: a signed one is
 * stale, one in check is a draft again. Compares hashes; does nothing when all is equal.
 */
export async function evaluationsFollowInputs(ctx: Context, laserId: string): Promise<boolean> {
  const laser = await requireLaser(ctx, laserId);
  const hash = hashOfInputs(laser);
  const states = ['approved', 'in-check', 'checked'] as const;
  const standing = await findEvaluationsOf(ctx.tx, laserId, states);
  const differing = standing.filter(({ laserInputsHash }) => laserInputsHash !== hash);
  for (const evaluation of differing) {
    if (evaluation.state === 'approved') await goStaleByInputs(ctx, evaluation, laser);
    else await backToDraft(ctx, evaluation);
  }
  return differing.length > 0;
}

/** What follows for lasers and evaluations when their area changes: its wall is an input. */
export async function areaChanged(ctx: Context, areaId: string): Promise<void> {
  for (const laserId of await laserIdsIn(ctx, areaId)) {
    await evaluationsFollowInputs(ctx, laserId);
    await refreshStanding(ctx, laserId);
  }
}

/** An evaluation whatever its place; 404 when there is none. */
export async function requireEvaluation(
  ctx: Pick<Context, 'tx'>,
  id: string,
): Promise<EvaluationRecord> {
  const evaluation = await findEvaluation(ctx.tx, id);
  if (!evaluation) throw new NotFound('evaluation');
  return evaluation;
}

/** The review date of a signed evaluation has passed. */
export async function goStaleByReview(ctx: Context, evaluation: EvaluationRecord): Promise<void> {
  await goStale(ctx, evaluation, {
    cause: 'review',
    reasons: [`The review date ${evaluation.reviewOn ?? ''} has passed.`],
  });
}

async function goStaleByInputs(
  ctx: Context,
  evaluation: EvaluationRecord,
  laser: LaserRecord,
): Promise<void> {
  const changes = changedInputs(evaluation.laserInputs, inputsOf(laser));
  const reasons = changes.map(({ field, sealed, today }) => `${field}: ${sealed} → ${today}.`);
  await goStale(ctx, evaluation, { cause: 'inputs', reasons });
}

async function goStale(
  ctx: Context,
  evaluation: EvaluationRecord,
  { cause, reasons }: { cause: 'inputs' | 'review'; reasons: readonly string[] },
): Promise<void> {
  const at = ctx.now.toISOString();
  await updateEvaluationMarks(ctx.tx, evaluation.id, { staleReasons: reasons, at });
  await transition(ctx, EVALUATION_WORKFLOW, {
    subject: await evaluationSubject(ctx, evaluation),
    event: 'go-stale',
    input: { cause, reason: reasons.join(' ').slice(0, 2000) },
    bySystem: true,
  });
}

async function backToDraft(ctx: Context, evaluation: EvaluationRecord): Promise<void> {
  await transition(ctx, EVALUATION_WORKFLOW, {
    subject: await evaluationSubject(ctx, evaluation),
    event: 'input-changed',
    input: { comment: 'The laser’s inputs have changed: take them over and look again.' },
    bySystem: true,
  });
}
