import { ChangeDetectionStrategy, Component, computed, input, signal } from '@angular/core';
import type { Step } from '@shared/hazard/result';
import { formatWavelength, UNIT_SPACE } from '@shared/model/quantity-format';
import { governingLine, type ResultView } from '@shared/model/result-view';
import { shortened, stepUnit, stepValue } from '@shared/model/step-text';

import { Formula } from '../../../ui/formula/formula';

interface ShownStep {
  readonly number: number;
  readonly step: Step;
  readonly formula: string;
  /** Absent where the formula holds numbers only. */
  readonly substituted: string | undefined;
  readonly value: string;
  readonly unit: string;
}

interface NumberedStep {
  readonly step: Step;
  readonly number: number;
}

interface Group {
  readonly title: string;
  readonly count: number;
  readonly isOpen: boolean;
  /** Typeset only while the group is open: there may be hundreds. */
  readonly steps: readonly ShownStep[];
}

/** How a result was found, step by step: each can be recomputed by hand. */
@Component({
  selector: 'lm-derivation',
  imports: [Formula],
  templateUrl: './derivation.html',
  styleUrl: './derivation.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Derivation {
  readonly view = input.required<ResultView>();

  /** Numbers as the engine holds them, or to ten digits. */
  protected readonly allDigits = signal(false);
  /** Groups that the person opened or closed, by title; the others are as proposed. */
  private readonly chosen = signal<ReadonlyMap<string, boolean>>(new Map());
  protected readonly groups = computed(() => this.groupsOf(this.view()));

  protected toggle(title: string, isOpen: boolean): void {
    this.chosen.update((chosen) => new Map(chosen).set(title, isOpen));
  }

  private groupsOf(view: ResultView): Group[] {
    const governing = view.lines.indexOf(governingLine(view, 'eye'));
    const groups = new Map<string, NumberedStep[]>();
    (view.result.steps ?? []).forEach((step, index) => {
      const key = `${step.side} ${step.beam ?? 'all'}`;
      groups.set(key, [...(groups.get(key) ?? []), { step, number: index + 1 }]);
    });
    return [...groups.values()].map((steps) => {
      const first = (steps[0] as NumberedStep).step;
      const title = titleOf(view, first);
      const isProposed =
        first.side === 'eye' && (first.beam === undefined || first.beam === governing);
      const isOpen = this.chosen().get(title) ?? isProposed;
      const shown = isOpen ? steps.map(({ step, number }) => this.shown(step, number)) : [];
      return { title, count: steps.length, isOpen, steps: shown };
    });
  }

  private shown(step: Step, number: number): ShownStep {
    const digits = this.allDigits() ? (text: string) => text : shortened;
    return {
      number,
      step,
      formula: digits(`${step.symbol} = ${step.formula}`),
      substituted: step.substituted === step.formula ? undefined : digits(step.substituted),
      value: this.allDigits() ? String(step.value) : stepValue(step),
      unit: unitWithGap(step),
    };
  }
}

function unitWithGap(step: Step): string {
  const unit = stepUnit(step);
  return unit && UNIT_SPACE + unit;
}

function titleOf(view: ResultView, { side, beam }: Step): string {
  const name = side === 'eye' ? 'Eye' : 'Skin';
  if (view.lines.length === 1) return name;
  const line = beam === undefined ? undefined : view.lines[beam];
  return line ? `${name}, ${formatWavelength(line.beam.wavelengthNm).text}` : `${name}, all lines`;
}
