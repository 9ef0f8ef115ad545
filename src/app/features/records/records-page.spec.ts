import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { provideZonelessChangeDetection, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router, withComponentInputBinding } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';

import { CurrentSession } from '../../core/session/current-session';
import { RecordsPage } from './records-page';

describe('the page of records', () => {
  let http: HttpTestingController;

  async function open(url: string, roles: readonly string[] = ['auditor']) {
    TestBed.configureTestingModule({
      providers: [
        provideZonelessChangeDetection(),
        provideRouter([{ path: 'records', component: RecordsPage }], withComponentInputBinding()),
        provideHttpClient(),
        provideHttpClientTesting(),
        {
          provide: CurrentSession,
          useValue: {
            user: signal({ id: 'P05', roles }),
            site: signal({ name: 'Halvermere', zone: 'Europe/Berlin' }),
          },
        },
      ],
    });
    http = TestBed.inject(HttpTestingController);
    const harness = await RouterTestingHarness.create(url);
    harness.detectChanges();
    return { harness, page: harness.routeNativeElement! };
  }

  function asked() {
    const { request } = http.expectOne(({ url }) => url === '/api/audit-trail');
    return Object.fromEntries(request.params.keys().map((key) => [key, request.params.get(key)]));
  }

  it('asks for the days of the address in the zone of the site, both included', async () => {
    await open('/records?kind=laser&from=2026-03-29&to=2026-03-29');
    // The day on which the clock goes forward has 23 hours.
    expect(asked()).toEqual({
      recordKind: 'laser',
      from: '2026-03-28T23:00:00.000Z',
      to: '2026-03-29T22:00:00.000Z',
      limit: '50',
    });
  });

  it('leaves out what the address says wrongly', async () => {
    await open('/records?kind=lamp&from=03/04/25');
    expect(asked()).toEqual({ limit: '50' });
  });

  it('writes a filter into the address, and its CSV is of the same', async () => {
    const { harness, page } = await open('/records');
    asked();
    const select = page.querySelector('select')!;
    select.value = 'area';
    select.dispatchEvent(new Event('change'));
    harness.detectChanges();
    await new Promise((resolve) => setTimeout(resolve));
    expect(TestBed.inject(Router).url).toBe('/records?kind=area');
    harness.detectChanges();
    const csv = page.querySelector<HTMLAnchorElement>('a[download]');
    expect(csv?.getAttribute('href')).toBe('/api/audit-trail.csv?recordKind=area');
  });

  it('offers to verify to whom the permission table allows it', async () => {
    const { page } = await open('/records', ['deputy-lso']);
    expect(page.textContent).not.toContain('Verify the trail');
  });
});
