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
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { addDays } from '@shared/model/local-date';
import { RECORD_KINDS, type RecordKind, recordKindSchema } from '@shared/model/records';
import { scopeOf } from '@shared/permissions/permissions';
import { map } from 'rxjs';

import { keepInAddress } from '../../core/paging/keep-in-address';
import { KeysetList, PAGE_ROWS } from '../../core/paging/keyset-list';
import { CurrentSession } from '../../core/session/current-session';
import { InstantPipe } from '../../core/time/instant-pipe';
import { startOfDay } from '../../core/time/start-of-day';
import { AuditEntryView } from '../../ui/audit-entry/audit-entry-view';
import { Icon } from '../../ui/icon/icon';
import type { FindRecords } from '../../ui/record-picker/record-option';
import { RecordPicker } from '../../ui/record-picker/record-picker';
import { TableState } from '../../ui/table-state/table-state';
import { PeopleApi, personResource } from '../people/people-api';
import { RecordsApi, trailCsvAddress } from './records-api';
import { TrailCheck } from './trail-check';

const KIND_WORDS: Readonly<Record<RecordKind, string>> = {
  account: 'Accounts',
  area: 'Areas',
  evaluation: 'Evaluations',
  laser: 'Lasers',
  'laser-file': 'Files of lasers',
  'laser-import': 'CSV imports',
  person: 'People',
  session: 'Sign-ins',
  settings: 'Settings',
};

interface TrailFilter {
  readonly kind: RecordKind | '';
  readonly record: string;
  readonly actor: string;
  /** Local dates of the site, both included. */
  readonly from: string;
  readonly to: string;
}

const DATE = /^\d{4}-\d{2}-\d{2}$/;

/** The audit trail: everything that was done, newest first. */
@Component({
  selector: 'lm-records-page',
  imports: [
    AuditEntryView,
    Icon,
    InstantPipe,
    MatButton,
    ReactiveFormsModule,
    RecordPicker,
    TableState,
    TrailCheck,
  ],
  templateUrl: './records-page.html',
  styleUrl: './records-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RecordsPage {
  private readonly api = inject(RecordsApi);
  private readonly people = inject(PeopleApi);
  private readonly session = inject(CurrentSession);

  readonly kind = input<string>();
  readonly record = input<string>();
  readonly actor = input<string>();
  readonly from = input<string>();
  readonly to = input<string>();
  readonly rows = input<string>();

  protected readonly filter = linkedSignal<TrailFilter>(() => ({
    kind: recordKindSchema.safeParse(this.kind()).data ?? '',
    record: this.record() ?? '',
    actor: this.actor() ?? '',
    from: dateOrNone(this.from()),
    to: dateOrNone(this.to()),
  }));
  private readonly shown = linkedSignal(() => Number(this.rows()) || PAGE_ROWS);
  private readonly zone = computed(() => this.session.site()?.zone ?? 'UTC');
  private readonly query = computed(() => {
    const { kind, record, actor, from, to } = this.filter();
    return {
      recordKind: kind || undefined,
      recordId: record || undefined,
      actorId: actor || undefined,
      from: from ? startOfDay(from, this.zone()) : undefined,
      to: to ? startOfDay(addDays(to, 1), this.zone()) : undefined,
    };
  });

  protected readonly entries = new KeysetList({
    name: 'audit-trail',
    query: this.query,
    shown: this.shown,
    load: (query, range) => this.api.list({ ...query, ...range }),
  });
  protected readonly kinds = RECORD_KINDS.map((kind) => ({ kind, words: KIND_WORDS[kind] }));
  protected readonly csv = computed(() => trailCsvAddress(this.query()));
  protected readonly isFiltered = computed(() => Object.values(this.filter()).some(Boolean));
  /** Which record the entries are of, by its name in the entries themselves. */
  protected readonly recordName = computed(() =>
    this.filter().record ? (this.entries.rows()[0]?.recordName ?? 'one record') : '',
  );
  protected readonly actorControl = new FormControl('', { nonNullable: true });
  private readonly actorOnRecord = personResource(computed(() => this.filter().actor || undefined));
  protected readonly actorOption = computed(() =>
    this.actorOnRecord.hasValue() ? (this.actorOnRecord.value() ?? null) : null,
  );
  protected readonly findPeople: FindRecords = (q) =>
    this.people
      .list({ q, limit: 20 })
      .pipe(
        map((page) =>
          page.rows.map(({ id, name, department }) => ({ id, name, note: department })),
        ),
      );
  protected readonly mayVerify = computed(
    () => scopeOf('audit-trail.verify', this.session.user()?.roles ?? []) !== undefined,
  );
  protected readonly checking = signal(false);

  constructor() {
    // The picker is a form control; the address is the filter's other side.
    effect(() => {
      const { actor } = this.filter();
      if (actor !== this.actorControl.value) {
        this.actorControl.setValue(actor, { emitEvent: false });
      }
    });
    this.actorControl.valueChanges
      .pipe(takeUntilDestroyed())
      .subscribe((actor) => this.narrow({ actor }));
    keepInAddress(() => ({
      ...Object.fromEntries(
        Object.entries(this.filter()).map(([name, value]) => [name, value || null]),
      ),
      rows: this.shown() > PAGE_ROWS ? this.shown() : null,
    }));
  }

  protected narrow(part: Partial<TrailFilter>): void {
    this.filter.update((filter) => ({ ...filter, ...part }));
    this.shown.set(PAGE_ROWS);
  }

  protected chooseKind(kind: string): void {
    this.narrow({ kind: recordKindSchema.safeParse(kind).data ?? '' });
  }

  protected clear(): void {
    this.narrow({ kind: '', record: '', actor: '', from: '', to: '' });
  }
}

function dateOrNone(text: string | undefined): string {
  return text && DATE.test(text) && !Number.isNaN(Date.parse(text)) ? text : '';
}
