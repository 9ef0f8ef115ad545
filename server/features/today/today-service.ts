import type { EvaluationRow } from '@shared/model/evaluations';
import type { TodayItem } from '@shared/model/today';

import type { Context } from '../../context/context';
import { readEvaluations } from '../evaluations/evaluation-service';
import { readAttention } from '../lasers/laser-service';

/** More than this nobody works off in a day; the lists themselves hold all. */
const MOST = 200;

/** What waits for the person: decisions first, then lasers by consequence. */
export async function readToday(ctx: Context): Promise<{ items: TodayItem[] }> {
  const waiting = await readEvaluations(ctx, { waiting: 'me', limit: MOST });
  const lasers = await readAttention(ctx, MOST);
  return {
    items: [
      ...waiting.rows.map(evaluationItem),
      ...lasers.flatMap(({ laser, attention }) =>
        attention.flatMap(({ kind, words }): TodayItem[] =>
          kind && !isForOthers(ctx, kind)
            ? [
                {
                  kind,
                  recordKind: 'laser',
                  recordId: laser.id,
                  title: `${laser.tag}, ${laser.input.maker} ${laser.input.model}`,
                  why: kind === 'blocked' ? `Blocked: ${laser.block?.reason ?? ''}` : `${words}.`,
                  sinceAt: laser.stateSince,
                },
              ]
            : [],
        ),
      ),
    ],
  };
}

/** The check of a registered laser is the LSO's. */
function isForOthers({ actor }: Context, kind: TodayItem['kind']): boolean {
  return kind === 'laser-check' && !actor.roles.includes('lso');
}

const KINDS = { 'in-check': 'check', checked: 'sign', draft: 'returned' } as const;
const WHYS = {
  check: 'Waits for your check.',
  sign: 'Checked; waits for your signature.',
  returned: 'Came back to you: read why, change it, and send it to check again.',
} as const;

function evaluationItem(row: EvaluationRow): TodayItem {
  const kind = KINDS[row.state as keyof typeof KINDS];
  return {
    kind,
    recordKind: 'evaluation',
    recordId: row.id,
    title: `${row.laser.tag}, evaluation ${row.number}`,
    why: `${WHYS[kind]} By ${row.author.name}.`,
    sinceAt: row.updatedAt,
  };
}
