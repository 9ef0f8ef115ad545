import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { catchError, debounceTime, distinctUntilChanged, of, switchMap } from 'rxjs';

import { type Duplicate, LasersApi } from '../lasers-api';

/** Lasers that already bear the serial being typed. Two may: only the person can tell. */
@Component({
  selector: 'lm-duplicate-warning',
  imports: [RouterLink],
  template: `
    <div role="status">
      @for (laser of duplicates(); track laser.id) {
        <p>
          <a [routerLink]="['/lasers', laser.id]" target="_blank">{{ laser.tag }}</a>
          has the same serial: {{ laser.maker }} {{ laser.model
          }}{{ laser.areaCode ? ', in ' + laser.areaCode : '' }}. Is it the same laser?
        </p>
      }
    </div>
  `,
  styles: `
    p {
      padding: 8px 12px;
      border-inline-start: 4px solid var(--lm-stale);
      background: var(--lm-stale-ground);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DuplicateWarning {
  private readonly api = inject(LasersApi);

  readonly serial = input.required<string>();
  readonly exceptId = input<string>();

  protected readonly duplicates = toSignal(
    toObservable(this.serial).pipe(
      debounceTime(400),
      distinctUntilChanged(),
      switchMap((serial) => this.find(serial.trim())),
    ),
    { initialValue: [] as readonly Duplicate[] },
  );

  private find(serial: string) {
    if (serial === '') return of([]);
    // A warning that cannot be had is no reason to stop typing.
    return this.api.duplicates(serial, this.exceptId()).pipe(catchError(() => of([])));
  }
}
