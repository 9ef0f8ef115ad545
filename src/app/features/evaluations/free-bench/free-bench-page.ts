import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
} from '@angular/core';
import { toObservable, takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import type { HazardCase } from '@shared/hazard/case';
import { proposedExposure } from '@shared/hazard/default-exposure';
import { evaluate } from '@shared/hazard/evaluate';
import { RULE_SETS, type RuleSet, ruleSetById } from '@shared/hazard/rule-sets';
import { isEvaluated } from '@shared/model/evaluation-case';
import { debounceTime, skip } from 'rxjs';

import { formErrors } from '../../../core/forms/form-errors';
import { CautionLine } from '../../../ui/caution-line/caution-line';
import { Control } from '../../../ui/field/control';
import { Field } from '../../../ui/field/field';
import { Icon } from '../../../ui/icon/icon';
import { atOurFields, sentencesByPath } from '../inputs/case-paths';
import { formSignal } from '../inputs/form-signal';
import { inOurWords } from '../inputs/missing-words';
import { SurroundingsFields } from '../inputs/surroundings-fields';
import { typed } from '../inputs/typed-quantity';
import { Announcement } from '../results/announcement';
import { type Outcome, outcomeOf, refused } from '../results/outcome';
import { ResultFigures } from '../results/result-figures';
import { ResultFold } from '../results/result-fold';
import { ResultGrounds } from '../results/result-grounds';
import { BeamFields } from './beam-fields';
import { beamForm, type BeamForm, caseForm, FIRST_CASE, readCase } from './case-form';
import { decodeCase, encodeCase } from './case-link';

/** Quiet time after a keystroke before the address follows. */
const ADDRESS_AFTER_MS = 300;

/** A case without a record: all of it stands in the address, nothing is stored. */
@Component({
  selector: 'lm-free-bench-page',
  imports: [
    Announcement,
    BeamFields,
    CautionLine,
    Control,
    Field,
    Icon,
    MatButton,
    ReactiveFormsModule,
    ResultFigures,
    ResultFold,
    ResultGrounds,
    RouterLink,
    SurroundingsFields,
  ],
  templateUrl: './free-bench-page.html',
  styleUrls: ['./free-bench-page.scss', '../inputs/inputs.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FreeBenchPage {
  private readonly fb = inject(NonNullableFormBuilder);
  private readonly router = inject(Router);

  readonly case = input<string>();

  /** What this page itself wrote into the address; only another text makes a new form. */
  private written: string | undefined;
  private readonly linked = linkedSignal<string | undefined, HazardCase>({
    source: this.case,
    computation: (text, previous) =>
      previous && text === this.written ? previous.value : (readable(text) ?? FIRST_CASE),
  });
  protected readonly linkError = computed(() => {
    const text = this.case();
    if (text === undefined || text === this.written || readable(text)) return '';
    return 'The link holds no case that can be evaluated. Here is a first case instead.';
  });
  protected readonly ruleSets: readonly RuleSet[] = RULE_SETS;
  protected readonly form = computed(() => caseForm(this.fb, this.linked()));
  protected readonly value = formSignal(this.form);
  protected readonly outcome = linkedSignal<unknown, Outcome>({
    source: this.value,
    computation: (_, previous) => this.compute(previous?.value),
  });
  protected readonly problems = computed(() => sentencesByPath(this.outcome().errors));
  protected readonly edition = computed(() => ruleSetById(this.value().ruleSet).title);
  protected readonly beams = computed(() => {
    this.value();
    return [...this.form().controls.beams.controls];
  });
  protected readonly proposal = computed(() => {
    const { eyeS, skinS } = this.value().surroundings;
    const proposed = this.proposed();
    const isTaken =
      eyeS?.value === proposed.eyeS && (skinS?.value ?? eyeS.value) === proposed.skinS;
    return isTaken ? '' : `Proposed for the eye ${proposed.reason} Skin ${proposed.skinS} s.`;
  });

  constructor() {
    // The address follows what is typed, so that a reload or a copied address is the same case.
    toObservable(this.outcome)
      .pipe(skip(1), debounceTime(ADDRESS_AFTER_MS), takeUntilDestroyed())
      .subscribe(({ view, isCurrent }) => {
        if (view && isCurrent) this.writeAddress(view.case);
      });
  }

  /** A further beam, as the last one. */
  protected addBeam(): void {
    const { beams } = this.form().controls;
    const last = beams.controls.at(-1);
    const [first] = FIRST_CASE.beams;
    if (!last || !first) return;
    const copy = beamForm(this.fb, first);
    copy.setValue(last.getRawValue());
    beams.push(copy);
  }

  protected removeBeam(form: BeamForm): void {
    const { beams } = this.form().controls;
    beams.removeAt(beams.controls.indexOf(form));
  }

  protected takeProposal(): void {
    const { eyeS, skinS } = this.proposed();
    this.form().controls.surroundings.patchValue({
      eyeS: typed(eyeS, 's'),
      skinS: typed(skinS, 's'),
    });
  }

  private proposed() {
    const { beams, surroundings } = this.value();
    const wavelengths = beams.flatMap(({ wavelengthNm }) => wavelengthNm?.value ?? []);
    const kind = surroundings.path.kind === 'diffuse' ? 'diffuse' : 'direct';
    return proposedExposure(wavelengths.length > 0 ? wavelengths : [532], kind);
  }

  private compute(previous: Outcome | undefined): Outcome {
    const form = this.form();
    const unread = formErrors(form).map((error) => ({
      ...error,
      path: error.path.replace(/^surroundings\./, ''),
    }));
    if (unread.length > 0) return refused(unread, previous);
    const hazardCase = readCase(form);
    const result = evaluate(hazardCase);
    const outcome = outcomeOf(
      {
        scenarioId: '',
        case: hazardCase as HazardCase,
        result,
        conversions: [],
        assumptions: [],
      },
      previous,
    );
    const errors = inOurWords(atOurFields(outcome.errors)).map((error) => ({
      ...error,
      path: error.path.replace('.emission.', '.'),
    }));
    return { ...outcome, errors };
  }

  private writeAddress(hazardCase: HazardCase): void {
    const text = encodeCase(hazardCase);
    if (text === this.case()) return;
    this.written = text;
    void this.router.navigate([], { queryParams: { case: text }, replaceUrl: true });
  }
}

/** The case of an address, when the engine can evaluate it. */
function readable(text: string | undefined): HazardCase | undefined {
  if (text === undefined) return undefined;
  const decoded = decodeCase(text);
  return isEvaluated(evaluate(decoded, { bare: true })) ? (decoded as HazardCase) : undefined;
}
