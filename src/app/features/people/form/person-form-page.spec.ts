import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { provideZonelessChangeDetection, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';

import { CurrentSession } from '../../../core/session/current-session';
import { PersonFormPage } from './person-form-page';

describe('entering a person', () => {
  it('shows the invitation link once the account is made', async () => {
    TestBed.configureTestingModule({
      providers: [
        provideZonelessChangeDetection(),
        provideRouter([{ path: '**', children: [] }]),
        provideHttpClient(),
        provideHttpClientTesting(),
        {
          provide: CurrentSession,
          useValue: { user: signal({ id: 'P04', roles: ['administrator'] }) },
        },
      ],
    });
    const http = TestBed.inject(HttpTestingController);
    const fixture = TestBed.createComponent(PersonFormPage);
    fixture.detectChanges();
    const page: HTMLElement = fixture.nativeElement;
    const write = (id: string, text: string) => {
      const field = page.querySelector<HTMLInputElement>(`#field-${id}`)!;
      field.value = text;
      field.dispatchEvent(new Event('input'));
    };
    write('name', 'Wyatt Thornbrooke');
    write('email', 'wyatt.thornbrooke@halvermere.example');
    const role = [...page.querySelectorAll('label')].find((one) =>
      one.textContent?.includes('Laser supervisor'),
    );
    role?.querySelector('input')?.click();
    page.querySelector('form')!.dispatchEvent(new Event('submit'));
    const request = http.expectOne({ method: 'POST', url: '/api/people' });
    expect(request.request.body).toEqual({
      name: 'Wyatt Thornbrooke',
      email: 'wyatt.thornbrooke@halvermere.example',
      roles: ['laser-supervisor'],
      active: true,
    });
    request.flush({
      person: {
        ...request.request.body,
        id: 'P61',
        version: 1,
        createdAt: '2026-12-01T08:00:00.000Z',
        hasPassword: false,
      },
      invitationToken: 'a token/with signs',
    });
    await fixture.whenStable();
    const link = page.querySelector<HTMLInputElement>('#invitation-link')?.value;
    expect(link).toMatch(/\/invitation\?token=a%20token%2Fwith%20signs$/);
    expect(page.querySelector('form')).toBeNull();
    expect(fixture.componentInstance.hasUnsavedChanges()).toBe(false);
  });
});
