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

interface Group {
  readonly title: string;
  readonly steps: readonly ShownStep[];
  readonly isOpen: boolean;
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
  protected readonly groups = computed(() => this.groupsOf(this.view()));

  private groupsOf(view: ResultView): Group[] {
    const governing = view.lines.indexOf(governingLine(view, 'eye'));
    const groups = new Map<string, { steps: ShownStep[]; first: Step }>();
    (view.result.steps ?? []).forEach((step, index) => {
      const key = `${step.side} ${step.beam ?? 'all'}`;
      const group = groups.get(key) ?? { steps: [], first: step };
      group.steps.push(this.shown(step, index + 1));
      groups.set(key, group);
    });
    return [...groups.values()].map(({ steps, first }) => ({
      title: titleOf(view, first),
      steps,
      isOpen: first.side === 'eye' && (first.beam === undefined || first.beam === governing),
    }));
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
