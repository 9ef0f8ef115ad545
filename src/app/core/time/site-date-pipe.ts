import { inject, Pipe, type PipeTransform } from '@angular/core';
import { siteDate, siteInstant } from '@shared/text/site-time';

import { CurrentSession } from '../session/current-session';

/** An instant in the zone of the site: `| siteDate` is the day, `| siteDate: 'minute'` the minute with its zone. */
@Pipe({ name: 'siteDate' })
export class SiteDatePipe implements PipeTransform {
  private readonly site = inject(CurrentSession).site;

  transform(instant: string, precision: 'day' | 'minute' = 'day'): string {
    const zone = this.site()?.zone ?? 'UTC';
    return precision === 'day' ? siteDate(instant, zone) : siteInstant(instant, zone);
  }
}
