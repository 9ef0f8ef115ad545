import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Evaluation, ResultChange } from '@shared/model/evaluations';
import { formatOpticalDensity, formatQuantity } from '@shared/model/quantity-format';

import { ListTable } from '../../../ui/list-table/list-table';

interface Row {
  readonly scenario: string;
  readonly what: string;
  readonly sealed: string;
  readonly today: string;
  readonly difference: string;
  readonly isWorse: boolean;
}

/** Where today's inputs lead elsewhere than the sealed ones: what got worse first. */
@Component({
  selector: 'lm-what-changed',
  imports: [ListTable],
  templateUrl: './what-changed.html',
  styleUrl: './what-changed.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WhatChanged {
  readonly evaluation = input.required<Evaluation>();

  protected readonly rows = computed<Row[]>(() => merged(this.evaluation().whatChanged.map(rowOf)));
  protected readonly heading = computed(() =>
    this.rows().some((row) => row.isWorse) ? 'What got worse' : 'What changed',
  );
  protected readonly severalScenarios = computed(
    () => new Set(this.rows().map((row) => row.scenario)).size > 1,
  );
}

/** The same change in several situations is told once. */
function merged(rows: readonly Row[]): Row[] {
  const byChange = new Map<string, Row>();
  for (const row of rows) {
    const key = JSON.stringify([row.what, row.sealed, row.today]);
    const known = byChange.get(key);
    const scenario = known ? `${known.scenario}, ${row.scenario}` : row.scenario;
    byChange.set(key, { ...row, scenario });
  }
  return [...byChange.values()];
}

function rowOf(change: ResultChange): Row {
  return {
    scenario: change.scenario,
    what: change.what,
    sealed: valueText(change, change.sealed),
    today: valueText(change, change.today),
    difference: differenceOf(change),
    isWorse: change.direction === 'worse' || change.direction === 'new',
  };
}

/** Distances and densities are rounded up, limits down; a distance of 0 is no distance. */
function valueText({ what, unit }: ResultChange, value: number | null): string {
  if (value === null) return 'none';
  if (unit === '') return formatOpticalDensity(value);
  if (unit === 'm' && value === 0) return 'nowhere';
  return formatQuantity(value, unit, /limit/.test(what) ? 'down' : 'up').text;
}

function differenceOf({ direction, sealed, today, unit }: ResultChange): string {
  if (direction === 'new') return 'new';
  if (direction === 'gone') return 'no longer there';
  if (direction === 'same' || sealed === null || today === null) return 'as before';
  const verdict = direction === 'worse' ? 'worse' : 'better';
  if (unit === '') return `${verdict} by ${Math.abs(today - sealed).toFixed(2)}`;
  if (sealed === 0 || today === 0) return verdict;
  const percent = Math.abs(today / sealed - 1) * 100;
  const amount = percent < 1 ? 'less than 1' : String(Math.round(percent));
  return `${verdict} by ${amount}\u202f%`;
}
