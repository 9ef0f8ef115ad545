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
import { takeUntilDestroyed, toObservable, toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Title } from '@angular/platform-browser';
import { Router, RouterLink } from '@angular/router';
import type { PersonRef } from '@shared/model/common';
import { type Laser, type LaserInput, laserInputSchema } from '@shared/model/lasers';
import { scopeOf } from '@shared/permissions/permissions';
import { debounceTime, EMPTY, map, startWith, switchMap } from 'rxjs';

import { LocalDrafts } from '../../../core/drafts/local-drafts';
import { filled } from '../../../core/forms/filled';
import { RecordSave } from '../../../core/forms/record-save';
import { asProblem } from '../../../core/http/problem-error';
import { CurrentSession } from '../../../core/session/current-session';
import { InstantPipe } from '../../../core/time/instant-pipe';
import type { HoldsUnsavedChanges } from '../../../core/unsaved/unsaved-changes-guard';
import { ProblemPanel } from '../../../ui/problem-panel/problem-panel';
import { VersionConflict } from '../../../ui/version-conflict/version-conflict';
import { areaResource } from '../../areas/areas-api';
import { personResource } from '../../people/people-api';
import { settingsResource } from '../../settings/settings-api';
import { laserResource, LasersApi } from '../lasers-api';
import { EmissionList } from './emission-list';
import { IdentitySection } from './identity-section';
import { laserForm, laserFormValue } from './laser-form';
import {
  copyOf,
  emptyLaser,
  formValueOf,
  laserInputFrom,
  type LaserFormValue,
  laserInputOf,
} from './laser-form-value';
import { LaserPreview } from './laser-preview';
import { MoreSections } from './more-sections';
import { PlaceSection } from './place-section';

/** Where a form begins: a stored record, a draft, a copy, or nothing. */
interface Beginning {
  readonly value: LaserFormValue;
  /** Version of the record that the values were typed over. */
  readonly version: number | undefined;
  readonly draftOf?: string;
}

const AUTOSAVE_MS = 800;

