import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import type { ReachDistances } from '@shared/drawing/reach';
import type { Evaluation, ResultChange } from '@shared/model/evaluations';
import type { Reach } from '@shared/model/lasers';
import type { Problem } from '@shared/model/problem';
import { formatOpticalDensity, formatQuantity } from '@shared/model/quantity-format';
import { catchError, map, type Observable, of, startWith, switchMap } from 'rxjs';

import { asProblem } from '../../../core/http/problem-error';
import { ListTable } from '../../../ui/list-table/list-table';
import { ReachStrip } from '../../../ui/reach-strip/reach-strip';
import { TableState } from '../../../ui/table-state/table-state';
import { EvaluationsApi } from '../../evaluations/evaluations-api';
import { reachDistances } from '../reach-distances';
import { todaysReach } from './todays-reach';

interface Read {
  readonly evaluation?: Evaluation;
  readonly problem?: Problem;
}

const NOTHING_READ: Read = {};

const DIRECTIONS: Readonly<Record<ResultChange['direction'], string>> = {
  worse: 'worse',
  better: 'better',
  same: 'as before',
  new: 'new',
  gone: 'no longer there',
};

/** The sealed reach above today's, and every result that differs. */
@Component({
  selector: 'lm-laser-stale-reach',
  imports: [ListTable, ReachStrip, TableState],
  templateUrl: './laser-stale-reach.html',
  styleUrl: './laser-stale-reach.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserStaleReach {
  private readonly api = inject(EvaluationsApi);

  readonly reach = input.required<Reach>();
  readonly tag = input.required<string>();
  /** The laser's; another one has other inputs. */
  readonly version = input.required<number>();
  readonly wallDistanceM = input<number>();

  private readonly asked = computed(() => ({ id: this.reach().evaluationId, of: this.version() }));
  protected readonly read = toSignal(
    toObservable(this.asked).pipe(switchMap(({ id }) => readOf(this.api.read(id)))),
    { initialValue: NOTHING_READ },
  );
  protected readonly sealed = computed(() => reachDistances(this.reach(), this.wallDistanceM()));
  protected readonly today = computed<ReachDistances | 'unknown' | 'loading'>(() => {
    const { evaluation, problem } = this.read();
    if (problem) return 'unknown';
    if (!evaluation) return 'loading';
    const figures = todaysReach(evaluation);
    if (!figures) return 'unknown';
    return {
      ...figures,
      wallDistanceM: this.wallDistanceM(),
      sealedEyeDistanceM: this.reach().eyeDistanceM,
    };
  });
  protected readonly rows = computed(() => rowsOf(this.read().evaluation?.whatChanged ?? []));
  protected readonly inputs = computed(() => this.read().evaluation?.inputsChanged ?? []);
  protected readonly severalSituations = computed(
    () => (this.read().evaluation?.input.scenarios.length ?? 0) > 1,
  );
}

function readOf(answer: Observable<Evaluation>): Observable<Read> {
  return answer.pipe(
    map((evaluation): Read => ({ evaluation })),
    catchError((error: unknown) => of<Read>({ problem: asProblem(error) })),
    startWith(NOTHING_READ),
  );
}

/** The results of the whole first, then those of single lines; equal rows of situations as one. */
function rowsOf(changes: readonly ResultChange[]) {
  const merged = new Map<string, ResultChange>();
  for (const change of changes) {
    const key = JSON.stringify([change.what, change.sealed, change.today]);
    const same = merged.get(key);
    const scenario = same ? `${same.scenario}, ${change.scenario}` : change.scenario;
    merged.set(key, { ...change, scenario });
  }
  const rows = [...merged.values()];
  const isOfLine = ({ what }: ResultChange) => what.includes(': ');
  return [...rows.filter((row) => !isOfLine(row)), ...rows.filter(isOfLine)].map(rowOf);
}

function rowOf(change: ResultChange) {
  const { sealed, today, direction } = change;
  return {
    ...change,
    sealedText: valueText(sealed, change),
    todayText: valueText(today, change),
    difference: differenceWords(sealed, today, direction),
    isWorse: direction === 'worse' || direction === 'new',
  };
}

/** Limits are rounded down, distances and densities up. */
function valueText(value: number | null, { what, unit }: ResultChange): string {
  if (value === null) return 'none';
  if (unit === '') return formatOpticalDensity(value);
  return formatQuantity(value, unit, what.includes('limit') ? 'down' : 'up').text;
}

function differenceWords(
  sealed: number | null,
  today: number | null,
  direction: ResultChange['direction'],
): string {
  const word = DIRECTIONS[direction];
  if (sealed === null || today === null || sealed === 0 || direction === 'same') return word;
  const percent = Math.abs(today / sealed - 1) * 100;
  if (percent < 0.1) return `${word}, by less than 0.1\u202f%`;
  const size =
    percent >= 100 ? `× ${(today / sealed).toPrecision(3)}` : `${percent.toPrecision(2)}\u202f%`;
  return `${word}, ${today > sealed ? 'higher' : 'lower'} by ${size}`.replace('by ×', 'to ×');
}
