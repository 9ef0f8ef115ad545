import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { scopeOf } from '@shared/permissions/permissions';
import { map } from 'rxjs';

import { CurrentSession } from '../../../core/session/current-session';
import { Control } from '../../../ui/field/control';
import { Field } from '../../../ui/field/field';
import type { FindRecords, RecordOption } from '../../../ui/record-picker/record-option';
import { RecordPicker } from '../../../ui/record-picker/record-picker';
import { AreasApi } from '../../areas/areas-api';
import { PeopleApi } from '../../people/people-api';
import type { LaserForm } from './laser-form';

/** Where the laser stands and who answers for it. */
@Component({
  selector: 'lm-place-section',
  imports: [Control, Field, ReactiveFormsModule, RecordPicker],
  templateUrl: './place-section.html',
  styleUrl: './sections.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlaceSection {
  private readonly areas = inject(AreasApi);
  private readonly people = inject(PeopleApi);
  private readonly user = inject(CurrentSession).user;

  readonly form = input.required<LaserForm>();
  /** Records that the form begins with, for their names. */
  readonly area = input<RecordOption | null>(null);
  readonly supervisor = input<RecordOption | null>(null);
  readonly alternate = input<RecordOption | null>(null);

  protected readonly mayFindAreas = computed(() => this.may('area.read'));
  protected readonly mayFindPeople = computed(() => this.may('person.list'));

  protected readonly findAreas: FindRecords = (q) =>
    this.areas
      .list({ q, limit: 20 })
      .pipe(map((page) => page.rows.map(({ id, code, name }) => ({ id, name: code, note: name }))));

  protected readonly findPeople: FindRecords = (q) =>
    this.people
      .list({ q, limit: 20 })
      .pipe(
        map((page) =>
          page.rows.map(({ id, name, department }) => ({ id, name, note: department })),
        ),
      );

  private may(action: 'area.read' | 'person.list'): boolean {
    return scopeOf(action, this.user()?.roles ?? []) !== undefined;
  }
}
