import { type LaserFile, laserFileInputSchema, MAX_FILES_PER_LASER } from '@shared/model/files';
import type * as z from 'zod';

import { changesBetween, recordChange } from '../../audit-trail/record-change';
import { requireScope } from '../../auth/scope';
import type { Context } from '../../context/context';
import { newId } from '../../db/new-id';
import type { Download } from '../../http/download';
import { Conflict, NotFound } from '../../http/errors';
import type { Upload } from '../../http/route';
import { findFile, insertFile, listFiles, markFileRemoved } from './laser-file-repository';
import { type LaserRecord, placementOf } from './laser-record';
import { refreshStanding, requireLaser } from './laser-standing-service';

/** Attaches a file that was already checked by its content. */
export async function attachFile(
  ctx: Context,
  laserId: string,
  { upload, input }: { upload: Upload; input: z.infer<typeof laserFileInputSchema> },
): Promise<LaserFile> {
  const laser = await requireEditable(ctx, laserId);
  const files = await listFiles(ctx.tx, laser.id);
  if (files.length >= MAX_FILES_PER_LASER) {
    throw new Conflict(`A laser has at most ${MAX_FILES_PER_LASER} files. Remove one first.`);
  }
  const { sha256, sizeBytes } = await ctx.edges.files.keep(upload.path);
  const id = newId();
  await insertFile(ctx.tx, {
    id,
    laser_id: laser.id,
    kind: input.kind,
    name: shownName(upload.name),
    media_type: upload.mediaType,
    size_bytes: sizeBytes,
    sha256,
    note: input.note || null,
    uploaded_by: ctx.actor.id,
    uploaded_at: ctx.now.toISOString(),
    removed_at: null,
  });
  const file = await requireFile(ctx, laser.id, id);
  await recordFile(ctx, laser, { action: 'laser.attach-file', before: null, after: file });
  await refreshStanding(ctx, laser.id);
  return file;
}

export async function removeFile(ctx: Context, laserId: string, fileId: string): Promise<void> {
  const laser = await requireEditable(ctx, laserId);
  const file = await requireFile(ctx, laser.id, fileId);
  await markFileRemoved(ctx.tx, file.id, ctx.now.toISOString());
  await recordFile(ctx, laser, { action: 'laser.remove-file', before: file, after: null });
}

export async function readFile(ctx: Context, laserId: string, fileId: string): Promise<Download> {
  const laser = await requireLaser(ctx, laserId);
  requireScope(ctx, 'laser.read', { place: placementOf(laser), what: 'laser' });
  const file = await requireFile(ctx, laser.id, fileId);
  return {
    fileName: file.name,
    mediaType: file.mediaType,
    body: ctx.edges.files.stream(file.sha256),
  };
}

async function requireEditable(ctx: Context, laserId: string): Promise<LaserRecord> {
  const laser = await requireLaser(ctx, laserId);
  const place = placementOf(laser);
  requireScope(ctx, 'laser.read', { place, what: 'laser' });
  requireScope(ctx, 'laser.attach-file', { place, what: 'laser' });
  return laser;
}

async function requireFile(ctx: Context, laserId: string, fileId: string): Promise<LaserFile> {
  const file = await findFile(ctx.tx, laserId, fileId);
  if (!file) throw new NotFound('file');
  return file;
}

function recordFile(
  ctx: Context,
  laser: LaserRecord,
  { action, before, after }: { action: string; before: LaserFile | null; after: LaserFile | null },
): Promise<void> {
  const file = after ?? before;
  return recordChange(ctx, {
    action,
    recordKind: 'laser-file',
    recordId: file?.id ?? '',
    recordName: `${laser.tag}, ${file?.name ?? ''}`,
    changes: changesBetween(before, after),
  });
}

/** The last part of the name, without what would mislead a reader about its order or kind. */
function shownName(name: string): string {
  const last = name.split(/[\\/]/).at(-1) ?? '';
  const clean = last.replaceAll(/\p{C}/gu, '').trim();
  if (clean.length <= 120) return clean || 'file';
  const dot = clean.lastIndexOf('.');
  const ending = dot > 0 ? clean.slice(dot) : '';
  return clean.slice(0, 120 - ending.length) + ending;
}
