import { readFile } from 'node:fs/promises';

import type { ImportError, LaserImport } from '@shared/model/laser-imports';

import { recordChange } from '../../audit-trail/record-change';
import { type Acting, type Context, type Edges, pick, reading } from '../../context/context';
import { bookkeeping, transact } from '../../context/transact';
import { newId } from '../../db/new-id';
import { ApiError, Conflict, NotFound } from '../../http/errors';
import type { Upload } from '../../http/route';
import { entryErrors, storeLaser } from '../lasers/laser-service';
import { duplicatesInFile, errorColumn } from './import-duplicates';
import { type Known, type Notes, planLasers, readRow } from './import-plan';
import { readSheet, type Sheet } from './import-sheet';
import {
  findImport,
  findNames,
  insertImport,
  type StoredImport,
  updateImport,
} from './laser-import-repository';
import type { PlannedLaser } from './laser-import-table';

/** More nobody reads; the count tells of the rest. */
const MOST_LISTED = 1000;
/** So many rows at once; then other requests have their turn. */
const PORTION = 40;

/** An import that is being worked on in this process. */
interface Work {
  rowsDone: number;
  isCanceled: boolean;
}

/** By database: two servers in one process must not share work. */
const WORK = new WeakMap<object, Map<string, Work>>();

/** Takes the file, answers at once, and reads it row by row: a dry run, nothing becomes a record. */
export async function beginImport(ctx: Context, upload: Upload): Promise<LaserImport> {
  const sheet = readSheet(await readFile(upload.path));
  const stored: StoredImport = {
    id: newId(),
    personId: ctx.actor.id,
    fileName: upload.name.slice(0, 200),
    status: 'checking',
    rowsTotal: sheet.rows.length,
    rowsDone: 0,
    rowsGood: 0,
    lasers: 0,
    errors: [],
    errorCount: 0,
    warnings: [],
    plan: [],
    createdAt: ctx.now.toISOString(),
  };
  await bookkeeping(ctx.edges, (tx) => insertImport(tx, stored));
  launch(ctx.edges, stored, (work) => check(ctx.edges, pick(ctx), { stored, sheet, work }));
  return viewOf(ctx.edges, stored);
}

export async function readImport(ctx: Context, id: string): Promise<LaserImport> {
  return viewOf(ctx.edges, await requireOwn(ctx, id));
}

/** Saves all lasers of the file in one transaction, or none. */
export async function saveImport(ctx: Context, id: string): Promise<LaserImport> {
  const stored = await requireOwn(ctx, id);
  const { status, errorCount } = viewOf(ctx.edges, stored);
  if (status !== 'checked') throw new Conflict(`This file is ${status}; it cannot be saved now.`);
  if (errorCount > 0) {
    throw new Conflict(`The file has ${errorCount} errors. Correct them and send it again.`);
  }
  const saving: StoredImport = { ...stored, status: 'saving', rowsDone: 0 };
  await bookkeeping(ctx.edges, (tx) => updateImport(tx, saving, ctx.now.toISOString()));
  launch(ctx.edges, saving, (work) => save(ctx.edges, pick(ctx), { stored: saving, work }));
  return viewOf(ctx.edges, saving);
}

export async function cancelImport(ctx: Context, id: string): Promise<void> {
  const stored = await requireOwn(ctx, id);
  const work = workOf(ctx.edges).get(id);
  if (work) {
    work.isCanceled = true;
    return;
  }
  if (stored.status === 'saved') throw new Conflict('These lasers are saved already.');
  await finish(ctx.edges, stored, { status: 'canceled', plan: [] });
}

interface Checking {
  readonly stored: StoredImport;
  readonly sheet: Sheet;
  readonly work: Work;
}

async function check(
  edges: Edges,
  acting: Acting,
  { stored, sheet, work }: Checking,
): Promise<void> {
  const notes: Notes = { errors: [...sheet.errors], warnings: [] };
  const ctx = reading(edges, acting);
  const known = await knownNames(ctx);
  const rows = [];
  for (const row of sheet.rows) {
    rows.push(readRow(row, known, notes));
    await oneMore(work);
  }
  const planned = planLasers(rows, notes);
  notes.errors.push(...duplicatesInFile(planned));
  for (const [index, laser] of planned.entries()) {
    if (index % PORTION === 0) await breathe(work);
    for (const { path, message, allowed } of await entryErrors(ctx, laser.input)) {
      notes.errors.push({
        row: laser.rows[0] ?? 0,
        ...errorColumn(path, laser.input),
        message,
        ...(allowed ? { allowed } : {}),
      });
    }
  }
  const bad = new Set(notes.errors.map(({ row }) => row));
  const good = planned.filter((laser) => laser.rows.every((row) => !bad.has(row)));
  await finish(edges, stored, {
    status: 'checked',
    rowsDone: sheet.rows.length,
    rowsGood: sheet.rows.filter(({ row }) => !bad.has(row)).length,
    lasers: good.length,
    errors: inOrder(notes.errors),
    errorCount: notes.errors.length,
    warnings: notes.warnings.slice(0, MOST_LISTED),
    plan: notes.errors.length > 0 ? [] : good,
  });
}

