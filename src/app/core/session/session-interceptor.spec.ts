import { HttpClient, provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { PROBLEMS } from '@shared/model/problem';
import type { Session } from '@shared/model/session';

import { problemInterceptor } from '../http/problem-interceptor';
import { CurrentSession } from './current-session';
import { sessionInterceptor } from './session-interceptor';
import { SessionRenewal } from './session-renewal';

const SESSION: Session = {
  user: { id: 'p1', name: 'Ada', email: 'ada@site.example', roles: ['lso'], areaIds: [] },
  site: { name: 'Site', zone: 'UTC' },
  demo: null,
  needsSetup: false,
  idleTimeoutS: 3600,
};

const ENDED = {
  type: '/problems/not-signed-in',
  name: 'not-signed-in',
  ...PROBLEMS['not-signed-in'],
};

async function signedIn() {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(withInterceptors([sessionInterceptor, problemInterceptor])),
      provideHttpClientTesting(),
    ],
  });
  const http = TestBed.inject(HttpTestingController);
  const loaded = TestBed.inject(CurrentSession).load();
  http.expectOne('/api/session').flush(SESSION);
  await loaded;
  return { http, client: TestBed.inject(HttpClient), renewal: TestBed.inject(SessionRenewal) };
}

describe('when the session has ended', () => {
  it('asks for the password once and then sends every waiting request again', async () => {
    const { http, client, renewal } = await signedIn();
    const answers: unknown[] = [];
    client.put('/api/lasers/1', { power: 5 }).subscribe((answer) => answers.push(answer));
    client.get('/api/today').subscribe((answer) => answers.push(answer));
    http.expectOne('/api/lasers/1').flush(ENDED, { status: 401, statusText: '' });
    http.expectOne('/api/today').flush(ENDED, { status: 401, statusText: '' });
    expect(renewal.isAsking()).toBe(true);

    renewal.signIn('threshold-and-door').subscribe();
    const signIn = http.expectOne('/api/session');
    expect(signIn.request.body).toEqual({
      email: 'ada@site.example',
      password: 'threshold-and-door',
    });
    signIn.flush(SESSION);

    const again = http.expectOne('/api/lasers/1');
    expect(again.request.body).toEqual({ power: 5 });
    again.flush('saved');
    http.expectOne('/api/today').flush('read');
    expect(answers).toEqual(['saved', 'read']);
    expect(renewal.isAsking()).toBe(false);
  });

  it('keeps asking after a wrong password, and loses nothing', async () => {
    const { http, client, renewal } = await signedIn();
    const answers: unknown[] = [];
    client.get('/api/today').subscribe((answer) => answers.push(answer));
    http.expectOne('/api/today').flush(ENDED, { status: 401, statusText: '' });
    const failures: unknown[] = [];
    renewal.signIn('wrong').subscribe({ error: (error: unknown) => failures.push(error) });
    http.expectOne('/api/session').flush(ENDED, { status: 401, statusText: '' });
    expect(failures).toHaveLength(1);
    expect(renewal.isAsking()).toBe(true);
    renewal.signIn('right').subscribe();
    http.expectOne('/api/session').flush(SESSION);
    http.expectOne('/api/today').flush('read');
    expect(answers).toEqual(['read']);
  });

  it('does not ask who has signed out', async () => {
    const { http, client, renewal } = await signedIn();
    TestBed.inject(CurrentSession).signOut().subscribe();
    http.expectOne('/api/session').flush(null, { status: 204, statusText: '' });
    const failures: unknown[] = [];
    client.get('/api/today').subscribe({ error: (error: unknown) => failures.push(error) });
    http.expectOne('/api/today').flush(ENDED, { status: 401, statusText: '' });
    expect(failures).toHaveLength(1);
    expect(renewal.isAsking()).toBe(false);
  });
});
