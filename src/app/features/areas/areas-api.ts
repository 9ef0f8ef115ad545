import { HttpClient, httpResource } from '@angular/common/http';
import { inject, Injectable, type Signal } from '@angular/core';
import {
  type Area,
  type AreaInput,
  type AreaListQuery,
  areaPageSchema,
  areaSchema,
} from '@shared/model/areas';
import { map, type Observable } from 'rxjs';
import type * as z from 'zod';

import { ifMatch, queryParams } from '../../core/http/api-request';

export type AreaPage = z.infer<typeof areaPageSchema>;

@Injectable({ providedIn: 'root' })
export class AreasApi {
  private readonly http = inject(HttpClient);

  list(query: Partial<AreaListQuery>): Observable<AreaPage> {
    return this.http
      .get('/api/areas', { params: queryParams(query) })
      .pipe(map((body) => areaPageSchema.parse(body)));
  }

  read(id: string): Observable<Area> {
    return this.http.get(`/api/areas/${id}`).pipe(map((body) => areaSchema.parse(body)));
  }

  create(area: AreaInput): Observable<Area> {
    return this.http.post('/api/areas', area).pipe(map((body) => areaSchema.parse(body)));
  }

  update(id: string, version: number, area: AreaInput): Observable<Area> {
    return this.http
      .put(`/api/areas/${id}`, area, ifMatch(version))
      .pipe(map((body) => areaSchema.parse(body)));
  }
}

/** The area with this id; reads again when the id changes. Needs an injection context. */
export function areaResource(id: Signal<string | undefined>) {
  return httpResource(() => (id() ? `/api/areas/${id()}` : undefined), {
    parse: (body) => areaSchema.parse(body),
  });
}
