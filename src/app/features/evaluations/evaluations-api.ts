import { HttpClient, httpResource } from '@angular/common/http';
import { inject, Injectable, type Signal } from '@angular/core';
import {
  type Evaluation,
  type EvaluationInput,
  type evaluationListQuerySchema,
  evaluationPageSchema,
  evaluationSchema,
  type EvaluationTransition,
} from '@shared/model/evaluations';
import { map, type Observable } from 'rxjs';
import type * as z from 'zod';

import { ifMatch, queryParams } from '../../core/http/api-request';

export type EvaluationPage = z.infer<typeof evaluationPageSchema>;
export type EvaluationListQuery = z.infer<typeof evaluationListQuerySchema>;

@Injectable({ providedIn: 'root' })
export class EvaluationsApi {
  private readonly http = inject(HttpClient);

  list(query: Partial<EvaluationListQuery>): Observable<EvaluationPage> {
    return this.http
      .get('/api/evaluations', { params: queryParams(query) })
      .pipe(map((body) => evaluationPageSchema.parse(body)));
  }

  read(id: string): Observable<Evaluation> {
    return this.http.get(`/api/evaluations/${id}`).pipe(map(toEvaluation));
  }

  /** Begins an evaluation of a laser, from the proposed situations or from an earlier one. */
  begin(laserId: string, fromId?: string): Observable<Evaluation> {
    const body = fromId ? { laserId, fromId } : { laserId };
    return this.http.post('/api/evaluations', body).pipe(map(toEvaluation));
  }

  update(id: string, version: number, input: EvaluationInput): Observable<Evaluation> {
    return this.http.put(`/api/evaluations/${id}`, input, ifMatch(version)).pipe(map(toEvaluation));
  }

  /** Takes the laser's present lines into a draft. */
  refreshInputs(id: string, version: number): Observable<Evaluation> {
    return this.http
      .post(`/api/evaluations/${id}/refresh-inputs`, null, ifMatch(version))
      .pipe(map(toEvaluation));
  }

  transition(id: string, version: number, step: EvaluationTransition): Observable<Evaluation> {
    return this.http
      .post(`/api/evaluations/${id}/transitions`, step, ifMatch(version))
      .pipe(map(toEvaluation));
  }
}

/** The evaluation with this id; read again when the id changes. Needs an injection context. */
export function evaluationResource(id: Signal<string>) {
  return httpResource(() => `/api/evaluations/${id()}`, { parse: toEvaluation });
}

function toEvaluation(body: unknown): Evaluation {
  return evaluationSchema.parse(body);
}
