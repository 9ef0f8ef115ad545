import { HttpEventType } from '@angular/common/http';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DestroyRef,
  inject,
  input,
  signal,
} from '@angular/core';
import { DOCUMENT } from '@angular/common';
import { takeUntilDestroyed, toObservable } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { type LaserImport, laserImportSchema } from '@shared/model/laser-imports';
import type { Problem } from '@shared/model/problem';
import {
  catchError,
  EMPTY,
  expand,
  filter,
  map,
  type Observable,
  of,
  type Subscription,
  switchMap,
  tap,
  timer,
} from 'rxjs';

import { asProblem } from '../../../core/http/problem-error';
import { Icon } from '../../../ui/icon/icon';
import { ProblemPanel } from '../../../ui/problem-panel/problem-panel';
import { LaserImportsApi } from '../laser-imports-api';
import { importErrorsCsv } from './import-errors-csv';
import { ImportReport } from './import-report';

const POLL_MS = 400;
const WORKING: readonly LaserImport['status'][] = ['checking', 'saving'];

/** Reads lasers from a CSV: a dry run first, and nothing is stored before every row is right. */
@Component({
  selector: 'lm-laser-import-page',
  imports: [Icon, ImportReport, MatButton, ProblemPanel, RouterLink],
  templateUrl: './laser-import-page.html',
  styleUrl: './laser-import-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserImportPage {
  private readonly api = inject(LaserImportsApi);
  private readonly router = inject(Router);
  private readonly document = inject(DOCUMENT);
  private readonly destroyRef = inject(DestroyRef);

  /** The import on the page; in the address, so that a reload comes back to it. */
  readonly import = input<string>();

  protected readonly report = signal<LaserImport | null>(null);
  protected readonly problem = signal<Problem | null>(null);
  /** Percent sent, while the file is on its way. */
  protected readonly sent = signal<number | null>(null);
  protected readonly isDragged = signal(false);
  protected readonly isBusy = signal(false);
  private sending: Subscription | undefined;

  protected readonly isWorking = computed(() => {
    const status = this.report()?.status;
    return status !== undefined && WORKING.includes(status);
  });

  constructor() {
    toObservable(this.import)
      .pipe(
        tap((id) => {
          if (!id) this.report.set(null);
        }),
        filter((id) => id !== undefined && id !== this.report()?.id),
        switchMap((id) => this.follow(this.api.read(id as string))),
        takeUntilDestroyed(),
      )
      .subscribe();
  }

  protected drop(event: DragEvent): void {
    event.preventDefault();
    this.isDragged.set(false);
    this.read(event.dataTransfer?.files.item(0));
  }

  protected read(file: File | null | undefined): void {
    if (!file || this.sent() !== null) return;
    this.problem.set(null);
    this.report.set(null);
    this.sent.set(0);
    this.sending = this.api
      .begin(file)
      .pipe(
        tap((event) => {
          if (event.type === HttpEventType.UploadProgress && event.total) {
            this.sent.set(Math.round((100 * event.loaded) / event.total));
          }
        }),
        filter((event) => event.type === HttpEventType.Response),
        map((response) => laserImportSchema.parse(response.body)),
        tap((report) => {
          this.sent.set(null);
          this.show(report);
        }),
        switchMap((report) => this.follow(of(report))),
        catchError((error: unknown) => this.fail(error)),
        takeUntilDestroyed(this.destroyRef),
      )
      .subscribe();
  }

  protected save(id: string): void {
    if (this.isBusy()) return;
    this.isBusy.set(true);
    this.problem.set(null);
    this.follow(this.api.save(id))
      .pipe(takeUntilDestroyed(this.destroyRef))
      .subscribe({ complete: () => this.isBusy.set(false) });
  }

  protected cancel(): void {
    this.sending?.unsubscribe();
    this.sent.set(null);
    const id = this.report()?.id;
    if (!id) return;
    this.api
      .cancel(id)
      .pipe(
        tap(() => this.startOver()),
        catchError((error: unknown) => this.fail(error)),
        takeUntilDestroyed(this.destroyRef),
      )
      .subscribe();
  }

  protected startOver(): void {
    this.report.set(null);
    this.problem.set(null);
    void this.router.navigate([], { queryParams: {} });
  }

  protected downloadErrors(): void {
    const report = this.report();
    if (!report) return;
    const link = this.document.createElement('a');
    const address = URL.createObjectURL(
      new Blob([importErrorsCsv(report.errors)], { type: 'text/csv' }),
    );
    link.href = address;
    link.download = `${report.fileName.replace(/\.csv$/i, '')}-errors.csv`;
    link.click();
    URL.revokeObjectURL(address);
  }

  /** Shows a report, and asks again while the server works on it. */
  private follow(first: Observable<LaserImport>): Observable<LaserImport> {
    return first.pipe(
      expand((report) =>
        WORKING.includes(report.status)
          ? timer(POLL_MS).pipe(switchMap(() => this.api.read(report.id)))
          : EMPTY,
      ),
      tap((report) => this.report.set(report)),
      catchError((error: unknown) => this.fail(error)),
    );
  }

  private show(report: LaserImport): void {
    this.report.set(report);
    void this.router.navigate([], { queryParams: { import: report.id }, replaceUrl: true });
  }

  private fail(error: unknown): Observable<never> {
    this.sent.set(null);
    this.problem.set(asProblem(error));
    return EMPTY;
  }
}