async function save(
  edges: Edges,
  acting: Acting,
  { stored, work }: { stored: StoredImport; work: Work },
): Promise<void> {
  await transact(edges, acting, async (ctx) => {
    for (const laser of stored.plan) {
      await storePlanned(ctx, laser);
      await oneMore(work, laser.rows.length);
    }
    await recordChange(ctx, {
      action: 'laser.import',
      recordKind: 'laser-import',
      recordId: stored.id,
      recordName: stored.fileName,
      changes: [{ field: 'lasers', before: 0, after: stored.plan.length }],
    });
    const saved: StoredImport = {
      ...stored,
      status: 'saved',
      rowsDone: stored.rowsTotal,
      plan: [],
    };
    await updateImport(ctx.tx, saved, ctx.now.toISOString());
  });
}

/** What the register refuses now is told at the row that says it. */
async function storePlanned(ctx: Context, laser: PlannedLaser): Promise<void> {
  try {
    await storeLaser(ctx, laser.input, 'register');
  } catch (error) {
    if (!(error instanceof ApiError)) throw error;
    const [first] = error.extras.errors ?? [];
    throw new RowRefused({
      row: laser.rows[0] ?? 0,
      ...errorColumn(first?.path ?? '', laser.input),
      message: first?.message ?? error.message,
    });
  }
}

class RowRefused extends Error {
  constructor(readonly error: ImportError) {
    super(error.message);
  }
}

class Canceled extends Error {}

/** Starts work that goes on after the answer; whatever happens, the import says how it ended. */
function launch(edges: Edges, stored: StoredImport, run: (work: Work) => Promise<void>): void {
  const work: Work = { rowsDone: 0, isCanceled: false };
  workOf(edges).set(stored.id, work);
  void run(work)
    .catch((error: unknown) => endBadly(edges, stored, error))
    .finally(() => workOf(edges).delete(stored.id));
}

async function endBadly(edges: Edges, stored: StoredImport, error: unknown): Promise<void> {
  if (error instanceof Canceled) {
    await finish(edges, stored, { status: 'canceled', plan: [] });
    return;
  }
  if (!(error instanceof RowRefused)) edges.log.error({ err: error }, 'an import failed');
  const told: ImportError =
    error instanceof RowRefused
      ? error.error
      : { row: 1, column: '', given: '', message: 'Something failed here. Nothing was saved.' };
  await finish(edges, stored, { status: 'failed', errors: [told], errorCount: 1, plan: [] });
}

function finish(edges: Edges, stored: StoredImport, end: Partial<StoredImport>): Promise<void> {
  const at = edges.clock().toISOString();
  return bookkeeping(edges, (tx) => updateImport(tx, { ...stored, ...end }, at));
}

async function oneMore(work: Work, rows = 1): Promise<void> {
  const portion = Math.floor(work.rowsDone / PORTION);
  work.rowsDone += rows;
  if (Math.floor(work.rowsDone / PORTION) > portion) await breathe(work);
}

/** Lets other requests have their turn; stops here when the person has canceled. */
async function breathe(work: Work): Promise<void> {
  await new Promise((resolve) => setImmediate(resolve));
  if (work.isCanceled) throw new Canceled();
}

function workOf(edges: Edges): Map<string, Work> {
  const known = WORK.get(edges.db) ?? new Map<string, Work>();
  WORK.set(edges.db, known);
  return known;
}

async function knownNames(ctx: Context): Promise<Known> {
  const { areas, people } = await findNames(ctx.tx);
  return {
    areas: new Map(areas.map(({ id, code }) => [code.toLowerCase(), id])),
    people: new Map(people.map(({ id, email }) => [email.toLowerCase(), id])),
  };
}

function inOrder(errors: readonly ImportError[]): ImportError[] {
  return [...errors].sort((a, b) => a.row - b.row).slice(0, MOST_LISTED);
}

async function requireOwn(ctx: Context, id: string): Promise<StoredImport> {
  const stored = await findImport(ctx.tx, id);
  if (!stored || stored.personId !== ctx.actor.id) throw new NotFound('import');
  return stored;
}

function shown({ personId: _person, plan: _plan, ...view }: StoredImport): LaserImport {
  return view;
}

/** With the progress of the moment; work that no process does any more has failed. */
function viewOf(edges: Edges, stored: StoredImport): LaserImport {
  const view = shown(stored);
  if (view.status !== 'checking' && view.status !== 'saving') return view;
  const work = workOf(edges).get(stored.id);
  if (work) return { ...view, rowsDone: Math.min(work.rowsDone, view.rowsTotal) };
  const message = 'The server was started anew meanwhile. Nothing was saved; send the file again.';
  const errors = [{ row: 1, column: '', given: '', message }];
  return { ...view, status: 'failed', errors, errorCount: 1 };
}
