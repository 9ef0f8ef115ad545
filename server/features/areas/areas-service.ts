import type { Area, AreaInput, AreaListQuery } from '@shared/model/areas';
import type { FieldError } from '@shared/model/problem';
import type { Placement } from '@shared/permissions/permissions';

import { changesBetween, recordChange } from '../../audit-trail/record-change';
import { isInScope, reachOf, requireScope } from '../../auth/scope';
import type { Context } from '../../context/context';
import { newId } from '../../db/new-id';
import type { Page } from '../../db/paging';
import { Conflict, InvalidInput, NotFound } from '../../http/errors';
import { requireVersion } from '../../http/etag';
import { findPersonName } from '../people/people-service';
import { type AreaRow, findAreaRow, listAreas } from './area-queries';
import {
  findArea,
  findAreaByCode,
  insertArea,
  type StoredArea,
  updateArea,
} from './area-repository';

export async function readAreas(ctx: Context, query: AreaListQuery): Promise<Page<Area>> {
  const page = await listAreas(ctx.tx, query, reachOf(ctx, 'area.read'));
  return { ...page, rows: page.rows.map((row) => forReader(ctx, row)) };
}

export async function readArea(ctx: Context, id: string): Promise<Area> {
  const row = await findAreaRow(ctx.tx, id);
  if (!row) throw new NotFound('area');
  requireScope(ctx, 'area.read', { place: placementOf(row), what: 'area' });
  return forReader(ctx, row);
}

/** Every area within reach, page by page, for an export. */
export async function* eachArea(ctx: Context, query: AreaListQuery): AsyncGenerator<Area> {
  let after = query.after;
  do {
    const page = await readAreas(ctx, { ...query, after, limit: 200 });
    yield* page.rows;
    after = page.next ?? undefined;
  } while (after !== undefined);
}

export async function createArea(ctx: Context, input: AreaInput): Promise<Area> {
  await requireUsable(ctx, input, undefined);
  const area: StoredArea = {
    ...withoutBlanks(input),
    id: newId(),
    version: 1,
    createdAt: ctx.now.toISOString(),
  };
  await insertArea(ctx.tx, area);
  await recordArea(ctx, 'area.create', { before: null, after: area });
  return readStored(ctx, area.id);
}

export async function changeArea(
  ctx: Context,
  id: string,
  { version, input }: { version: number; input: AreaInput },
): Promise<Area> {
  const before = await requireArea(ctx, id);
  const place = placementOf(before);
  requireScope(ctx, 'area.read', { place, what: 'area' });
  requireScope(ctx, 'area.update', { place, what: 'area' });
  requireVersion(before, version);
  await requireUsable(ctx, input, id);
  const { createdAt } = before;
  const after: StoredArea = { ...withoutBlanks(input), id, createdAt, version: version + 1 };
  await updateArea(ctx.tx, after);
  await recordArea(ctx, 'area.update', { before, after });
  await ctx.edges.consequences.areaChanged(ctx, id);
  return readStored(ctx, id);
}

/** An area whatever its place, for a service that checks scope itself; 404 when there is none. */
export async function requireArea(ctx: Pick<Context, 'tx'>, id: string): Promise<StoredArea> {
  const area = await findArea(ctx.tx, id);
  if (!area) throw new NotFound('area');
  return area;
}

/** What decides whether records of the area lie within a scope. */
export function placementOf(
  area: Pick<AreaInput, 'department' | 'supervisorId' | 'alternateId'>,
): Placement {
  return {
    department: area.department,
    supervisorIds: [area.supervisorId, area.alternateId].filter((id) => id !== undefined),
  };
}

async function readStored(ctx: Context, id: string): Promise<Area> {
  const row = await findAreaRow(ctx.tx, id);
  if (!row) throw new NotFound('area');
  return forReader(ctx, row);
}

function forReader(ctx: Context, row: AreaRow): Area {
  return { ...row, mayEdit: isInScope(ctx, 'area.update', placementOf(row)) };
}

async function requireUsable(ctx: Context, input: AreaInput, ownId: string | undefined) {
  const errors: FieldError[] = [];
  for (const path of ['supervisorId', 'alternateId'] as const) {
    const id = input[path];
    if (id !== undefined && (await findPersonName(ctx, id)) === undefined) {
      errors.push({ path, message: 'There is no such person.', allowed: 'a person on record' });
    }
  }
  if (input.alternateId !== undefined && input.alternateId === input.supervisorId) {
    errors.push({
      path: 'alternateId',
      message: 'The alternate is somebody else than the supervisor.',
    });
  }
  if (errors.length > 0) throw new InvalidInput(errors);
  const sameCode = await findAreaByCode(ctx.tx, input.code);
  if (!sameCode || sameCode.id === ownId) return;
  const message = `The code ${sameCode.code} is taken by the area "${sameCode.name}".`;
  throw new Conflict(message, [{ path: 'code', message }]);
}

/** An empty text is no text. */
function withoutBlanks(input: AreaInput): AreaInput {
  return { ...input, phone: input.phone || undefined, note: input.note || undefined };
}

function recordArea(
  ctx: Context,
  action: string,
  { before, after }: { before: StoredArea | null; after: StoredArea },
): Promise<void> {
  return recordChange(ctx, {
    action,
    recordKind: 'area',
    recordId: after.id,
    recordName: after.code,
    changes: changesBetween(before && inputOf(before), inputOf(after)),
  });
}

function inputOf({ id: _id, version: _version, createdAt: _createdAt, ...input }: StoredArea) {
  return input;
}
