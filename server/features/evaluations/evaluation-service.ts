import type {
  beginEvaluationSchema,
  Evaluation,
  EvaluationInput,
  evaluationListQuerySchema,
  EvaluationRow,
  EvaluationTransition,
} from '@shared/model/evaluations';
import { proposeScenarios } from '@shared/model/propose-scenarios';
import type { FieldError } from '@shared/model/problem';
import type * as z from 'zod';

import { changesBetween, recordChange } from '../../audit-trail/record-change';
import { reachOf, requireScope } from '../../auth/scope';
import { type Context, pick } from '../../context/context';
import { transact } from '../../context/transact';
import { newId } from '../../db/new-id';
import type { Page } from '../../db/paging';
import type { Download } from '../../http/download';
import { Conflict, InvalidInput, NotAllowed, NotFound } from '../../http/errors';
import { requireVersion } from '../../http/etag';
import { transition } from '../../workflow/transition';
import {
  hashOfInputs,
  inputsOf,
  type LaserRecord,
  placementOf,
  refreshStanding,
  requireLaser,
} from '../lasers/laser-standing-service';
import { readSettings } from '../settings/settings-service';
import {
  evaluationName,
  type EvaluationSubject,
  evaluationSubject,
  EVALUATION_WORKFLOW,
} from './evaluation-life-cycle';
import { listEvaluations } from './evaluation-queries';
import type { EvaluationRecord } from './evaluation-record';
import {
  findEvaluation,
  findEvaluationsOf,
  findSeal,
  findSignatures,
  insertEvaluation,
  nextNumber,
  updateEvaluationContent,
} from './evaluation-repository';
import { adaptedTo, computed } from './evaluation-results';
import { isSealIntact } from './evaluation-seal';
import { evaluationsFollowInputs } from './evaluation-staleness-service';
import { evaluationView } from './evaluation-view';

export async function readEvaluations(
  ctx: Context,
  query: z.infer<typeof evaluationListQuerySchema>,
): Promise<Page<EvaluationRow>> {
  const { authorMayApprove } = await readSettings(ctx);
  const viewer = { actor: ctx.actor, reach: reachOf(ctx, 'evaluation.read'), authorMayApprove };
  return listEvaluations(ctx.tx, viewer, query);
}

/** Compares the hashes anew: what no longer rests on the laser's inputs is stale before it is shown. */
export async function readEvaluation(ctx: Context, id: string): Promise<Evaluation> {
  const { evaluation, laser } = await requireReadable(ctx, id);
  const follows = FOLLOWING.has(evaluation.state);
  if (follows && hashOfInputs(laser) !== evaluation.laserInputsHash) {
    await transact(ctx.edges, pick(ctx), (writing) => evaluationsFollowInputs(writing, laser.id));
  }
  return evaluationView(ctx, await requireReadable(ctx, id));
}

const FOLLOWING: ReadonlySet<string> = new Set(['approved', 'in-check', 'checked']);

export async function beginEvaluation(
  ctx: Context,
  { laserId, fromId }: z.infer<typeof beginEvaluationSchema>,
): Promise<Evaluation> {
  const laser = await requireLaser(ctx, laserId);
  const place = placementOf(laser);
  requireScope(ctx, 'laser.read', { place, what: 'laser' });
  requireScope(ctx, 'evaluation.begin', { place, what: 'laser' });
  await requireNoOther(ctx, laser);
  const settings = await readSettings(ctx);
  const inputs = inputsOf(laser);
  const input = fromId
    ? adaptedTo(inputs, await requireOfLaser(ctx, fromId, laserId))
    : emptyInput(settings.ruleSet, proposeScenarios(inputs, settings.ruleSet));
  const [predecessor] = await findEvaluationsOf(ctx.tx, laserId, ['approved', 'stale']);
  const at = ctx.now.toISOString();
  const evaluation: EvaluationRecord = {
    ...computed(inputs, input),
    id: newId(),
    version: 1,
    laserId,
    number: await nextNumber(ctx.tx, laserId),
    state: 'draft',
    round: 1,
    author: { id: ctx.actor.id, name: ctx.actor.name },
    checker: null,
    approver: null,
    sealedAt: null,
    signedAt: null,
    reviewOn: null,
    supersedesId: predecessor?.id ?? null,
    supersededById: null,
    staleReasons: [],
    returnComment: null,
    createdAt: at,
    updatedAt: at,
  };
  await insertEvaluation(ctx.tx, evaluation);
  const subject = await transition(ctx, EVALUATION_WORKFLOW, {
    subject: { ...(await evaluationSubject(ctx, evaluation)), isNew: true },
    event: 'begin',
    input: {},
    changes: changesBetween(null, contentOf(evaluation)),
  });
  await refreshStanding(ctx, laserId);
  return evaluationView(ctx, subject);
}

/** Only the author changes an evaluation; one in check becomes a draft again. */
export async function changeEvaluation(
  ctx: Context,
  id: string,
  { version, input }: { version: number; input: EvaluationInput },
): Promise<Evaluation> {
  const subject = await requireEditable(ctx, id, version);
  requireUniqueScenarios(input);
  return storeContent(ctx, subject, {
    action: 'evaluation.update',
    content: computed(subject.evaluation.laserInputs, input),
  });
}

/** Takes the laser's present lines into the draft. */
export async function refreshInputs(
  ctx: Context,
  id: string,
  version: number,
): Promise<Evaluation> {
  const subject = await requireEditable(ctx, id, version);
  const inputs = inputsOf(subject.laser);
  const input = adaptedTo(inputs, subject.evaluation);
  return storeContent(ctx, subject, {
    action: 'evaluation.refresh-inputs',
    content: computed(inputs, input),
  });
}

