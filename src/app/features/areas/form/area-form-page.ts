import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { type Area, type AreaInput, areaInputSchema } from '@shared/model/areas';
import { scopeOf } from '@shared/permissions/permissions';
import { map } from 'rxjs';

import { RecordSave } from '../../../core/forms/record-save';
import { asProblem } from '../../../core/http/problem-error';
import { CurrentSession } from '../../../core/session/current-session';
import type { HoldsUnsavedChanges } from '../../../core/unsaved/unsaved-changes-guard';
import { Control } from '../../../ui/field/control';
import { Field } from '../../../ui/field/field';
import { ProblemPanel } from '../../../ui/problem-panel/problem-panel';
import { QuantityField } from '../../../ui/quantity-field/quantity-field';
import type { FindRecords } from '../../../ui/record-picker/record-option';
import { RecordPicker } from '../../../ui/record-picker/record-picker';
import { VersionConflict } from '../../../ui/version-conflict/version-conflict';
import { PeopleApi } from '../../people/people-api';
import { AreasApi, areaResource } from '../areas-api';
import { areaForm, areaInput, areaValue } from './area-form';

/** Enters a room, or changes one. */
@Component({
  selector: 'lm-area-form-page',
  imports: [
    Control,
    Field,
    MatButton,
    ProblemPanel,
    QuantityField,
    ReactiveFormsModule,
    RecordPicker,
    RouterLink,
    VersionConflict,
  ],
  templateUrl: './area-form-page.html',
  styleUrl: './area-form-page.scss',
  host: { '(window:beforeunload)': 'hasUnsavedChanges() && $event.preventDefault()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AreaFormPage implements HoldsUnsavedChanges {
  private readonly api = inject(AreasApi);
  private readonly people = inject(PeopleApi);
  private readonly router = inject(Router);
  private readonly fb = inject(NonNullableFormBuilder);
  private readonly user = inject(CurrentSession).user;

  readonly id = input<string>();

  readonly whenLeft = 'What you typed is not saved and will be gone.';

  protected readonly area = areaResource(this.id);
  protected readonly save = new RecordSave<Area>();
  private readonly saved = signal(false);
  /** The stored area that the form began with, or was told of by a conflict. */
  private readonly base = linkedSignal(() =>
    this.area.hasValue() ? this.area.value() : undefined,
  );
  protected readonly form = computed(() => {
    if (this.id() && !this.base()) return null;
    return areaForm(this.fb, this.base());
  });
  protected readonly readProblem = computed(() => {
    const error = this.area.error();
    return error ? asProblem(error) : null;
  });
  protected readonly supervisor = computed(() => this.base()?.supervisor ?? null);
  protected readonly alternate = computed(() => this.base()?.alternate ?? null);
  protected readonly mayFindPeople = computed(
    () => scopeOf('person.list', this.user()?.roles ?? []) !== undefined,
  );
  /** Both sides of a conflict, in the shape of the form. */
  protected readonly conflict = computed(() => {
    const stored = this.save.stored();
    const form = this.form();
    return stored && form ? { stored: areaInput(stored), mine: areaValue(form) } : null;
  });

  protected readonly findPeople: FindRecords = (text) =>
    this.people
      .list({ q: text, limit: 20 })
      .pipe(
        map((page) =>
          page.rows.map(({ id, name, department }) => ({ id, name, note: department })),
        ),
      );

  hasUnsavedChanges(): boolean {
    return !this.saved() && (this.form()?.dirty ?? false);
  }

  protected submit(version = this.base()?.version): void {
    const form = this.form();
    if (!form) return;
    const area = this.save.check(form, areaInputSchema, areaValue(form));
    if (!area) return;
    const id = this.id();
    this.save.run(form, {
      send: () => this.send(area, id, version),
      ...(id && { reread: () => this.api.read(id) }),
      done: (stored) => {
        this.saved.set(true);
        void this.router.navigate(['/areas', stored.id]);
      },
    });
  }

  protected keepMine(): void {
    this.submit(this.save.stored()?.version);
  }

  protected takeStored(): void {
    this.base.set(this.save.stored() ?? undefined);
    this.save.stored.set(null);
  }

  private send(area: AreaInput, id: string | undefined, version: number | undefined) {
    return id && version ? this.api.update(id, version, area) : this.api.create(area);
  }
}