/** Registers a laser, changes one, copies one, or declares one found. */
@Component({
  selector: 'lm-laser-form-page',
  imports: [
    EmissionList,
    IdentitySection,
    InstantPipe,
    LaserPreview,
    MatButton,
    MoreSections,
    PlaceSection,
    ProblemPanel,
    ReactiveFormsModule,
    RouterLink,
    VersionConflict,
  ],
  templateUrl: './laser-form-page.html',
  styleUrl: './laser-form-page.scss',
  host: { '(window:beforeunload)': 'hasUnsavedChanges() && $event.preventDefault()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserFormPage implements HoldsUnsavedChanges {
  private readonly api = inject(LasersApi);
  private readonly drafts = inject(LocalDrafts);
  private readonly router = inject(Router);
  private readonly title = inject(Title);
  private readonly session = inject(CurrentSession);
  private readonly fb = inject(NonNullableFormBuilder);

  readonly id = input<string>();
  readonly copyOf = input<string>();
  /** The laser was found, given, brought along or home-built. */
  readonly found = input(false);

  readonly whenLeft =
    'What you typed is kept as a draft on this device, until you sign out, and comes back here.';

  private readonly resource = laserResource(computed(() => this.id() ?? this.copyOf()));
  private readonly settings = settingsResource();
  protected readonly save = new RecordSave<Laser>();
  private readonly isSaved = signal(false);
  /** The laser that was just declared found. */
  protected readonly declared = signal<Laser | null>(null);
  protected readonly mayOpen = computed(
    () => scopeOf('laser.read', this.session.user()?.roles ?? []) === 'site',
  );

  protected readonly source = linkedSignal<Laser | undefined>(() =>
    this.resource.hasValue() ? this.resource.value() : undefined,
  );
  protected readonly beginning = linkedSignal<Beginning | null>(() => this.begin());
  protected readonly form = computed(() => {
    const beginning = this.beginning();
    return beginning && laserForm(this.fb, beginning.value);
  });
  /** What is typed, a moment later. */
  protected readonly value = toSignal(
    toObservable(this.form).pipe(
      switchMap((form) =>
        form
          ? form.valueChanges.pipe(
              debounceTime(60),
              startWith(null),
              map(() => laserFormValue(form)),
            )
          : EMPTY,
      ),
    ),
  );
  protected readonly serial = computed(() => this.value()?.record.serial ?? '');
  protected readonly readProblem = computed(() => {
    const error = this.resource.error();
    return error ? asProblem(error) : null;
  });
  protected readonly head = computed(() => {
    if (this.id()) return `Change ${this.source()?.tag ?? 'a laser'}`;
    return this.found() ? 'Declare a laser found' : 'Register a laser';
  });
  protected readonly hasErrors = computed(
    () => this.save.errors().length > 0 || (this.save.problem()?.errors?.length ?? 0) > 0,
  );
  protected readonly ruleSet = computed(() =>
    this.settings.hasValue() ? this.settings.value().ruleSet : undefined,
  );
  private readonly area = areaResource(computed(() => this.value()?.record.areaId || undefined));
  protected readonly wallDistanceM = computed(() =>
    this.area.hasValue() ? this.area.value()?.wallDistanceM : undefined,
  );
  protected readonly areaOption = computed(() => {
    const area = this.area.hasValue() ? this.area.value() : this.source()?.area;
    return area ? { id: area.id, name: area.code, note: area.name } : null;
  });
  protected readonly supervisor = this.personOf('supervisorId', () => this.source()?.supervisor);
  protected readonly alternate = this.personOf('alternateId', () => this.source()?.alternate);
  protected readonly conflict = computed(() => {
    const stored = this.save.stored();
    const form = this.form();
    if (!stored || !form) return null;
    const mine = laserInputSchema.safeParse(filled(laserInputFrom(laserFormValue(form))));
    return { stored: laserInputOf(stored), mine: mine.data ?? {} };
  });

  constructor() {
    // The window's name says what the page does, and that something needs correction.
    effect(() => {
      this.title.setTitle(`${this.hasErrors() ? 'Error: ' : ''}${this.head()} · Limen`);
    });
    toObservable(this.form)
      .pipe(
        switchMap((form) => form?.valueChanges ?? EMPTY),
        debounceTime(AUTOSAVE_MS),
        takeUntilDestroyed(),
      )
      .subscribe(() => this.keepDraft());
  }

  hasUnsavedChanges(): boolean {
    return (
      !this.isSaved() && ((this.form()?.dirty ?? false) || this.beginning()?.draftOf !== undefined)
    );
  }

  protected submit(version = this.beginning()?.version): void {
    const form = this.form();
    if (!form) return;
    this.keepDraft();
    const laser = this.save.check(form, laserInputSchema, laserInputFrom(laserFormValue(form)));
    if (!laser) return;
    const id = this.id();
    this.save.run(form, {
      send: () => this.send(laser, id, version),
      ...(id && { reread: () => this.api.read(id) }),
      done: (stored) => {
        this.isSaved.set(true);
        this.drafts.forget(this.draftName());
        // Whoever finds a laser need not have a part in it and may not see its page.
        if (this.found()) this.declared.set(stored);
        else void this.router.navigate(['/lasers', stored.id]);
      },
    });
  }

  protected keepMine(): void {
    this.submit(this.save.stored()?.version);
  }

  protected takeStored(): void {
    const stored = this.save.stored();
    if (!stored) return;
    this.drafts.forget(this.draftName());
    this.source.set(stored);
    this.save.stored.set(null);
  }

  protected discardDraft(): void {
    this.drafts.forget(this.draftName());
    this.beginning.set(this.begin());
  }

  private send(laser: LaserInput, id: string | undefined, version: number | undefined) {
    if (id && version) return this.api.update(id, version, laser);
    return this.found() ? this.api.declareFound(laser) : this.api.register(laser);
  }

  /** A draft of before comes first; then the record, its copy, or an empty form. */
  private begin(): Beginning | null {
    const stored = this.source();
    if ((this.id() ?? this.copyOf()) && !stored) return null;
    const draft = this.drafts.read(this.draftName());
    if (draft) return { ...(draft.value as Beginning), draftOf: draft.savedAt };
    if (!stored)
      return { value: this.found() ? nothingYet() : emptyLaser('e1'), version: undefined };
    const record = laserInputOf(stored);
    return this.id()
      ? { value: formValueOf(record), version: stored.version }
      : { value: copyOf(record), version: undefined };
  }

  private keepDraft(): void {
    const form = this.form();
    if (!form?.dirty || this.isSaved()) return;
    const draft: Beginning = { value: laserFormValue(form), version: this.beginning()?.version };
    this.drafts.write(this.draftName(), draft);
  }

  /** The name of a person that the form begins with, also when it begins with a draft. */
  private personOf(name: 'supervisorId' | 'alternateId', stored: () => PersonRef | undefined) {
    const person = personResource(
      computed(() => {
        const id = this.beginning()?.value.record[name];
        return id && id !== stored()?.id ? id : undefined;
      }),
    );
    return computed(() => (person.hasValue() ? person.value() : stored()) ?? null);
  }

  private draftName(): string {
    return `laser.${this.id() ?? (this.found() ? 'found' : (this.copyOf() ?? 'new'))}`;
  }
}

/** Of a laser that was found little may be known, not even a line. */
function nothingYet(): LaserFormValue {
  return { ...emptyLaser('e1'), emissions: [] };
}
