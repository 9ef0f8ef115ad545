import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { provideZonelessChangeDetection, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';

import { CurrentSession } from '../../core/session/current-session';
import { SettingsPage } from './settings-page';

const SETTINGS = {
  siteName: 'Halvermere Institute',
  zone: 'Europe/Berlin',
  ruleSet: 'eu-2006-25',
  classScheme: 'iec-60825-1-2014',
  authorMayApprove: false,
  evaluationReviewMonths: 24,
  emergencyPhone: '555-0100',
  version: 4,
  updatedAt: '2026-11-01T08:00:00.000Z',
};

describe('the settings', () => {
  let http: HttpTestingController;

  async function open(role: string) {
    TestBed.configureTestingModule({
      providers: [
        provideZonelessChangeDetection(),
        provideHttpClient(),
        provideHttpClientTesting(),
        {
          provide: CurrentSession,
          useValue: {
            user: signal({ id: 'P01', roles: [role] }),
            site: signal({ name: 'x', zone: 'UTC' }),
            load: () => Promise.resolve(),
          },
        },
      ],
    });
    http = TestBed.inject(HttpTestingController);
    const fixture = TestBed.createComponent(SettingsPage);
    fixture.detectChanges();
    http.expectOne('/api/settings').flush(SETTINGS);
    await fixture.whenStable();
    return { fixture, page: fixture.nativeElement as HTMLElement };
  }

  it('ask why before the author may approve, and keep the reason', async () => {
    const { fixture, page } = await open('lso');
    page.querySelector<HTMLInputElement>('input[type=checkbox]')!.click();
    await fixture.whenStable();
    page.querySelector('form')!.dispatchEvent(new Event('submit'));
    await fixture.whenStable();
    expect(page.textContent).toContain('Say why the author may approve here; the reason is kept.');
    http.expectNone({ method: 'PUT' });

    const reason = page.querySelector<HTMLTextAreaElement>('textarea')!;
    reason.value = 'One laser safety officer only.';
    reason.dispatchEvent(new Event('input'));
    page.querySelector('form')!.dispatchEvent(new Event('submit'));
    const { request } = http.expectOne({ method: 'PUT' });
    expect(request.headers.get('If-Match')).toBe('"4"');
    expect(request.body).toMatchObject({
      authorMayApprove: true,
      authorMayApproveReason: 'One laser safety officer only.',
    });
  });

  it('can be read but not changed without the permission', async () => {
    const { page } = await open('auditor');
    expect(page.querySelector<HTMLInputElement>('#field-siteName')?.disabled).toBe(true);
    expect(page.querySelector('button[type=submit]')).toBeNull();
  });
});
