import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { PROVENANCES, provenanceSchema } from '@shared/model/common';
import { beamOf } from '@shared/model/emission-beam';
import { emissionSummary } from '@shared/model/laser-summary';
import {
  DELIVERIES,
  type Emission,
  EMISSION_MODES,
  emissionSchema,
  WIDTH_CONVENTIONS,
} from '@shared/model/lasers';
import { PROVENANCE_WORDS } from '@shared/text/provenance-words';
import { map, startWith, switchMap } from 'rxjs';

import { filled } from '../../../core/forms/filled';
import { Control } from '../../../ui/field/control';
import { Field } from '../../../ui/field/field';
import { Icon } from '../../../ui/icon/icon';
import { LineSwatch } from '../../../ui/line-swatch/line-swatch';
import { QuantityField } from '../../../ui/quantity-field/quantity-field';
import {
  DELIVERY_WORDS,
  FIBER_FIELDS,
  MODE_FIELDS,
  MODE_WORDS,
  QUANTITY_NAMES,
  type QuantitySpec,
} from './emission-fields';
import type { EmissionForm } from './laser-form';
import { type EmissionValue, emissionFrom } from './laser-form-value';
import { SourcedQuantity } from './sourced-quantity';

const CONVENTION_WORDS = { '1/e': '1/e', '1/e2': '1/e²', fwhm: 'half maximum (FWHM)' } as const;

const WAVELENGTH: QuantitySpec = { name: 'wavelengthNm', label: 'Wavelength', kind: 'wavelength' };
const TO: QuantitySpec = { name: 'wavelengthToNm', label: 'Tunable to', kind: 'wavelength' };
const DIAMETER: QuantitySpec = {
  name: 'diameterMm',
  label: 'Diameter at the exit',
  kind: 'diameter',
};
const DIVERGENCE: QuantitySpec = {
  name: 'divergenceMrad',
  label: 'Divergence',
  kind: 'divergence',
  hint: 'Empty when unknown: the smallest possible is then assumed',
  optional: true,
};
const SOURCE: QuantitySpec = {
  name: 'sourceMrad',
  label: 'Apparent source',
  kind: 'divergence',
  hint: 'Only with evidence; else a small source',
  optional: true,
};

/** One line in one mode, in the terms of its data sheet. */
@Component({
  selector: 'lm-emission-editor',
  imports: [
    Control,
    Field,
    Icon,
    LineSwatch,
    MatButton,
    QuantityField,
    ReactiveFormsModule,
    SourcedQuantity,
  ],
  templateUrl: './emission-editor.html',
  styleUrl: './emission-editor.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EmissionEditor {
  readonly form = input.required<EmissionForm>();
  readonly index = input.required<number>();

  /** Whether the fields are shown to begin with, or, in a long list, only the line's name. */
  readonly isShown = input(true);

  readonly duplicated = output();
  readonly removed = output();

  protected readonly isOpen = linkedSignal(() => this.isShown());
  protected readonly path = computed(() => `emissions[${this.index()}]`);
  protected readonly value = toSignal(
    toObservable(this.form).pipe(
      switchMap((form) =>
        form.valueChanges.pipe(
          startWith(null),
          map(() => form.getRawValue() as EmissionValue),
        ),
      ),
    ),
  );
  protected readonly summary = computed(() => {
    const emission = contractOf(this.value());
    return emission ? emissionSummary(emission) : '';
  });
  protected readonly swatch = computed(() => {
    const value = this.value();
    const wavelengthNm = value?.wavelengthNm.value?.value;
    if (!value || !wavelengthNm) return null;
    const wavelengthToNm = value.isTunable ? value.wavelengthToNm.value?.value : undefined;
    return [{ wavelengthNm, ...(wavelengthToNm && { wavelengthToNm }) }];
  });
  protected readonly emits = computed(() => MODE_FIELDS[this.value()?.mode ?? 'cw']);
  protected readonly fiber = computed(() => FIBER_FIELDS[this.value()?.delivery ?? 'beam']);
  protected readonly isFree = computed(() => this.value()?.delivery === 'beam');
  protected readonly isGaussian = computed(() => this.value()?.profile === 'gaussian');
  protected readonly diameters = computed(() => this.axes(DIAMETER));
  protected readonly divergences = computed(() => this.axes(DIVERGENCE));
  /** What is made of the figures; what is missing before anything can be. */
  protected readonly notes = computed(() => notesOf(this.value()));

  protected readonly wavelength = WAVELENGTH;
  protected readonly wavelengthTo = TO;
  protected readonly source = SOURCE;
  protected readonly modes = EMISSION_MODES.map((mode) => ({ mode, words: MODE_WORDS[mode] }));
  protected readonly deliveries = DELIVERIES.map((delivery) => ({
    delivery,
    words: DELIVERY_WORDS[delivery],
  }));
  protected readonly conventions = WIDTH_CONVENTIONS.map((convention) => ({
    convention,
    words: CONVENTION_WORDS[convention],
  }));
  protected readonly sources = PROVENANCES.map((source) => ({
    source,
    words: PROVENANCE_WORDS[source],
  }));
  /** The one source of all numbers of the line; empty when they differ. */
  protected readonly commonSource = computed(() => {
    const value = this.value();
    const used = new Set(
      QUANTITY_NAMES.flatMap((name) => (value?.[name].value ? [value[name].source] : [])),
    );
    return used.size > 1 ? '' : ([...used][0] ?? value?.wavelengthNm.source ?? '');
  });

  /** A line with something unreadable stays open: folded, what was typed would be lost. */
  protected fold(): void {
    if (this.isOpen() && this.form().invalid) this.form().markAllAsTouched();
    else this.isOpen.update((isOpen) => !isOpen);
  }

  protected setSource(text: string): void {
    const source = provenanceSchema.safeParse(text).data;
    if (!source) return;
    const { controls } = this.form();
    QUANTITY_NAMES.forEach((name) => controls[name].patchValue({ source }));
    this.form().markAsDirty();
  }

  private axes(spec: QuantitySpec): readonly QuantitySpec[] {
    if (!this.value()?.isElliptical) return [spec];
    const second = spec.name === 'diameterMm' ? 'diameterYMm' : 'divergenceYMrad';
    return [
      { ...spec, label: `${spec.label}, x` },
      { ...spec, name: second, label: `${spec.label}, y`, hint: '' },
    ];
  }
}

function contractOf(value: EmissionValue | undefined): Emission | undefined {
  return value && emissionSchema.safeParse(filled(emissionFrom(value))).data;
}

function notesOf(value: EmissionValue | undefined): readonly string[] {
  const emission = contractOf(value);
  if (!emission) return [];
  const { wavelengthNm, wavelengthToNm } = emission;
  const beam = beamOf(emission, wavelengthToNm && wavelengthNm.value);
  if (!beam.ok) return beam.errors.map(({ message }) => message);
  // Which wavelength of a tuning range counts is decided in the evaluation.
  const assumptions = beam.assumptions.filter((note) => !note.startsWith('Evaluated at'));
  return [...beam.conversions, ...assumptions];
}
