import { inject, Pipe, type PipeTransform } from '@angular/core';
import { siteDate, siteInstant } from '@shared/text/site-time';

import { CurrentSession } from '../session/current-session';

/** An instant on the site's clock, "24 Nov 2026, 15:05"; with its zone; or its day alone. */
@Pipe({ name: 'lmInstant' })
export class InstantPipe implements PipeTransform {
  private readonly site = inject(CurrentSession).site;

  transform(
    instant: string | null | undefined,
    form: 'date' | 'minute' | 'zone' = 'minute',
  ): string {
    if (!instant) return '';
    const zone = this.site()?.zone ?? 'UTC';
    if (form === 'date') return siteDate(instant, zone);
    const withZone = siteInstant(instant, zone);
    return form === 'zone' ? withZone : withZone.slice(0, -zone.length - 1);
  }
}
