import type {
  duplicateQuerySchema,
  duplicatesSchema,
  Laser,
  LaserFilter,
  LaserInput,
  LaserListQuery,
  LaserPage,
  LaserTransition,
} from '@shared/model/lasers';
import type { FieldError } from '@shared/model/problem';
import type { Action } from '@shared/permissions/permissions';
import type { LaserEvent } from '@shared/workflow/laser-life-cycle';
import type * as z from 'zod';

import { changesBetween, recordChange } from '../../audit-trail/record-change';
import { isInScope, reachOf, requireScope } from '../../auth/scope';
import type { Context } from '../../context/context';
import { transact } from '../../context/transact';
import { newId } from '../../db/new-id';
import { Conflict, InvalidInput } from '../../http/errors';
import { requireVersion } from '../../http/etag';
import { evaluationsFollowInputs } from '../evaluations/evaluation-staleness-service';
import { type Attention, attentionOf } from './laser-attention';
import { LASER_WORKFLOW } from './laser-life-cycle';
import { eachLaser, findBySerial, listLasers } from './laser-queries';
import {
  type LaserRecord,
  type PlaceOf,
  placementOf,
  placementOfArea,
  serialKey,
} from './laser-record';
import {
  addPlace,
  findLaserIdByTag,
  findPlace,
  insertLaser,
  isPerson,
  nextTag,
  updateLaserInput,
  updateLaserMarks,
} from './laser-repository';
import { readSearch } from './laser-search-words';
import {
  hashOfInputs,
  laserSubject,
  refreshStanding,
  requireLaser,
  siteToday,
} from './laser-standing-service';
import { enterRegister, moveLaser } from './laser-transition-service';
import { laserRow, laserView } from './laser-view';

type Entrance = Extract<LaserEvent, 'register' | 'declare-found' | 'request-purchase'>;

export async function readLasers(ctx: Context, query: LaserListQuery): Promise<LaserPage> {
  const page = await listLasers(ctx.tx, reachOf(ctx, 'laser.read'), understood(query));
  const today = await siteToday(ctx);
  return { ...page, rows: page.rows.map((laser) => laserRow(laser, today)) };
}

/** Every laser within reach that the filter finds, for an export. */
export function eachLaserInReach(ctx: Context, filter: LaserFilter): AsyncGenerator<LaserRecord> {
  return eachLaser(ctx.tx, reachOf(ctx, 'laser.read'), understood(filter));
}

/** Lasers that the person answers for and that something waits for, worst first. */
export async function readAttention(
  ctx: Context,
  limit: number,
): Promise<{ laser: LaserRecord; attention: Attention[] }[]> {
  const answers = ctx.actor.roles.some((role) => ANSWERING.has(role));
  if (!answers) return [];
  const query = { attention: 'any', sort: 'attention', order: 'asc', limit } as const;
  const page = await listLasers(ctx.tx, reachOf(ctx, 'laser.update'), query);
  const today = await siteToday(ctx);
  return page.rows.map((laser) => ({ laser, attention: attentionOf(laser, today) }));
}

const ANSWERING: ReadonlySet<string> = new Set(['lso', 'deputy-lso', 'laser-supervisor']);

/** Compares the hash of the inputs anew: a reach that no longer holds is stale before it is shown. */
export async function readLaser(ctx: Context, id: string): Promise<Laser> {
  const laser = await requireReadable(ctx, id);
  const { inputsEqualSealed } = await laserSubject(ctx, laser);
  if (laser.standing === 'approved' && !inputsEqualSealed) {
    await transact(ctx.edges, ctx, (writing) => evaluationsFollowInputs(writing, id));
  }
  return laserView(ctx, await requireReadable(ctx, id));
}

/** A new laser, by one of the ways into the register. */
export async function enterLaser(ctx: Context, input: LaserInput, by: Entrance): Promise<Laser> {
  const laser = await storeLaser(ctx, input, by);
  return laserView(ctx, laser);
}

/** As `enterLaser`, for many at once: without the view. */
export async function storeLaser(
  ctx: Context,
  given: LaserInput,
  by: Entrance,
): Promise<LaserRecord> {
  const input = withoutBlanks(given);
  const area = await placeFor(ctx, input);
  const errors = [
    ...(await unknownPeople(ctx, input)),
    ...foreignVerifiedClass(ctx, input, undefined),
    ...(by === 'declare-found' ? missingDescription(input) : outsideScope(ctx, input, area)),
  ];
  if (errors.length > 0) throw new InvalidInput(errors);
  const tag = input.tag ?? (await nextTag(ctx.tx));
  await requireFreeTag(ctx, tag, undefined);
  const id = newId();
  const at = ctx.now.toISOString();
  const state = by === 'request-purchase' ? 'requested' : 'received';
  await insertLaser(ctx.tx, { id, tag, input, area, state, createdBy: ctx.actor.id, at });
  await addPlace(ctx.tx, { laserId: id, areaId: area?.id ?? null, at });
  if (input.disposal) await updateLaserMarks(ctx.tx, id, { disposalAskedBy: ctx.actor.id, at });
  return enterRegister(ctx, await requireLaser(ctx, id), by);
}

