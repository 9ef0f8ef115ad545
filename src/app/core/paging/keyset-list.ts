import {
  computed,
  inject,
  Injectable,
  type Signal,
  signal,
  type WritableSignal,
} from '@angular/core';
import { takeUntilDestroyed, toObservable } from '@angular/core/rxjs-interop';
import type { Problem } from '@shared/model/problem';
import {
  catchError,
  EMPTY,
  expand,
  map,
  merge,
  type Observable,
  of,
  Subject,
  switchMap,
  tap,
  toArray,
} from 'rxjs';

import { asProblem } from '../http/problem-error';
import { CurrentSession } from '../session/current-session';

export interface KeysetPage<Row> {
  readonly rows: readonly Row[];
  readonly next: string | null;
  readonly total: number;
}

export interface KeysetRange {
  readonly after?: string | undefined;
  readonly limit: number;
}

export interface KeysetOptions<Query extends object, Page extends KeysetPage<unknown>> {
  /** What is asked for; a change begins again at the first row. */
  readonly query: Signal<Query>;
  /** How many rows to show; kept in the address, so that a reload shows as many. */
  readonly shown: WritableSignal<number>;
  readonly load: (query: Query, range: KeysetRange) => Observable<Page>;
  /** Under this name the rows are kept for a return to the page. */
  readonly name: string;
}

/** Rows that a list begins with, and that "Show the next" adds. */
export const PAGE_ROWS = 50;

/** The most the API gives at once. */
const MOST_ROWS = 200;

interface Loaded<Page> {
  readonly key: string;
  readonly shown: number;
  readonly pages: readonly Page[];
}

/** Rows of lists that were left, so that a return shows them at once and at the same place. */
@Injectable({ providedIn: 'root' })
class ListMemory {
  readonly lists = new Map<string, Loaded<KeysetPage<unknown>>>();
}

/** A list paged by key: the rows so far and the state around them. Needs an injection context. */
export class KeysetList<Query extends object, Page extends KeysetPage<unknown>> {
  private readonly memory = inject(ListMemory);
  private readonly user = inject(CurrentSession).user;
  /** Of whom and what the rows are an answer: nobody is shown what another asked for. */
  private readonly key = computed(() => JSON.stringify([this.user()?.id, this.options.query()]));
  private readonly loaded = signal<Loaded<Page> | null>(null);
  private readonly asking = signal(true);
  private readonly failure = signal<Problem | null>(null);
  private readonly reloads = new Subject<void>();
  private readonly mores = new Subject<void>();

  readonly rows: Signal<Page['rows']> = computed(
    () => this.loaded()?.pages.flatMap((page) => page.rows) ?? [],
  );
  /** The newest page, with what it says beside its rows. */
  readonly page = computed(() => this.loaded()?.pages.at(-1) ?? null);
  readonly total = computed(() => this.page()?.total ?? 0);
  /** How many rows `more` would add. */
  readonly nextCount = computed(() => {
    const left = Math.max(1, this.total() - this.rows().length);
    return this.page()?.next ? Math.min(PAGE_ROWS, left) : 0;
  });
  /** Asking, with nothing to show yet. */
  readonly isLoading = computed(() => this.asking() && this.loaded() === null);
  /** Asking, with the rows of before on the page. */
  readonly isBusy = computed(() => this.asking() && this.loaded() !== null);
  readonly problem = this.failure.asReadonly();

  constructor(private readonly options: KeysetOptions<Query, Page>) {
    merge(
      toObservable(this.key).pipe(
        tap((key) => this.recall(key)),
        map(() => this.fromFirst()),
      ),
      this.reloads.pipe(map(() => this.fromFirst())),
      this.mores.pipe(map(() => this.afterLast())),
    )
      .pipe(
        switchMap((pages) => this.ask(pages)),
        takeUntilDestroyed(),
      )
      .subscribe();
  }

  more(): void {
    if (!this.asking()) this.mores.next();
  }

  reload(): void {
    this.reloads.next();
  }

  /** On a return to the page, its rows as they were until the answer comes. */
  private recall(key: string): void {
    if (this.loaded()) return;
    const before = this.memory.lists.get(this.options.name) as Loaded<Page> | undefined;
    if (before?.key === key && before.shown === this.options.shown()) this.loaded.set(before);
  }

  private fromFirst(): Observable<readonly Page[]> {
    const { query, shown, load } = this.options;
    const wanted = shown();
    let count = 0;
    const range = (after?: string): KeysetRange => ({
      after,
      limit: Math.min(wanted - count, MOST_ROWS),
    });
    return load(query(), range()).pipe(
      expand((page) => {
        count += page.rows.length;
        return page.next && count < wanted ? load(query(), range(page.next)) : EMPTY;
      }),
      toArray(),
    );
  }

  private afterLast(): Observable<readonly Page[]> {
    const pages = this.loaded()?.pages ?? [];
    const after = pages.at(-1)?.next;
    if (!after) return of(pages);
    this.options.shown.update((count) => count + PAGE_ROWS);
    return this.options
      .load(this.options.query(), { after, limit: PAGE_ROWS })
      .pipe(map((page) => [...pages, page]));
  }

  private ask(answer: Observable<readonly Page[]>): Observable<void> {
    const key = this.key();
    this.asking.set(true);
    this.failure.set(null);
    return answer.pipe(
      map((pages) => this.keep({ key, shown: this.options.shown(), pages })),
      catchError((error: unknown) => {
        this.failure.set(asProblem(error));
        this.asking.set(false);
        return EMPTY;
      }),
    );
  }

  private keep(loaded: Loaded<Page>): void {
    this.loaded.set(loaded);
    this.memory.lists.set(this.options.name, loaded);
    this.asking.set(false);
  }
}
