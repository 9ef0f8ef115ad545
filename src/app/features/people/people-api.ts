import { HttpClient, httpResource } from '@angular/common/http';
import { inject, Injectable, type Signal } from '@angular/core';
import {
  invitationSchema,
  type Person,
  type PersonInput,
  personListQuerySchema,
  personPageSchema,
  personSchema,
} from '@shared/model/people';
import { map, type Observable } from 'rxjs';
import type * as z from 'zod';

import { ifMatch, queryParams } from '../../core/http/api-request';

export type PersonPage = z.infer<typeof personPageSchema>;
export type Invitation = z.infer<typeof invitationSchema>;

@Injectable({ providedIn: 'root' })
export class PeopleApi {
  private readonly http = inject(HttpClient);

  list(query: Partial<z.infer<typeof personListQuerySchema>>): Observable<PersonPage> {
    return this.http
      .get('/api/people', { params: queryParams(query) })
      .pipe(map((body) => personPageSchema.parse(body)));
  }

  read(id: string): Observable<Person> {
    return this.http.get(`/api/people/${id}`).pipe(map((body) => personSchema.parse(body)));
  }

  create(person: PersonInput): Observable<Invitation> {
    return this.http.post('/api/people', person).pipe(map((body) => invitationSchema.parse(body)));
  }

  update(id: string, version: number, person: PersonInput): Observable<Person> {
    return this.http
      .put(`/api/people/${id}`, person, ifMatch(version))
      .pipe(map((body) => personSchema.parse(body)));
  }

  /** A new link for somebody whose first one was lost or has ended. */
  invite(id: string): Observable<Invitation> {
    return this.http
      .post(`/api/people/${id}/invitation`, {})
      .pipe(map((body) => invitationSchema.parse(body)));
  }
}

/** The person with this id; reads again when the id changes. Needs an injection context. */
export function personResource(id: Signal<string | undefined>) {
  return httpResource(() => (id() ? `/api/people/${id()}` : undefined), {
    parse: (body) => personSchema.parse(body),
  });
}