/** What would keep this laser from being entered: for a dry run. Nothing is stored. */
export async function entryErrors(ctx: Context, given: LaserInput): Promise<FieldError[]> {
  const input = withoutBlanks(given);
  const area = await placeFor(ctx, input);
  const errors = [...(await unknownPeople(ctx, input)), ...outsideScope(ctx, input, area)];
  if (input.tag && (await findLaserIdByTag(ctx.tx, input.tag))) {
    errors.push({ path: 'tag', message: `The tag ${input.tag} is on record already.` });
  }
  const key = serialKey(input.serial);
  if (key !== null) {
    const [same] = await findBySerial(ctx.tx, { key, maker: input.maker });
    if (same) {
      const message = `${same.tag} of the same maker has this serial already.`;
      errors.push({ path: 'serial', message });
    }
  }
  return errors;
}

export async function changeLaser(
  ctx: Context,
  id: string,
  { version, input: given }: { version: number; input: LaserInput },
): Promise<Laser> {
  const before = await requireReadable(ctx, id);
  requireScope(ctx, 'laser.update', { place: placementOf(before), what: 'laser' });
  requireVersion(before, version);
  if (LASER_WORKFLOW.machine.terminal.includes(before.state)) {
    throw new Conflict('This laser has left the register; its record is closed.');
  }
  const input = withoutBlanks({ ...given, tag: given.tag ?? before.tag });
  const tag = input.tag ?? before.tag;
  const area = await placeFor(ctx, input);
  const errors = [
    ...(await unknownPeople(ctx, input)),
    ...foreignVerifiedClass(ctx, input, before.input),
    ...outsideScope(ctx, input, area),
  ];
  if (errors.length > 0) throw new InvalidInput(errors);
  await requireFreeTag(ctx, tag, id);

  const at = ctx.now.toISOString();
  await updateLaserInput(ctx.tx, before, { input, tag, area, at });
  if (input.areaId !== before.input.areaId) {
    await addPlace(ctx.tx, { laserId: id, areaId: area?.id ?? null, at });
  }
  await recordChange(ctx, {
    action: 'laser.update',
    recordKind: 'laser',
    recordId: id,
    recordName: tag,
    changes: changesBetween({ ...before.input, tag: before.tag }, input),
  });
  await noteDisposal(ctx, before, input);
  await follow(ctx, before);
  return laserView(ctx, await requireLaser(ctx, id));
}

export async function transitionLaser(
  ctx: Context,
  id: string,
  { version, step }: { version: number; step: LaserTransition },
): Promise<Laser> {
  const before = await requireReadable(ctx, id);
  requireScopeEither(ctx, 'laser.transition', before);
  requireVersion(before, version);
  const { event, reason, waiver, areaId } = step;
  const area = areaId === undefined ? undefined : await requirePlace(ctx, areaId);
  const moved = await moveLaser(ctx, before, {
    event,
    input: {
      ...(reason ? { reason } : {}),
      ...(waiver ? { waiver } : {}),
      ...(area ? { area } : {}),
    },
  });
  if (event === 'open-evaluation') await closeIfEvaluated(ctx, moved);
  await follow(ctx, before);
  return laserView(ctx, await requireLaser(ctx, id));
}

/** The evaluation may have been signed before the LSO opened it: then the laser is evaluated. */
async function closeIfEvaluated(ctx: Context, laser: LaserRecord): Promise<void> {
  const { hasCurrentEvaluation } = await laserSubject(ctx, laser);
  if (!hasCurrentEvaluation) return;
  await moveLaser(ctx, laser, { event: 'evaluation-approved', input: {}, bySystem: true });
}

/** Other lasers with the same serial, whatever the spelling. */
export async function readDuplicates(
  ctx: Context,
  query: z.infer<typeof duplicateQuerySchema>,
): Promise<z.infer<typeof duplicatesSchema>> {
  const key = serialKey(query.serial);
  if (key === null) return { lasers: [] };
  const found = await findBySerial(ctx.tx, { key, maker: query.maker, exceptId: query.exceptId });
  return {
    lasers: found.map(({ id, tag, input, area }) => ({
      id,
      tag,
      maker: input.maker,
      model: input.model,
      ...(area ? { areaCode: area.code } : {}),
    })),
  };
}

