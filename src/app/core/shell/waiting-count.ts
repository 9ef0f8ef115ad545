import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NavigationEnd, Router } from '@angular/router';
import { todaySchema } from '@shared/model/today';
import { catchError, distinctUntilChanged, filter, map, of, startWith, switchMap } from 'rxjs';

/** How many things wait for the signed-in person: the number of rows on Today, read anew with each page. */
@Injectable({ providedIn: 'root' })
export class WaitingCount {
  private readonly http = inject(HttpClient);
  private readonly router = inject(Router);

  readonly count = toSignal(
    this.router.events.pipe(
      filter((event) => event instanceof NavigationEnd),
      map(({ urlAfterRedirects }) => urlAfterRedirects.split('?')[0]),
      startWith(this.router.url),
      distinctUntilChanged(),
      switchMap(() => this.read()),
    ),
    { initialValue: null },
  );

  private read() {
    return this.http.get('/api/today').pipe(
      map((body) => todaySchema.parse(body).items.length),
      // Without the number the spine shows none; the page itself says what failed.
      catchError(() => of(null)),
    );
  }
}
