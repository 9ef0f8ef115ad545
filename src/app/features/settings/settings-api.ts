import { HttpClient, httpResource } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { type Settings, type SettingsInput, settingsSchema } from '@shared/model/settings';
import { map, type Observable } from 'rxjs';

import { ifMatch } from '../../core/http/api-request';

@Injectable({ providedIn: 'root' })
export class SettingsApi {
  private readonly http = inject(HttpClient);

  read(): Observable<Settings> {
    return this.http.get('/api/settings').pipe(map((body) => settingsSchema.parse(body)));
  }

  update(version: number, settings: SettingsInput): Observable<Settings> {
    return this.http
      .put('/api/settings', settings, ifMatch(version))
      .pipe(map((body) => settingsSchema.parse(body)));
  }
}

/** The site's policy. Needs an injection context. */
export function settingsResource() {
  return httpResource(() => '/api/settings', { parse: (body) => settingsSchema.parse(body) });
}
