import { HttpClient, type HttpEvent, httpResource } from '@angular/common/http';
import { inject, Injectable, type Signal } from '@angular/core';
import type { LaserFile } from '@shared/model/files';
import {
  duplicatesSchema,
  type Laser,
  type LaserFilter,
  type LaserInput,
  type LaserListQuery,
  type LaserPage,
  laserPageSchema,
  laserSchema,
  type LaserTransition,
} from '@shared/model/lasers';
import { auditTrailPageSchema } from '@shared/model/records';
import { map, type Observable } from 'rxjs';
import type * as z from 'zod';

import { ifMatch, queryParams } from '../../core/http/api-request';
import type { KeysetRange } from '../../core/paging/keyset-list';

export type Duplicate = z.infer<typeof duplicatesSchema>['lasers'][number];
export type HistoryPage = z.infer<typeof auditTrailPageSchema>;

@Injectable({ providedIn: 'root' })
export class LasersApi {
  private readonly http = inject(HttpClient);

  list(query: Partial<LaserListQuery>): Observable<LaserPage> {
    return this.http
      .get('/api/lasers', { params: queryParams(query) })
      .pipe(map((body) => laserPageSchema.parse(body)));
  }

  read(id: string): Observable<Laser> {
    return this.http.get(`/api/lasers/${id}`).pipe(map((body) => laserSchema.parse(body)));
  }

  register(laser: LaserInput): Observable<Laser> {
    return this.http.post('/api/lasers', laser).pipe(map((body) => laserSchema.parse(body)));
  }

  declareFound(laser: LaserInput): Observable<Laser> {
    return this.http.post('/api/lasers/found', laser).pipe(map((body) => laserSchema.parse(body)));
  }

  update(id: string, version: number, laser: LaserInput): Observable<Laser> {
    return this.http
      .put(`/api/lasers/${id}`, laser, ifMatch(version))
      .pipe(map((body) => laserSchema.parse(body)));
  }

  transition(laser: Laser, step: LaserTransition): Observable<Laser> {
    return this.http
      .post(`/api/lasers/${laser.id}/transitions`, step, ifMatch(laser.version))
      .pipe(map((body) => laserSchema.parse(body)));
  }

  history(id: string, range: KeysetRange): Observable<HistoryPage> {
    return this.http
      .get(`/api/lasers/${id}/history`, { params: queryParams(range) })
      .pipe(map((body) => auditTrailPageSchema.parse(body)));
  }

  /** Lasers that bear the same serial. */
  duplicates(serial: string, exceptId: string | undefined): Observable<readonly Duplicate[]> {
    return this.http
      .get('/api/lasers/duplicates', { params: queryParams({ serial, exceptId }) })
      .pipe(map((body) => duplicatesSchema.parse(body).lasers));
  }

  attach(id: string, file: File, about: { kind: LaserFile['kind']; note: string }) {
    const body = new FormData();
    body.set('kind', about.kind);
    if (about.note) body.set('note', about.note);
    body.set('file', file);
    return this.http.post(`/api/lasers/${id}/files`, body, {
      observe: 'events',
      reportProgress: true,
    }) as Observable<HttpEvent<unknown>>;
  }

  removeFile(id: string, fileId: string): Observable<void> {
    return this.http.delete<void>(`/api/lasers/${id}/files/${fileId}`);
  }
}

export const fileAddress = (laserId: string, fileId: string): string =>
  `/api/lasers/${laserId}/files/${fileId}`;

/** The address of the CSV of what the filter finds. */
export function csvAddress(filter: LaserFilter): string {
  const query = queryParams(filter).toString();
  return `/api/lasers.csv${query ? `?${query}` : ''}`;
}

/** The laser with this id; reads again when the id changes. Needs an injection context. */
export function laserResource(id: Signal<string | undefined>) {
  return httpResource(() => (id() ? `/api/lasers/${id()}` : undefined), {
    parse: (body) => laserSchema.parse(body),
  });
}
