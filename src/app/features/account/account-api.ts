import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import type { acceptInvitationSchema } from '@shared/model/people';
import {
  type changePasswordSchema,
  type Session,
  sessionSchema,
  type setupSchema,
} from '@shared/model/session';
import { map, type Observable } from 'rxjs';
import type * as z from 'zod';

@Injectable({ providedIn: 'root' })
export class AccountApi {
  private readonly http = inject(HttpClient);

  /** Makes the first administrator, and signs them in. */
  setUp(setup: z.infer<typeof setupSchema>): Observable<Session> {
    return this.http.post('/api/setup', setup).pipe(map((body) => sessionSchema.parse(body)));
  }

  acceptInvitation(acceptance: z.infer<typeof acceptInvitationSchema>): Observable<void> {
    return this.http.post<void>('/api/invitations/accept', acceptance);
  }

  changePassword(change: z.infer<typeof changePasswordSchema>): Observable<void> {
    return this.http.put<void>('/api/session/password', change);
  }
}