export async function transitionEvaluation(
  ctx: Context,
  id: string,
  { version, step }: { version: number; step: EvaluationTransition },
): Promise<Evaluation> {
  const subject = await requireReadable(ctx, id);
  const place = placementOf(subject.laser);
  requireScope(ctx, 'evaluation.transition', { place, what: 'evaluation' });
  requireVersion(subject.evaluation, version);
  const { event, reason, comment } = step;
  const moved = await transition(ctx, EVALUATION_WORKFLOW, {
    subject,
    event,
    input: { ...(reason ? { reason } : {}), ...(comment ? { comment } : {}) },
  });
  await refreshStanding(ctx, subject.laser.id);
  return evaluationView(ctx, await evaluationSubject(ctx, moved.evaluation));
}

/** The sealed text itself, once it is verified. */
export async function readSeal(ctx: Context, id: string): Promise<Download> {
  const { evaluation, laser } = await requireReadable(ctx, id);
  const seal = await findSeal(ctx.tx, id);
  if (!seal) throw new NotFound('seal');
  const signatures = await findSignatures(ctx.tx, evaluation);
  if (!isSealIntact(seal, evaluation, signatures)) {
    throw new Conflict('The seal does not verify: the stored record is not what was sealed.');
  }
  return {
    fileName: `${laser.tag}-evaluation-${evaluation.number}-seal.json`,
    mediaType: 'application/json; charset=utf-8',
    body: seal.canonicalJson,
  };
}

/** An evaluation that the person may read, with its laser; 404 otherwise. */
async function requireReadable(ctx: Context, id: string): Promise<EvaluationSubject> {
  const evaluation = await findEvaluation(ctx.tx, id);
  if (!evaluation) throw new NotFound('evaluation');
  const subject = await evaluationSubject(ctx, evaluation);
  const place = placementOf(subject.laser);
  requireScope(ctx, 'evaluation.read', { place, what: 'evaluation' });
  return subject;
}

async function requireEditable(
  ctx: Context,
  id: string,
  version: number,
): Promise<EvaluationSubject> {
  const subject = await requireReadable(ctx, id);
  const { evaluation, laser } = subject;
  requireScope(ctx, 'evaluation.update', { place: placementOf(laser), what: 'evaluation' });
  requireVersion(evaluation, version);
  if (evaluation.author.id !== ctx.actor.id) {
    throw new NotAllowed(`Only the author, ${evaluation.author.name}, changes this evaluation.`);
  }
  if (evaluation.state === 'draft') return subject;
  if (evaluation.state === 'in-check' || evaluation.state === 'checked') {
    return transition(ctx, EVALUATION_WORKFLOW, { subject, event: 'input-changed', input: {} });
  }
  throw new Conflict('What is signed, discarded or withdrawn is not changed; begin a new version.');
}

async function storeContent(
  ctx: Context,
  subject: EvaluationSubject,
  { action, content }: { action: string; content: ReturnType<typeof computed> },
): Promise<Evaluation> {
  const before = subject.evaluation;
  await updateEvaluationContent(ctx.tx, { ...before, ...content }, ctx.now.toISOString());
  await recordChange(ctx, {
    action,
    recordKind: 'evaluation',
    recordId: before.id,
    recordName: evaluationName(before, subject.laser),
    changes: changesBetween(contentOf(before), contentOf(content)),
  });
  await refreshStanding(ctx, subject.laser.id);
  return evaluationView(ctx, await requireReadable(ctx, before.id));
}

/** What the audit entry tells: decisions and inputs; the results follow from them. */
function contentOf({
  input,
  laserInputs,
}: Pick<EvaluationRecord, 'input' | 'laserInputs'>): object {
  return { ...input, laserInputs };
}

const LEFT: ReadonlySet<string> = new Set(['rejected', 'withdrawn', 'transferred', 'disposed']);

async function requireNoOther(ctx: Context, laser: LaserRecord): Promise<void> {
  if (LEFT.has(laser.state)) throw new Conflict('This laser has left the register.');
  const states = ['draft', 'in-check', 'checked'] as const;
  const [open] = await findEvaluationsOf(ctx.tx, laser.id, states);
  if (open) {
    throw new Conflict(
      `${evaluationName(open, laser)} by ${open.author.name} is in work already. Finish or discard it.`,
    );
  }
}

async function requireOfLaser(
  ctx: Context,
  id: string,
  laserId: string,
): Promise<EvaluationRecord> {
  const from = await findEvaluation(ctx.tx, id);
  if (from?.laserId === laserId) return from;
  throw new InvalidInput([
    {
      path: 'fromId',
      message: 'There is no such evaluation of this laser.',
      allowed: 'an evaluation of the same laser',
    },
  ]);
}

function requireUniqueScenarios({ scenarios }: EvaluationInput): void {
  const errors: FieldError[] = scenarios.flatMap(({ id }, index) =>
    scenarios.findIndex((other) => other.id === id) === index
      ? []
      : [{ path: `scenarios[${index}].id`, message: `Two situations have the id "${id}".` }],
  );
  if (errors.length > 0) throw new InvalidInput(errors);
}

function emptyInput(
  ruleSet: EvaluationInput['ruleSet'],
  scenarios: EvaluationInput['scenarios'],
): EvaluationInput {
  return { ruleSet, scenarios, notCovered: [], assumptions: [] };
}
