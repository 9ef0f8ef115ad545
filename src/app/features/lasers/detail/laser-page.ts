import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Title } from '@angular/platform-browser';
import { Router, RouterLink } from '@angular/router';
import { ruleSetById } from '@shared/hazard/rule-sets';
import type { Laser, OfferedEvent } from '@shared/model/lasers';
import type { Problem } from '@shared/model/problem';

import { asProblem } from '../../../core/http/problem-error';
import { InstantPipe } from '../../../core/time/instant-pipe';
import { CautionLine } from '../../../ui/caution-line/caution-line';
import { Icon } from '../../../ui/icon/icon';
import { ProblemPanel } from '../../../ui/problem-panel/problem-panel';
import { StateChip } from '../../../ui/state-chip/state-chip';
import { EvaluationsApi } from '../../evaluations/evaluations-api';
import { laserResource } from '../lasers-api';
import { LaserChain } from './laser-chain';
import { LaserEvaluations } from './laser-evaluations';
import { LaserFacts } from './laser-facts';
import { LaserFiles } from './laser-files';
import { LaserHistory } from './laser-history';
import { LaserLines } from './laser-lines';
import { LaserReach } from './laser-reach';
import { LaserSteps } from './laser-steps';

const OPEN_STATES: readonly string[] = ['draft', 'in-check', 'checked'];

/** One laser: whether it may be used, how far it reaches, what that rests on, and what is next. */
@Component({
  selector: 'lm-laser-page',
  imports: [
    CautionLine,
    Icon,
    InstantPipe,
    LaserChain,
    LaserEvaluations,
    LaserFacts,
    LaserFiles,
    LaserHistory,
    LaserLines,
    LaserReach,
    LaserSteps,
    MatButton,
    ProblemPanel,
    RouterLink,
    StateChip,
  ],
  templateUrl: './laser-page.html',
  styleUrl: './laser-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserPage {
  private readonly evaluations = inject(EvaluationsApi);
  private readonly router = inject(Router);
  private readonly title = inject(Title);

  readonly id = input.required<string>();
  /** The step whose dialog is open; in the address, so that Back closes it. */
  readonly step = input<string>();

  private readonly resource = laserResource(this.id);
  protected readonly laser = linkedSignal<Laser | null>(() =>
    this.resource.hasValue() ? this.resource.value() : null,
  );
  protected readonly problem = computed(() => {
    const error = this.resource.error();
    return error ? asProblem(error) : null;
  });
  protected readonly actProblem = signal<Problem | null>(null);
  protected readonly isBeginning = signal(false);
  protected readonly openEvaluation = computed(() =>
    this.laser()?.evaluations.find(({ state }) => OPEN_STATES.includes(state)),
  );
  protected readonly edition = computed(() => {
    const ruleSet = this.laser()?.reach?.ruleSet;
    return ruleSet ? ruleSetById(ruleSet).edition : '';
  });
  /** The way out of a block, when the workflow offers one to this person. */
  protected readonly release = computed<OfferedEvent | undefined>(() =>
    this.laser()?.offered.find(({ event }) => event === 'release'),
  );

  constructor() {
    // The window is named after the laser once it is known.
    effect(() => {
      const laser = this.laser();
      if (laser) this.title.setTitle(`${laser.tag} · Limen`);
    });
  }

  protected reload(): void {
    this.resource.reload();
  }

  protected beginEvaluation(): void {
    if (this.isBeginning()) return;
    this.isBeginning.set(true);
    this.actProblem.set(null);
    this.evaluations.begin(this.id()).subscribe({
      next: ({ id }) => void this.router.navigate(['/evaluations', id]),
      error: (error: unknown) => {
        this.isBeginning.set(false);
        this.actProblem.set(asProblem(error));
      },
    });
  }

  protected openStep(event: string): void {
    void this.router.navigate([], { queryParams: { step: event } });
  }
}
