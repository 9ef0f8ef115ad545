import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { ruleSetById } from '@shared/hazard/rule-sets';
import type { EvaluationRow } from '@shared/model/evaluations';
import {
  EVALUATION_STATE_WORDS,
  EVALUATION_STATES,
  type EvaluationState,
} from '@shared/workflow/evaluation-life-cycle';

import { KeysetList, PAGE_ROWS } from '../../../core/paging/keyset-list';
import { SiteDatePipe } from '../../../core/time/site-date-pipe';
import { Icon } from '../../../ui/icon/icon';
import { ListTable } from '../../../ui/list-table/list-table';
import { Quantity } from '../../../ui/quantity/quantity';
import { SearchBox } from '../../../ui/search-box/search-box';
import { StateChip } from '../../../ui/state-chip/state-chip';
import { TableState } from '../../../ui/table-state/table-state';
import { EvaluationsApi } from '../evaluations-api';

/** Every evaluation that one may read, the last changed first. */
@Component({
  selector: 'lm-evaluation-list-page',
  imports: [
    Icon,
    ListTable,
    MatButton,
    Quantity,
    RouterLink,
    SearchBox,
    SiteDatePipe,
    StateChip,
    TableState,
  ],
  templateUrl: './evaluation-list-page.html',
  styleUrl: './evaluation-list-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EvaluationListPage {
  private readonly api = inject(EvaluationsApi);
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);

  readonly q = input<string>();
  readonly state = input<string>();
  readonly waiting = input<string>();
  readonly laserId = input<string>();
  readonly rows = input<string>();

  protected readonly search = linkedSignal(() => this.q() ?? '');
  protected readonly chosenState = linkedSignal(() => asState(this.state()));
  protected readonly waitsForMe = linkedSignal(() => this.waiting() === 'me');
  private readonly shown = linkedSignal(() => Number(this.rows()) || PAGE_ROWS);
  private readonly filter = computed(() => ({
    q: this.search() || undefined,
    state: this.chosenState(),
    waiting: this.waitsForMe() ? ('me' as const) : undefined,
    laserId: this.laserId(),
  }));

  protected readonly states = EVALUATION_STATES.map((state) => ({
    state,
    word: EVALUATION_STATE_WORDS[state],
  }));
  protected readonly evaluations = new KeysetList({
    name: 'evaluations',
    query: this.filter,
    shown: this.shown,
    load: (query, range) => this.api.list({ ...query, ...range }),
  });
  protected readonly isFiltered = computed(() =>
    Object.values(this.filter()).some((value) => value !== undefined),
  );

  constructor() {
    // The address says what is shown; what is usual is left out.
    effect(() => {
      const { q, state, waiting } = this.filter();
      const rows = this.shown() > PAGE_ROWS ? this.shown() : null;
      void this.router.navigate([], {
        relativeTo: this.route,
        queryParams: {
          q: q ?? null,
          state: state ?? null,
          waiting: waiting ?? null,
          laserId: this.laserId() ?? null,
          rows,
        },
        replaceUrl: true,
      });
    });
  }

  protected find(text: string): void {
    this.search.set(text);
    this.shown.set(PAGE_ROWS);
  }

  protected chooseState(value: string): void {
    this.chosenState.set(asState(value));
    this.shown.set(PAGE_ROWS);
  }

  protected chooseWaiting(waits: boolean): void {
    this.waitsForMe.set(waits);
    this.shown.set(PAGE_ROWS);
  }

  protected clear(): void {
    void this.router.navigate([], { relativeTo: this.route, queryParams: {} });
  }

  protected edition(row: EvaluationRow): string {
    return ruleSetById(row.ruleSet).edition;
  }
}

function asState(value: string | undefined): EvaluationState | undefined {
  return EVALUATION_STATES.find((state) => state === value);
}