/** A laser that the person may read; 404 otherwise. */
export async function requireReadable(ctx: Context, id: string): Promise<LaserRecord> {
  const laser = await requireLaser(ctx, id);
  requireScopeEither(ctx, 'laser.read', laser);
  return laser;
}

/** While a laser is handed over, both areas reach it. */
function requireScopeEither(ctx: Context, action: Action, laser: LaserRecord): void {
  const { transferArea } = laser;
  if (transferArea && isInScope(ctx, action, placementOfArea(transferArea))) return;
  requireScope(ctx, action, { place: placementOf(laser), what: 'laser' });
}

/** The filter with its words of search understood. */
function understood<F extends LaserFilter>({ q, ...filter }: F) {
  return { ...filter, search: q ? readSearch(q) : undefined };
}

/** Evaluations and the standing follow, in the same transaction, what the laser has become. */
async function follow(ctx: Context, before: LaserRecord): Promise<void> {
  const after = await requireLaser(ctx, before.id);
  if (hashOfInputs(after) !== hashOfInputs(before)) await evaluationsFollowInputs(ctx, before.id);
  await refreshStanding(ctx, before.id);
}

async function noteDisposal(ctx: Context, before: LaserRecord, input: LaserInput): Promise<void> {
  const asked = Boolean(input.disposal);
  if (asked === Boolean(before.input.disposal)) return;
  await updateLaserMarks(ctx.tx, before.id, {
    disposalAskedBy: asked ? ctx.actor.id : null,
    at: ctx.now.toISOString(),
  });
}

async function placeFor(ctx: Context, input: LaserInput): Promise<PlaceOf | null> {
  return input.areaId === undefined ? null : requirePlace(ctx, input.areaId);
}

async function requirePlace(ctx: Context, areaId: string): Promise<PlaceOf> {
  const place = await findPlace(ctx.tx, areaId);
  if (place) return place;
  throw new InvalidInput([
    { path: 'areaId', message: 'There is no such area.', allowed: 'an area on record' },
  ]);
}

async function unknownPeople(ctx: Context, input: LaserInput): Promise<FieldError[]> {
  const errors: FieldError[] = [];
  for (const path of ['supervisorId', 'alternateId'] as const) {
    const id = input[path];
    if (id !== undefined && !(await isPerson(ctx.tx, id))) {
      errors.push({ path, message: 'There is no such person.', allowed: 'a person on record' });
    }
  }
  return errors;
}

function foreignVerifiedClass(
  ctx: Context,
  input: LaserInput,
  before: LaserInput | undefined,
): FieldError[] {
  if (input.verifiedClass === before?.verifiedClass || ctx.actor.roles.includes('lso')) return [];
  const allowed = before?.verifiedClass
    ? `the class that is on record: ${before.verifiedClass}`
    : 'nothing, until the LSO has verified the class';
  return [
    {
      path: 'verifiedClass',
      message: 'Only the laser safety officer sets the verified class.',
      allowed,
    },
  ];
}

function missingDescription(input: LaserInput): FieldError[] {
  if (input.note) return [];
  return [
    {
      path: 'note',
      message: 'Describe the laser: where it was found, what it looks like, whose it may be.',
      allowed: 'a description',
    },
  ];
}

/** Whoever supervises areas enters lasers there, or lasers of their own. */
function outsideScope(ctx: Context, input: LaserInput, area: PlaceOf | null): FieldError[] {
  if (isInScope(ctx, 'laser.register', placementOf({ input, area }))) return [];
  return [
    {
      path: 'areaId',
      message: area
        ? `You do not supervise ${area.code}. To hand a laser over, use the transfer.`
        : 'Choose the area of the laser.',
      allowed: 'an area that you supervise',
    },
  ];
}

async function requireFreeTag(ctx: Context, tag: string, ownId: string | undefined): Promise<void> {
  const holder = await findLaserIdByTag(ctx.tx, tag);
  if (!holder || holder.id === ownId) return;
  const message = `The tag ${tag} is taken by another laser.`;
  throw new Conflict(message, [{ path: 'tag', message, allowed: 'a tag that is free, or none' }]);
}

/** An empty text is no text. */
function withoutBlanks(input: LaserInput): LaserInput {
  return { ...filled(input), emissions: input.emissions.map(filled) };
}

function filled<T extends object>(record: T): T {
  return Object.fromEntries(
    Object.entries(record).filter(([, value]) => value !== '' && value !== undefined),
  ) as T;
}
