import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { map, startWith, switchMap } from 'rxjs';

import { Control } from '../../../ui/field/control';
import { Field } from '../../../ui/field/field';
import { Icon } from '../../../ui/icon/icon';
import { EmissionEditor } from './emission-editor';
import { emissionForm, emissionSetForm, type LaserForm } from './laser-form';
import { emptyEmission, type EmissionValue } from './laser-form-value';
import { newEmissionId } from './new-emission-id';

/** Every line of a laser, and which of them can be on together. */
@Component({
  selector: 'lm-emission-list',
  imports: [Control, EmissionEditor, Field, Icon, MatButton, ReactiveFormsModule],
  templateUrl: './emission-list.html',
  styleUrl: './emission-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EmissionList {
  private readonly fb = inject(NonNullableFormBuilder);

  readonly form = input.required<LaserForm>();
  /** Something in the form needs correction, maybe in a line. */
  readonly hasErrors = input(false);

  private readonly values = toSignal(
    toObservable(this.form).pipe(
      switchMap((form) =>
        form.valueChanges.pipe(
          startWith(null),
          map(() => form.getRawValue()),
        ),
      ),
    ),
  );
  /** Lines that were there from the start; in a long list they show their names only. */
  private readonly firstIds = computed(() =>
    this.form().controls.emissions.controls.map(({ controls }) => controls.id.value),
  );
  /** The lines' names, for the sets; also what makes the view follow added and removed lines. */
  protected readonly lines = computed(() =>
    (this.values()?.emissions ?? []).map((value, index) => ({
      id: value.id,
      words: lineWords(value as EmissionValue, index),
    })),
  );
  protected readonly setCount = computed(() => this.values()?.emissionSets.length ?? 0);

  protected add(): void {
    const { emissions } = this.form().controls;
    const before = emissions.controls.at(-1)?.controls.wavelengthNm.value.source;
    emissions.push(emissionForm(this.fb, emptyEmission(newEmissionId(this.ids()), before)));
    this.form().markAsDirty();
  }

  protected duplicate(index: number): void {
    const { emissions } = this.form().controls;
    const value = emissions.at(index).getRawValue() as EmissionValue;
    const copy = { ...structuredClone(value), id: newEmissionId(this.ids()) };
    emissions.insert(index + 1, emissionForm(this.fb, copy));
    this.form().markAsDirty();
  }

  protected remove(index: number): void {
    const { emissions, emissionSets } = this.form().controls;
    const id = emissions.at(index).controls.id.value;
    emissions.removeAt(index);
    for (const set of emissionSets.controls) {
      set.controls.emissionIds.setValue(set.controls.emissionIds.value.filter((one) => one !== id));
    }
    this.form().markAsDirty();
  }

  protected addSet(): void {
    this.form().controls.emissionSets.push(emissionSetForm(this.fb, { name: '', emissionIds: [] }));
    this.form().markAsDirty();
  }

  protected removeSet(index: number): void {
    this.form().controls.emissionSets.removeAt(index);
    this.form().markAsDirty();
  }

  protected isInSet(index: number, id: string): boolean {
    return this.form().controls.emissionSets.at(index).controls.emissionIds.value.includes(id);
  }

  protected toggle(index: number, id: string, isIn: boolean): void {
    const control = this.form().controls.emissionSets.at(index).controls.emissionIds;
    const others = control.value.filter((one) => one !== id);
    control.setValue(isIn ? [...others, id] : others);
    control.markAsDirty();
  }

  protected isShown(id: string): boolean {
    return this.hasErrors() || this.firstIds().length < 2 || !this.firstIds().includes(id);
  }

  private ids(): readonly string[] {
    return this.form().controls.emissions.controls.map(({ controls }) => controls.id.value);
  }
}

function lineWords({ label, wavelengthNm }: EmissionValue, index: number): string {
  const value = wavelengthNm.value;
  const wavelength = value ? (value.text ?? `${value.value} nm`) : '';
  return [`Line ${index + 1}`, label, wavelength].filter(Boolean).join(', ');
}
