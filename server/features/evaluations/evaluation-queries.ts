import type { EvaluationRow, evaluationListQuerySchema } from '@shared/model/evaluations';
import type { EvaluationState } from '@shared/workflow/evaluation-life-cycle';
import { sql, type SqlBool } from 'kysely';
import type * as z from 'zod';

import type { Reach } from '../../auth/scope';
import type { Actor } from '../../context/context';
import type { Tx } from '../../db/database';
import { countRows, type Page, pageByKey } from '../../db/paging';
import { matches } from '../../db/sql-helpers';

type Query = z.infer<typeof evaluationListQuerySchema>;

export interface Viewer {
  readonly actor: Actor;
  readonly reach: Reach;
  readonly authorMayApprove: boolean;
}

/** One page of evaluations, the last changed first. */
export async function listEvaluations(
  tx: Tx,
  viewer: Viewer,
  query: Query,
): Promise<Page<EvaluationRow>> {
  const found = filtered(within(selectRows(tx), viewer.reach), viewer, query);
  const page = await pageByKey(found, {
    keys: [
      { column: 'evaluations.updated_at', direction: 'desc', value: (row) => row.updated_at },
      { column: 'evaluations.id', direction: 'desc', value: (row) => row.id },
    ],
    after: query.after,
    limit: query.limit,
    total: await countRows(found),
  });
  return { ...page, rows: page.rows.map((row) => toRow(row, viewer)) };
}

type Rows = ReturnType<typeof selectRows>;
type Row = Awaited<ReturnType<Rows['execute']>>[number];

function selectRows(tx: Tx) {
  return tx
    .selectFrom('evaluations')
    .innerJoin('lasers', 'lasers.id', 'evaluations.laser_id')
    .leftJoin('areas', 'areas.id', 'lasers.area_id')
    .innerJoin('people as authors', 'authors.id', 'evaluations.author_id')
    .leftJoin('people as checkers', 'checkers.id', 'evaluations.checker_id')
    .leftJoin('people as approvers', 'approvers.id', 'evaluations.approver_id')
    .select([
      'evaluations.id',
      'evaluations.number',
      'evaluations.state',
      'evaluations.laser_id',
      'evaluations.rule_set',
      'evaluations.author_id',
      'evaluations.checker_id',
      'evaluations.approver_id',
      'evaluations.eye_distance_m',
      'evaluations.skin_distance_m',
      'evaluations.optical_density',
      'evaluations.updated_at',
      'evaluations.signed_at',
      'evaluations.review_on',
      'evaluations.return_comment',
      'lasers.tag',
      'lasers.maker',
      'lasers.model',
      'areas.code as area_code',
      'authors.name as author_name',
      'checkers.name as checker_name',
      'approvers.name as approver_name',
    ]);
}

/** Evaluations are read by whoever may read them for the laser's place. */
function within(rows: Rows, reach: Reach): Rows {
  if (reach.kind === 'everything') return rows;
  if (reach.kind === 'nothing') return rows.where(sql<SqlBool>`0`);
  const { personId, department } = reach;
  return rows.where((eb) =>
    eb.or([
      eb('lasers.supervisor_id', '=', personId),
      eb('lasers.alternate_id', '=', personId),
      eb('areas.supervisor_id', '=', personId),
      eb('areas.alternate_id', '=', personId),
      ...(department === undefined
        ? []
        : [eb(sql`coalesce(lasers.department, areas.department)`, '=', department)]),
    ]),
  );
}

function filtered(rows: Rows, viewer: Viewer, query: Query): Rows {
  let found = rows;
  if (query.state) found = found.where('evaluations.state', '=', query.state);
  else found = found.where('evaluations.state', '!=', 'discarded');
  if (query.laserId) found = found.where('evaluations.laser_id', '=', query.laserId);
  if (query.waiting === 'me') found = waitingFor(found, viewer);
  for (const word of query.q?.split(/\s+/).filter(Boolean) ?? []) {
    found = found.where((eb) =>
      eb.or([
        matches('lasers.tag', word),
        matches('lasers.maker', word),
        matches('lasers.model', word),
        matches('areas.code', word),
        matches('authors.name', word),
      ]),
    );
  }
  return found;
}

/** The same as `waitsFor`, for the database. */
function waitingFor(rows: Rows, { actor, authorMayApprove }: Viewer): Rows {
  const checks = actor.roles.some((role) => role === 'lso' || role === 'deputy-lso');
  const signs = actor.roles.includes('lso');
  return rows.where((eb) =>
    eb.or([
      eb.and([
        eb('evaluations.state', '=', 'draft'),
        eb('evaluations.author_id', '=', actor.id),
        eb('evaluations.return_comment', 'is not', null),
      ]),
      ...(checks
        ? [
            eb.and([
              eb('evaluations.state', '=', 'in-check'),
              eb('evaluations.author_id', '!=', actor.id),
            ]),
          ]
        : []),
      ...(signs
        ? [
            eb.and([
              eb('evaluations.state', '=', 'checked'),
              ...(authorMayApprove ? [] : [eb('evaluations.author_id', '!=', actor.id)]),
            ]),
          ]
        : []),
    ]),
  );
}

interface Waiting {
  readonly state: EvaluationState;
  readonly authorId: string;
  readonly wasReturned: boolean;
}

/** Whether an evaluation waits for this person: to check, to sign, to answer a return. */
function waitsFor({ actor, authorMayApprove }: Viewer, { state, authorId, wasReturned }: Waiting) {
  const isAuthor = authorId === actor.id;
  switch (state) {
    case 'draft':
      return isAuthor && wasReturned;
    case 'in-check':
      return !isAuthor && actor.roles.some((role) => role === 'lso' || role === 'deputy-lso');
    case 'checked':
      return (!isAuthor || authorMayApprove) && actor.roles.includes('lso');
    default:
      return false;
  }
}

function toRow(row: Row, viewer: Viewer): EvaluationRow {
  return {
    id: row.id,
    number: row.number,
    state: row.state,
    laser: {
      id: row.laser_id,
      tag: row.tag,
      maker: row.maker,
      model: row.model,
      ...(row.area_code === null ? {} : { areaCode: row.area_code }),
    },
    ruleSet: row.rule_set,
    author: { id: row.author_id, name: row.author_name },
    ...person('checker', row.checker_id, row.checker_name),
    ...person('approver', row.approver_id, row.approver_name),
    ...(row.eye_distance_m === null ? {} : { eyeDistanceM: row.eye_distance_m }),
    ...(row.skin_distance_m === null ? {} : { skinDistanceM: row.skin_distance_m }),
    ...(row.optical_density === null ? {} : { opticalDensity: row.optical_density }),
    updatedAt: row.updated_at,
    ...(row.signed_at === null ? {} : { signedAt: row.signed_at }),
    ...(row.review_on === null ? {} : { reviewOn: row.review_on }),
    waitsForMe: waitsFor(viewer, {
      state: row.state,
      authorId: row.author_id,
      wasReturned: row.return_comment !== null,
    }),
  };
}

function person<K extends 'checker' | 'approver'>(key: K, id: string | null, name: string | null) {
  return id === null || name === null ? {} : { [key]: { id, name } };
}

/** Signed evaluations whose review date lies before `today`. */
export function evaluationsPastReview(tx: Tx, today: string): Promise<{ id: string }[]> {
  return tx
    .selectFrom('evaluations')
    .select('evaluations.id')
    .where('evaluations.state', '=', 'approved')
    .where('evaluations.review_on', '<', today)
    .execute();
}
