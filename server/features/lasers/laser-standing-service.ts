import { hashedInputs } from '@shared/model/laser-inputs';
import type { EvaluationInput } from '@shared/model/evaluations';
import type { ScenarioResult } from '@shared/model/evaluation-case';
import { reachOf } from '@shared/model/reach-of';
import type { Reach } from '@shared/model/lasers';
import { localDateAt, type LocalDate } from '@shared/model/local-date';

import { sha256OfJson } from '../../audit-trail/row-hash';
import type { Context } from '../../context/context';
import { NotFound } from '../../http/errors';
import { readSettings } from '../settings/settings-service';
import { attentionRank } from './laser-attention';
import type { LaserSubject } from './laser-life-cycle';
import { inputsOf, type LaserRecord } from './laser-record';
import { findLaser, type LaserStanding, updateLaserStanding } from './laser-repository';
import { countPhotos, findSealedEvaluation, hasOpenEvaluation } from './laser-evaluation-queries';
import { allLaserIds, laserIdsOfArea } from './laser-queries';

export { inputsOf, type LaserRecord, placementOf } from './laser-record';

type Reading = Pick<Context, 'tx'>;
type Dated = Pick<Context, 'tx' | 'now'>;

/** The laser with this id, whatever its place; 404 when there is none. */
export async function requireLaser(ctx: Reading, id: string): Promise<LaserRecord> {
  const laser = await findLaser(ctx.tx, id);
  if (!laser) throw new NotFound('laser');
  return laser;
}

/** SHA-256 of the inputs that an evaluation of this laser rests on, as they are now. */
export function hashOfInputs(laser: Pick<LaserRecord, 'input' | 'area'>): string {
  return sha256OfJson(hashedInputs(inputsOf(laser)));
}

/** Today at the site. */
export async function siteToday(ctx: Dated): Promise<LocalDate> {
  const { zone } = await readSettings(ctx);
  return localDateAt(ctx.now, zone);
}

/** The laser with the facts that its guards look at. */
export async function laserSubject(ctx: Dated, laser: LaserRecord): Promise<LaserSubject> {
  const sealed = await findSealedEvaluation(ctx.tx, laser.id);
  const inputsEqualSealed = sealed?.laser_inputs_hash === hashOfInputs(laser);
  return {
    laser,
    today: await siteToday(ctx),
    photos: await countPhotos(ctx.tx, laser.id),
    inputsEqualSealed,
    hasCurrentEvaluation: inputsEqualSealed && sealed?.state === 'approved',
  };
}

/** As `laserSubject` for a laser that was just stored: nothing hangs on it yet. */
export async function newLaserSubject(ctx: Dated, laser: LaserRecord): Promise<LaserSubject> {
  const today = await siteToday(ctx);
  const none = { photos: 0, inputsEqualSealed: false, hasCurrentEvaluation: false };
  return { laser, today, ...none, isNew: true };
}

/** The attention of a laser whose evaluations have not changed. */
export async function refreshAttention(ctx: Dated, laser: LaserRecord): Promise<void> {
  const rank = attentionRank(laser, await siteToday(ctx));
  await updateLaserStanding(ctx.tx, laser.id, { ...laser, attentionRank: rank });
}

/** Writes what follows for the laser from its evaluations and from the date: reach, attention. */
export async function refreshStanding(ctx: Dated, laserId: string): Promise<void> {
  const laser = await requireLaser(ctx, laserId);
  const standing = await standingOf(ctx, laser);
  const today = await siteToday(ctx);
  await updateLaserStanding(ctx.tx, laserId, {
    ...standing,
    attentionRank: attentionRank({ ...laser, ...standing }, today),
  });
}

/** Ids of all lasers, those that left included. */
export async function everyLaserId(ctx: Reading): Promise<string[]> {
  return (await allLaserIds(ctx.tx)).map(({ id }) => id);
}

/** Ids of the lasers in an area. */
export async function laserIdsIn(ctx: Reading, areaId: string): Promise<string[]> {
  return (await laserIdsOfArea(ctx.tx, areaId)).map(({ id }) => id);
}

async function standingOf(
  ctx: Reading,
  laser: LaserRecord,
): Promise<Omit<LaserStanding, 'attentionRank'>> {
  const sealed = await findSealedEvaluation(ctx.tx, laser.id);
  if (!sealed) {
    const isOpen = await hasOpenEvaluation(ctx.tx, laser.id);
    return { standing: isOpen ? 'open' : 'none', reviewOn: null, reach: null };
  }
  const known = laser.reach?.evaluationId === sealed.id ? laser.reach : undefined;
  return {
    standing: sealed.state,
    reviewOn: sealed.review_on,
    reach: known ? { ...known, state: sealed.state } : sealedReach(sealed),
  };
}

type Sealed = NonNullable<Awaited<ReturnType<typeof findSealedEvaluation>>>;

function sealedReach(sealed: Sealed): Reach | null {
  const input = JSON.parse(sealed.input) as EvaluationInput;
  const reach = reachOf(input, JSON.parse(sealed.results) as ScenarioResult[]);
  if (!reach) return null;
  return {
    ...reach,
    evaluationId: sealed.id,
    evaluationNumber: sealed.number,
    state: sealed.state,
  };
}
