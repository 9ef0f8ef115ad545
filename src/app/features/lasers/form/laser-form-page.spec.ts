import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { provideZonelessChangeDetection, signal } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import type { Laser } from '@shared/model/lasers';
import { PROBLEMS, type ProblemName } from '@shared/model/problem';

import { problemInterceptor } from '../../../core/http/problem-interceptor';
import { CurrentSession } from '../../../core/session/current-session';
import { LaserFormPage } from './laser-form-page';

const AT = '2026-11-01T08:00:00.000Z';

const STORED: Laser = {
  id: 'l1',
  tag: 'L-02',
  version: 3,
  maker: 'Quenlorn',
  model: 'QG-5',
  homeBuilt: false,
  mobile: false,
  emissions: [],
  emissionSets: [],
  createdAt: AT,
  updatedAt: AT,
  state: 'received',
  stateSince: AT,
  evaluations: [],
  places: [],
  files: [],
  attention: [],
  offered: [],
  mayEdit: true,
  mayEvaluate: true,
};

const SETTINGS = {
  siteName: 'Halvermere Institute',
  zone: 'Europe/Berlin',
  ruleSet: 'eu-2006-25',
  classScheme: 'iec-60825-1-2014',
  authorMayApprove: false,
  evaluationReviewMonths: 24,
  emergencyPhone: '555-0110',
  version: 1,
  updatedAt: AT,
};

function problem(name: ProblemName, more: object = {}) {
  const { status, title } = PROBLEMS[name];
  return [
    { type: `/problems/${name}`, name, status, title, ...more },
    { status, statusText: title },
  ] as const;
}

describe('the form of a laser', () => {
  let http: HttpTestingController;
  let fixture: ComponentFixture<LaserFormPage>;
  let page: HTMLElement;

  beforeEach(() => {
    localStorage.clear();
    TestBed.configureTestingModule({
      providers: [
        provideZonelessChangeDetection(),
        provideRouter([{ path: '**', children: [] }]),
        provideHttpClient(withInterceptors([problemInterceptor])),
        provideHttpClientTesting(),
        {
          provide: CurrentSession,
          useValue: {
            user: signal({ id: 'P01', roles: ['lso'] }),
            site: signal({ name: 'Halvermere', zone: 'Europe/Berlin' }),
            hasRole: () => true,
          },
        },
      ],
    });
    http = TestBed.inject(HttpTestingController);
  });

  async function open(stored?: Laser) {
    fixture = TestBed.createComponent(LaserFormPage);
    if (stored) fixture.componentRef.setInput('id', stored.id);
    page = fixture.nativeElement;
    fixture.detectChanges();
    if (stored) http.expectOne(`/api/lasers/${stored.id}`).flush(stored);
    http.expectOne('/api/settings').flush(SETTINGS);
    await settle();
  }

  /** Not `whenStable`: it would wait for the answers that the test has yet to give. */
  async function settle() {
    for (let turn = 0; turn < 3; turn += 1) {
      await Promise.resolve();
      fixture.detectChanges();
    }
  }

  async function type(label: string, text: string) {
    const field = [...page.querySelectorAll('label')].find(
      (one) => one.textContent?.replace('optional', '').trim() === label,
    )?.control as HTMLInputElement;
    field.value = text;
    field.dispatchEvent(new Event('input'));
    await settle();
  }

  async function press(words: string) {
    const buttons = [...page.querySelectorAll('button')];
    buttons.find((one) => one.textContent?.trim() === words)!.click();
    await settle();
  }

  const text = (selector: string) => page.querySelector(selector)?.textContent ?? '';

  it('names every field that needs correction, with a link, and sends nothing', async () => {
    await open();
    await press('Save the laser');
    const links = [...page.querySelectorAll('lm-problem-panel a')].map((link) => [
      link.getAttribute('href'),
      link.textContent,
    ]);
    expect(links).toEqual([
      ['#field-maker', 'Enter the maker, or "home-built".'],
      ['#field-model', 'Enter the model.'],
      ['#field-emissions-0-wavelengthNm-value', 'Enter the wavelength, for example 532 nm.'],
    ]);
    http.expectNone('/api/lasers');
  });

  it('sends what the contract asks for, and goes to the laser', async () => {
    await open();
    await type('Maker', 'Quenlorn');
    await type('Model', 'QG-10');
    await type('Wavelength', '532 nm');
    await type('Power, maximum', '10 W');
    await press('Save the laser');
    const request = http.expectOne({ method: 'POST', url: '/api/lasers' });
    expect(request.request.body).toMatchObject({
      maker: 'Quenlorn',
      model: 'QG-10',
      emissions: [
        {
          id: 'e1',
          mode: 'cw',
          wavelengthNm: { value: 532, text: '532 nm', source: 'data-sheet' },
          powerW: { value: 10, text: '10 W', source: 'data-sheet' },
        },
      ],
    });
    const navigate = vi.spyOn(TestBed.inject(Router), 'navigate');
    request.flush(STORED);
    await settle();
    expect(navigate).toHaveBeenCalledWith(['/lasers', 'l1']);
    expect(fixture.componentInstance.hasUnsavedChanges()).toBe(false);
  });

  it('puts the server’s errors on the fields and keeps what was typed', async () => {
    await open(STORED);
    await type('Serial', 'SN-9');
    await press('Save the changes');
    const errors = [{ path: 'serial', message: 'Another laser has this serial.' }];
    http.expectOne({ method: 'PUT' }).flush(...problem('invalid-input', { errors }));
    await settle();
    expect(text('#field-serial-note')).toContain('Another laser has this serial.');
    expect(page.querySelector<HTMLInputElement>('#field-serial')?.value).toBe('SN-9');
  });

  it('shows both versions when somebody else saved first, and can save over it', async () => {
    await open(STORED);
    await type('Model', 'QG-5 mine');
    await press('Save the changes');
    const first = http.expectOne({ method: 'PUT' });
    expect(first.request.headers.get('If-Match')).toBe('"3"');
    first.flush(...problem('stale-version', { currentVersion: 4 }));
    http.expectOne('/api/lasers/l1').flush({ ...STORED, version: 4, model: 'QG-5 theirs' });
    await settle();
    expect(text('lm-version-conflict')).toContain('QG-5 theirs');
    expect(text('lm-version-conflict')).toContain('QG-5 mine');
    await press('Save mine over it');
    const second = http.expectOne({ method: 'PUT' });
    expect(second.request.headers.get('If-Match')).toBe('"4"');
    expect(second.request.body.model).toBe('QG-5 mine');
  });

  it('comes back with what was typed before, over the version it was typed over', async () => {
    await open(STORED);
    await type('Model', 'QG-5 half typed');
    await press('Save the changes');
    http.expectOne({ method: 'PUT' }).flush(...problem('unavailable'));
    fixture.destroy();
    await open({ ...STORED, version: 5 });
    expect(text('.draft')).toContain('This is your draft of');
    expect(page.querySelector<HTMLInputElement>('#field-model')?.value).toBe('QG-5 half typed');
    await press('Save the changes');
    const request = http.expectOne({ method: 'PUT' });
    expect(request.request.headers.get('If-Match')).toBe('"3"');
  });
});
