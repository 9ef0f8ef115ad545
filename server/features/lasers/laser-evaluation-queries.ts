import type { Laser } from '@shared/model/lasers';
import { sql } from 'kysely';

import type { Tx } from '../../db/database';

/** The evaluation that stands for a laser: the signed one, approved or stale. */
export async function findSealedEvaluation(tx: Tx, laserId: string) {
  const row = await tx
    .selectFrom('evaluations')
    .select([
      'evaluations.id',
      'evaluations.number',
      'evaluations.state',
      'evaluations.laser_inputs_hash',
      'evaluations.review_on',
      'evaluations.input',
      'evaluations.results',
    ])
    .where('evaluations.laser_id', '=', laserId)
    .where('evaluations.state', 'in', ['approved', 'stale'])
    .orderBy('evaluations.number', 'desc')
    .executeTakeFirst();
  if (!row) return undefined;
  return { ...row, state: row.state === 'stale' ? ('stale' as const) : ('approved' as const) };
}

/** Whether a draft is in work, in check or checked. */
export async function hasOpenEvaluation(tx: Tx, laserId: string): Promise<boolean> {
  const row = await tx
    .selectFrom('evaluations')
    .select('evaluations.id')
    .where('evaluations.laser_id', '=', laserId)
    .where('evaluations.state', 'in', ['draft', 'in-check', 'checked'])
    .executeTakeFirst();
  return row !== undefined;
}

/** Every evaluation of a laser, newest first. */
export async function listEvaluationsOf(tx: Tx, laserId: string): Promise<Laser['evaluations']> {
  const rows = await tx
    .selectFrom('evaluations')
    .select(['evaluations.id', 'evaluations.number', 'evaluations.state', 'evaluations.signed_at'])
    .where('evaluations.laser_id', '=', laserId)
    .orderBy('evaluations.number', 'desc')
    .execute();
  return rows.map(({ id, number, state, signed_at }) => ({
    id,
    number,
    state,
    ...(signed_at ? { signedAt: signed_at } : {}),
  }));
}

export async function countPhotos(tx: Tx, laserId: string): Promise<number> {
  const { count } = await tx
    .selectFrom('laser_files')
    .select(sql<number>`count(*)`.as('count'))
    .where('laser_files.laser_id', '=', laserId)
    .where('laser_files.kind', 'in', ['photo', 'label-photo'])
    .where('laser_files.removed_at', 'is', null)
    .executeTakeFirstOrThrow();
  return count;
}

/** Where the laser was, newest first. */
export async function listPlaces(tx: Tx, laserId: string): Promise<Laser['places']> {
  const rows = await tx
    .selectFrom('laser_places')
    .leftJoin('areas', 'areas.id', 'laser_places.area_id')
    .select(['laser_places.since_at', 'areas.id', 'areas.code', 'areas.name'])
    .where('laser_places.laser_id', '=', laserId)
    .orderBy('laser_places.since_at', 'desc')
    .execute();
  return rows.map(({ since_at, id, code, name }) => ({
    sinceAt: since_at,
    ...(id !== null && code !== null && name !== null ? { area: { id, code, name } } : {}),
  }));
}
