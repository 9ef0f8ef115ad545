import type { Signature } from '@shared/model/evaluations';
import { addMonths, localDateAt } from '@shared/model/local-date';
import { ROLE_WORDS, type Role } from '@shared/model/people';
import { statementOf } from '@shared/text/statements';
import {
  EVALUATION_LIFE_CYCLE,
  type EvaluationEffect,
  type EvaluationEvent,
  type EvaluationGuard,
  type EvaluationState,
} from '@shared/workflow/evaluation-life-cycle';
import type { Actor as Part } from '@shared/workflow/machine';

import type { Context } from '../../context/context';
import { newId } from '../../db/new-id';
import { type StepInput, transition, type Workflow } from '../../workflow/transition';
import {
  type LaserRecord,
  placementOf,
  refreshStanding,
  requireLaser,
} from '../lasers/laser-standing-service';
import { moveLaser } from '../lasers/laser-transition-service';
import { readSettings } from '../settings/settings-service';
import {
  EVALUATION_GUARDS,
  type EvaluationStep,
  type EvaluationSubject,
} from './evaluation-guards';
import type { EvaluationRecord, StoredSignature } from './evaluation-record';
import {
  type EvaluationMarks,
  findEvaluation,
  findEvaluationsOf,
  findSignatures,
  insertSeal,
  insertSignature,
  updateEvaluationMarks,
} from './evaluation-repository';
import { contentHash, type SealedLaser, sealOf, signatureHash } from './evaluation-seal';

export const EVALUATION_WORKFLOW: Workflow<
  EvaluationSubject,
  EvaluationStep,
  EvaluationState,
  EvaluationEvent,
  EvaluationGuard,
  EvaluationEffect
> = {
  machine: EVALUATION_LIFE_CYCLE,
  recordKind: 'evaluation',
  identify: ({ evaluation, laser, isNew }) => ({
    id: evaluation.id,
    name: evaluationName(evaluation, laser),
    state: isNew ? 'start' : evaluation.state,
  }),
  hasPart,
  guards: EVALUATION_GUARDS,
  moveTo: (ctx, subject, to) => {
    const { state, round } = subject.evaluation;
    const isAnewDraft = to === 'draft' && state !== 'draft';
    return mark(ctx, subject, {
      state: to,
      ...(isAnewDraft ? { round: round + 1, checkerId: null } : {}),
    });
  },
  effects: {
    'sign-prepared': (ctx, subject, input) => sign(ctx, subject, { meaning: 'prepared', input }),
    'sign-reviewed': async (ctx, subject, input) => {
      const checked = await mark(ctx, subject, { checkerId: ctx.actor.id });
      return sign(ctx, checked, { meaning: 'reviewed', input });
    },
    'sign-confirmed': (ctx, subject, input) =>
      sign(ctx, subject, { meaning: 'confirmed-unchanged', input }),
    'sign-withdrawn': (ctx, subject, input) =>
      sign(ctx, subject, { meaning: 'withdrawn', input: { comment: input.reason } }),
    'note-return': (ctx, subject, { reason, comment }) =>
      mark(ctx, subject, { returnComment: reason ?? comment ?? null }),
    seal,
    'supersede-predecessor': supersedePredecessors,
    'refresh-laser-reach': async (ctx, subject) => {
      await refreshStanding(ctx, subject.laser.id);
      return reread(ctx, subject);
    },
    'move-laser': moveTheLaser,
    'new-review-date': (ctx, subject) =>
      mark(ctx, subject, { reviewOn: nextReview(ctx, subject), staleReasons: [] }),
    'block-laser': blockTheLaser,
  },
};

export type { EvaluationStep, EvaluationSubject };

/** "L-16, evaluation 2" */
export function evaluationName(
  evaluation: Pick<EvaluationRecord, 'number'>,
  laser: Pick<LaserRecord, 'tag'>,
): string {
  return `${laser.tag}, evaluation ${evaluation.number}`;
}

/** The evaluation with its laser and the site's settings, as they are now. */
export async function evaluationSubject(
  ctx: Pick<Context, 'tx'>,
  evaluation: EvaluationRecord,
): Promise<EvaluationSubject> {
  return {
    evaluation,
    laser: await requireLaser(ctx, evaluation.laserId),
    settings: await readSettings(ctx),
  };
}

