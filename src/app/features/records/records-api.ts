import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import {
  auditTrailPageSchema,
  auditTrailQuerySchema,
  trailVerificationSchema,
} from '@shared/model/records';
import { map, type Observable } from 'rxjs';
import type * as z from 'zod';

import { queryParams } from '../../core/http/api-request';

export type AuditTrailQuery = Partial<z.infer<typeof auditTrailQuerySchema>>;
export type AuditTrailPage = z.infer<typeof auditTrailPageSchema>;
export type TrailVerification = z.infer<typeof trailVerificationSchema>;

@Injectable({ providedIn: 'root' })
export class RecordsApi {
  private readonly http = inject(HttpClient);

  list(query: AuditTrailQuery): Observable<AuditTrailPage> {
    return this.http
      .get('/api/audit-trail', { params: queryParams(query) })
      .pipe(map((body) => auditTrailPageSchema.parse(body)));
  }

  verify(): Observable<TrailVerification> {
    return this.http
      .get('/api/audit-trail/verification')
      .pipe(map((body) => trailVerificationSchema.parse(body)));
  }
}

/** The address of the CSV of what the filter finds. */
export function trailCsvAddress(query: AuditTrailQuery): string {
  const params = queryParams(query).toString();
  return `/api/audit-trail.csv${params ? `?${params}` : ''}`;
}
