import { HttpClient, HttpContext, HttpContextToken } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import { type Session, sessionSchema, type SignIn } from '@shared/model/session';
import { map, type Observable } from 'rxjs';

/** Requests that ask for a session themselves: a 401 to them is an answer, not an expiry. */
export const ASKS_FOR_SESSION = new HttpContextToken(() => false);

@Injectable({ providedIn: 'root' })
export class SessionApi {
  private readonly http = inject(HttpClient);
  private readonly context = new HttpContext().set(ASKS_FOR_SESSION, true);

  read(): Observable<Session> {
    return this.http
      .get('/api/session', { context: this.context })
      .pipe(map((body) => sessionSchema.parse(body)));
  }

  signIn(credentials: SignIn): Observable<Session> {
    return this.http
      .post('/api/session', credentials, { context: this.context })
      .pipe(map((body) => sessionSchema.parse(body)));
  }

  signOut(): Observable<void> {
    return this.http.delete<void>('/api/session', { context: this.context });
  }
}