/** The sentence that would be signed by the next signature; empty where none is to come. */
export function nextStatement(ctx: Pick<Context, 'now'>, subject: EvaluationSubject): string {
  const meaning = NEXT_MEANING[subject.evaluation.state];
  return meaning ? statementFor(ctx, subject, meaning) : '';
}

const NEXT_MEANING: Readonly<Partial<Record<EvaluationState, Signature['meaning']>>> = {
  draft: 'prepared',
  'in-check': 'reviewed',
  checked: 'approved',
  approved: 'withdrawn',
  stale: 'confirmed-unchanged',
};

function hasPart(
  part: Part,
  { evaluation, laser }: EvaluationSubject,
  { actor }: Context,
): boolean {
  switch (part) {
    case 'anyone':
      return true;
    case 'lso':
    case 'deputy-lso':
    case 'committee':
      return actor.roles.includes(part);
    case 'supervisor':
      return (
        actor.roles.includes('laser-supervisor') &&
        placementOf(laser).supervisorIds.includes(actor.id)
      );
    case 'author':
      return evaluation.author.id === actor.id;
    case 'checker':
      return evaluation.checker?.id === actor.id;
    default:
      return false;
  }
}

async function sign(
  ctx: Context,
  subject: EvaluationSubject,
  { meaning, input }: { meaning: Signature['meaning']; input: StepInput },
): Promise<EvaluationSubject> {
  const { evaluation, settings } = subject;
  const signature: Omit<StoredSignature, 'sha256'> = {
    id: newId(),
    evaluationId: evaluation.id,
    round: evaluation.round,
    meaning,
    signerId: ctx.actor.id,
    signerName: ctx.actor.name,
    signerRole: signingRole(ctx.actor.roles),
    actingFor: null,
    at: ctx.now.toISOString(),
    zone: settings.zone,
    statement: statementFor(ctx, subject, meaning),
    comment: input.comment ?? null,
    proof: ctx.proof ?? 'signed-in session',
    contentSha256: contentHash(evaluation),
  };
  await insertSignature(ctx.tx, { ...signature, sha256: signatureHash(signature) });
  return subject;
}

async function seal(
  ctx: Context,
  subject: EvaluationSubject,
  input: EvaluationStep,
): Promise<EvaluationSubject> {
  await sign(ctx, subject, { meaning: 'approved', input });
  const at = ctx.now.toISOString();
  const sealed = await mark(ctx, subject, {
    approverId: ctx.actor.id,
    signedAt: at,
    sealedAt: at,
    reviewOn: nextReview(ctx, subject),
    staleReasons: [],
  });
  const signatures = await findSignatures(ctx.tx, sealed.evaluation);
  const whole = sealOf(sealed.evaluation, sealedLaser(sealed.laser), signatures);
  await insertSeal(ctx.tx, sealed.evaluation.id, whole);
  return sealed;
}

async function supersedePredecessors(
  ctx: Context,
  subject: EvaluationSubject,
): Promise<EvaluationSubject> {
  const { id, laserId, number } = subject.evaluation;
  const standing = await findEvaluationsOf(ctx.tx, laserId, ['approved', 'stale']);
  for (const evaluation of standing.filter((other) => other.id !== id)) {
    const input = { supersededById: id, reason: `Evaluation ${number} was signed.` };
    const moved = await transition(ctx, EVALUATION_WORKFLOW, {
      subject: await evaluationSubject(ctx, evaluation),
      event: 'supersede',
      input,
      bySystem: true,
    });
    await mark(ctx, moved, { supersededById: id });
  }
  return subject;
}

/** The laser follows its evaluation: evaluated once signed, out of use once stale. */
async function moveTheLaser(
  ctx: Context,
  subject: EvaluationSubject,
  { cause, reason }: EvaluationStep,
): Promise<EvaluationSubject> {
  const { evaluation } = subject;
  const laser = await requireLaser(ctx, evaluation.laserId);
  if (evaluation.state === 'approved' && laser.state === 'under-evaluation') {
    await moveLaser(ctx, laser, { event: 'evaluation-approved', input: {}, bySystem: true });
  }
  if (evaluation.state === 'stale' && laser.state === 'in-use') {
    await takeOutOfUse(ctx, laser, { cause, reason, subject });
  }
  return reread(ctx, subject);
}

