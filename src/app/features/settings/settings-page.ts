import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  linkedSignal,
  signal,
} from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { RULE_SETS } from '@shared/hazard/rule-sets';
import { CLASS_SCHEMES, type Settings, settingsInputSchema } from '@shared/model/settings';
import { scopeOf } from '@shared/permissions/permissions';

import { RecordSave } from '../../core/forms/record-save';
import { asProblem } from '../../core/http/problem-error';
import { CurrentSession } from '../../core/session/current-session';
import { InstantPipe } from '../../core/time/instant-pipe';
import type { HoldsUnsavedChanges } from '../../core/unsaved/unsaved-changes-guard';
import { Control } from '../../ui/field/control';
import { Field } from '../../ui/field/field';
import { ProblemPanel } from '../../ui/problem-panel/problem-panel';
import { VersionConflict } from '../../ui/version-conflict/version-conflict';
import { SettingsApi, settingsResource } from './settings-api';
import { settingsForm, settingsInput } from './settings-form';

const SCHEME_WORDS: Readonly<Record<(typeof CLASS_SCHEMES)[number], string>> = {
  'iec-60825-1-2014': 'IEC 60825-1:2014 (1 to 4)',
  '21-cfr-1040.10': '21 CFR 1040.10 (I to IV)',
};

/** What the site has decided: rule set, class scheme, who may approve, numbers to call. */
@Component({
  selector: 'lm-settings-page',
  imports: [
    Control,
    Field,
    InstantPipe,
    MatButton,
    ProblemPanel,
    ReactiveFormsModule,
    VersionConflict,
  ],
  templateUrl: './settings-page.html',
  styleUrl: './settings-page.scss',
  host: { '(window:beforeunload)': 'hasUnsavedChanges() && $event.preventDefault()' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SettingsPage implements HoldsUnsavedChanges {
  private readonly api = inject(SettingsApi);
  private readonly fb = inject(NonNullableFormBuilder);
  private readonly session = inject(CurrentSession);

  readonly whenLeft = 'The settings you changed are not saved.';

  private readonly resource = settingsResource();
  protected readonly save = new RecordSave<Settings>();
  protected readonly base = linkedSignal(() =>
    this.resource.hasValue() ? this.resource.value() : undefined,
  );
  protected readonly form = computed(() => {
    const base = this.base();
    if (!base) return null;
    const form = settingsForm(this.fb, base);
    if (!this.mayUpdate()) form.disable();
    return form;
  });
  protected readonly readProblem = computed(() => {
    const error = this.resource.error();
    return error ? asProblem(error) : null;
  });
  protected readonly said = signal('');
  protected readonly ruleSets = RULE_SETS;
  protected readonly schemes = CLASS_SCHEMES.map((scheme) => ({
    scheme,
    words: SCHEME_WORDS[scheme],
  }));
  protected readonly zones = Intl.supportedValuesOf('timeZone');
  protected readonly mayUpdate = computed(
    () => scopeOf('settings.update', this.session.user()?.roles ?? []) !== undefined,
  );
  protected readonly conflict = computed(() => {
    const stored = this.save.stored();
    const form = this.form();
    return stored && form ? { stored: settingsInput(stored), mine: form.getRawValue() } : null;
  });

  hasUnsavedChanges(): boolean {
    return this.form()?.dirty ?? false;
  }

  protected submit(version = this.base()?.version): void {
    const form = this.form();
    if (!form || !version) return;
    this.said.set('');
    const settings = this.save.check(form, settingsInputSchema, form.getRawValue());
    if (!settings) return;
    this.save.run(form, {
      send: () => this.api.update(version, settings),
      reread: () => this.api.read(),
      done: (stored) => {
        this.base.set(stored);
        this.said.set('Saved.');
        // The shell shows the name of the site and writes times in its zone.
        void this.session.load();
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
}
