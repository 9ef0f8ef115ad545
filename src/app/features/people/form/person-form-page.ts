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
import {
  type Person,
  type PersonInput,
  personInputSchema,
  ROLE_WORDS,
  ROLES,
} from '@shared/model/people';
import { scopeOf } from '@shared/permissions/permissions';
import { map, type Observable } from 'rxjs';

import { RecordSave } from '../../../core/forms/record-save';
import { asProblem } from '../../../core/http/problem-error';
import { CurrentSession } from '../../../core/session/current-session';
import type { HoldsUnsavedChanges } from '../../../core/unsaved/unsaved-changes-guard';
import { Control } from '../../../ui/field/control';
import { Field } from '../../../ui/field/field';
import { ProblemPanel } from '../../../ui/problem-panel/problem-panel';
import { VersionConflict } from '../../../ui/version-conflict/version-conflict';
import { type Invitation, PeopleApi, personResource } from '../people-api';
import { InvitationLink } from './invitation-link';
import { personForm, personInput, personValue } from './person-form';

/** Enters a person and gives the link with which they set a password; changes one. */
@Component({
  selector: 'lm-person-form-page',
  imports: [
    Control,
    Field,
    InvitationLink,
    MatButton,
    ProblemPanel,
    ReactiveFormsModule,
    RouterLink,
    VersionConflict,
  ],
  templateUrl: './person-form-page.html',
  styleUrl: './person-form-page.scss',
  host: { '(window:beforeunload)': 'hasUnsavedChanges() && $event.preventDefault()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PersonFormPage implements HoldsUnsavedChanges {
  private readonly api = inject(PeopleApi);
  private readonly router = inject(Router);
  private readonly fb = inject(NonNullableFormBuilder);
  private readonly session = inject(CurrentSession);

  readonly id = input<string>();

  readonly whenLeft = 'What you typed is not saved and will be gone.';

  protected readonly person = personResource(this.id);
  protected readonly save = new RecordSave<Person>();
  protected readonly inviting = new RecordSave<Invitation>();
  /** Shown once; the server does not tell it again. */
  protected readonly invitation = signal<Invitation | null>(null);
  private readonly isSaved = signal(false);
  protected readonly base = linkedSignal(() =>
    this.person.hasValue() ? this.person.value() : undefined,
  );
  protected readonly form = computed(() =>
    this.id() && !this.base() ? null : personForm(this.fb, this.base()),
  );
  protected readonly readProblem = computed(() => {
    const error = this.person.error();
    return error ? asProblem(error) : null;
  });
  protected readonly roles = ROLES.map((role) => ({ role, words: ROLE_WORDS[role] }));
  protected readonly mayUpdate = computed(
    () => scopeOf('person.update', this.session.user()?.roles ?? []) !== undefined,
  );
  protected readonly conflict = computed(() => {
    const stored = this.save.stored();
    const form = this.form();
    return stored && form ? { stored: personInput(stored), mine: personValue(form) } : null;
  });

  hasUnsavedChanges(): boolean {
    return !this.isSaved() && (this.form()?.dirty ?? false);
  }

  protected submit(version = this.base()?.version): void {
    const form = this.form();
    if (!form) return;
    const person = this.save.check(form, personInputSchema, personValue(form));
    if (!person) return;
    const id = this.id();
    this.save.run(form, {
      send: () => this.send(person, id, version),
      ...(id && { reread: () => this.api.read(id) }),
      done: () => {
        this.isSaved.set(true);
        if (id) void this.router.navigate(['/people']);
      },
    });
  }

  protected inviteAgain(): void {
    const id = this.id();
    const form = this.form();
    if (!id || !form) return;
    this.inviting.run(form, {
      send: () => this.api.invite(id),
      done: (invitation) => this.invitation.set(invitation),
    });
  }

  protected keepMine(): void {
    this.submit(this.save.stored()?.version);
  }

  protected takeStored(): void {
    this.base.set(this.save.stored() ?? undefined);
    this.save.stored.set(null);
  }

  private send(
    person: PersonInput,
    id: string | undefined,
    version: number | undefined,
  ): Observable<Person> {
    if (id && version) return this.api.update(id, version, person);
    return this.api.create(person).pipe(
      map((invitation) => {
        this.invitation.set(invitation);
        return invitation.person;
      }),
    );
  }
}