async function takeOutOfUse(
  ctx: Context,
  laser: LaserRecord,
  { cause, reason, subject }: EvaluationStep & { subject: EvaluationSubject },
): Promise<void> {
  const number = subject.evaluation.number;
  if (cause === 'inputs') {
    const input = {
      reason: `Evaluation ${number} became stale: ${reason ?? 'its inputs changed.'}`,
    };
    await moveLaser(ctx, laser, { event: 'change-notice', input, bySystem: true });
    return;
  }
  const today = localDateAt(ctx.now, subject.settings.zone);
  // A running waiver lets it be used until then, as the waiver says.
  if (laser.waiver && laser.waiver.untilOn >= today) return;
  const input = {
    reason: `The review date of evaluation ${number} has passed.`,
    blockCause: 'review-passed' as const,
  };
  await moveLaser(ctx, laser, { event: 'block', input, bySystem: true });
}

const BLOCKABLE: ReadonlySet<string> = new Set([
  'registered',
  'under-evaluation',
  'evaluated',
  'commissioning',
  'in-use',
  'change-open',
  'service-open',
]);

async function blockTheLaser(
  ctx: Context,
  subject: EvaluationSubject,
  { reason }: EvaluationStep,
): Promise<EvaluationSubject> {
  const laser = await requireLaser(ctx, subject.laser.id);
  if (BLOCKABLE.has(laser.state)) {
    const input = {
      reason: `Evaluation ${subject.evaluation.number} was withdrawn: ${reason ?? ''}`,
      blockCause: 'evaluation-withdrawn' as const,
    };
    await moveLaser(ctx, laser, { event: 'block', input, bySystem: true });
  }
  return reread(ctx, subject);
}

function statementFor(
  ctx: Pick<Context, 'now'>,
  subject: EvaluationSubject,
  meaning: Signature['meaning'],
): string {
  const { evaluation, laser } = subject;
  const setsReview = meaning === 'approved' || meaning === 'confirmed-unchanged';
  return statementOf(meaning, {
    number: evaluation.number,
    tag: laser.tag,
    edition: evaluation.edition,
    reviewOn: setsReview ? nextReview(ctx, subject) : undefined,
  });
}

function nextReview(ctx: Pick<Context, 'now'>, { settings }: EvaluationSubject): string {
  return addMonths(localDateAt(ctx.now, settings.zone), settings.evaluationReviewMonths);
}

/** The role in which somebody acts here: the one that the step is for. */
function signingRole(roles: readonly Role[]): string {
  const order: readonly Role[] = ['lso', 'deputy-lso', 'committee', 'laser-supervisor'];
  const role = order.find((one) => roles.includes(one)) ?? roles[0];
  return role ? ROLE_WORDS[role] : 'No role';
}

function sealedLaser({ id, tag, input, area }: LaserRecord): SealedLaser {
  return {
    id,
    tag,
    maker: input.maker,
    model: input.model,
    serial: input.serial ?? null,
    areaCode: area?.code ?? null,
    areaName: area?.name ?? null,
    declaredClass: input.declaredClass ?? null,
    verifiedClass: input.verifiedClass ?? null,
  };
}

async function mark(
  ctx: Context,
  subject: EvaluationSubject,
  marks: EvaluationMarks,
): Promise<EvaluationSubject> {
  await updateEvaluationMarks(ctx.tx, subject.evaluation.id, {
    ...marks,
    at: ctx.now.toISOString(),
  });
  return reread(ctx, subject);
}

async function reread(ctx: Context, subject: EvaluationSubject): Promise<EvaluationSubject> {
  const evaluation = await findEvaluation(ctx.tx, subject.evaluation.id);
  if (!evaluation) throw new Error('An evaluation vanished within a transaction.');
  const laser = await requireLaser(ctx, evaluation.laserId);
  return { ...subject, evaluation, laser, isNew: false };
}
