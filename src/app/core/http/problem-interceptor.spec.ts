import { HttpClient, provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { PROBLEMS } from '@shared/model/problem';

import { asProblem, ProblemError } from './problem-error';
import { problemInterceptor } from './problem-interceptor';

function failure(answer: (http: HttpTestingController) => void, responseType?: 'text'): unknown {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(withInterceptors([problemInterceptor])),
      provideHttpClientTesting(),
    ],
  });
  let caught: unknown;
  const client = TestBed.inject(HttpClient);
  const request = responseType ? client.get('/api/x', { responseType }) : client.get('/api/x');
  (request as ReturnType<typeof client.get>).subscribe({
    error: (error: unknown) => (caught = error),
  });
  answer(TestBed.inject(HttpTestingController));
  return caught;
}

describe('a failed request', () => {
  const invalid = {
    type: '/problems/invalid-input',
    name: 'invalid-input',
    ...PROBLEMS['invalid-input'],
    errors: [{ path: 'serial', message: 'Enter the serial number.' }],
  };

  it('throws the problem that the server describes', () => {
    const error = failure((http) =>
      http.expectOne('/api/x').flush(invalid, { status: 400, statusText: '' }),
    );
    expect(error).toBeInstanceOf(ProblemError);
    expect((error as ProblemError).is('invalid-input')).toBe(true);
    expect((error as ProblemError).errors).toEqual(invalid.errors);
  });

  it('reads problem details that come as text', () => {
    const error = failure(
      (http) =>
        http.expectOne('/api/x').flush(JSON.stringify(invalid), { status: 400, statusText: '' }),
      'text',
    );
    expect((error as ProblemError).is('invalid-input')).toBe(true);
  });

  it('says that the server cannot be reached', () => {
    const error = failure((http) => http.expectOne('/api/x').error(new ProgressEvent('error')));
    expect(asProblem(error)).toMatchObject({ name: 'unavailable' });
  });

  it('does not guess what an answer without details means', () => {
    const error = failure((http) =>
      http.expectOne('/api/x').flush('<html>', { status: 502, statusText: '' }),
    );
    expect(asProblem(error).detail).toBe('The server answered 502 without saying why.');
  });

  it('calls anything else a failure of the page', () => {
    expect(asProblem(new TypeError('x')).name).toBe('internal');
  });
});
