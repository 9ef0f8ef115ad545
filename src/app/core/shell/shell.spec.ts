import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import type { Session } from '@shared/model/session';

import { UnhandledProblem } from '../app-error-handler';
import { problemError } from '../http/problem-error';
import { CurrentSession } from '../session/current-session';
import { signedInGuard } from '../session/signed-in-guard';
import { Shell } from './shell';

@Component({
  selector: 'lm-test-page',
  template: '<h1>Page</h1>',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Page {}

const SESSION: Session = {
  user: { id: 'p1', name: 'Ada', email: 'ada@site.example', roles: ['lso'], areaIds: [] },
  site: { name: 'Main campus', zone: 'UTC' },
  demo: null,
  needsSetup: false,
  idleTimeoutS: 3600,
};

async function open(url: string, session: Session = SESSION) {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      provideRouter([
        { path: 'sign-in', component: Page },
        { path: 'set-up', component: Page },
        {
          path: '',
          component: Shell,
          canActivate: [signedInGuard],
          children: [{ path: '**', component: Page }],
        },
      ]),
    ],
  });
  const loaded = TestBed.inject(CurrentSession).load();
  TestBed.inject(HttpTestingController).expectOne('/api/session').flush(session);
  await loaded;
  const harness = await RouterTestingHarness.create(url);
  await harness.fixture.whenStable();
  return { element: harness.fixture.nativeElement as HTMLElement, harness };
}

describe('the shell', () => {
  it('has a skip link first, the landmarks, and who is signed in', async () => {
    const { element } = await open('/lasers');
    expect(element.querySelector('a')?.textContent).toBe('Skip to content');
    expect(element.querySelectorAll('nav, main, header')).toHaveLength(3);
    expect(element.querySelector('lm-user-block')?.textContent).toContain('Laser safety officer');
    expect(element.querySelector('[aria-current=page]')?.textContent?.trim()).toBe('Lasers');
  });

  it('sends whoever is not signed in to the sign-in page, with the way back', async () => {
    await open('/lasers?q=532', { ...SESSION, user: null });
    expect(TestBed.inject(Router).url).toBe('/sign-in?next=%2Flasers%3Fq%3D532');
  });

  it('begins with the first administrator while there is none', async () => {
    await open('/today', { ...SESSION, user: null, needsSetup: true });
    expect(TestBed.inject(Router).url).toBe('/set-up');
  });

  it('opens the search with a slash, but not while one types', async () => {
    const { element, harness } = await open('/today');
    document.body.append(element);
    const search = element.querySelector<HTMLInputElement>('#laser-search');
    const press = async (target: EventTarget) => {
      target.dispatchEvent(
        new KeyboardEvent('keydown', { key: '/', bubbles: true, cancelable: true }),
      );
      await harness.fixture.whenStable();
    };
    const elsewhere = document.createElement('input');
    document.body.append(elsewhere);
    elsewhere.focus();
    await press(elsewhere);
    expect(document.activeElement).toBe(elsewhere);
    elsewhere.blur();
    await press(document.body);
    expect(document.activeElement).toBe(search);
  });

  it('searches the lasers', async () => {
    const { element, harness } = await open('/today');
    const search = element.querySelector<HTMLInputElement>('#laser-search');
    if (search) search.value = '532 nm 3B';
    element.querySelector('form')?.dispatchEvent(new Event('submit', { cancelable: true }));
    await harness.fixture.whenStable();
    expect(TestBed.inject(Router).url).toBe('/lasers?q=532%20nm%203B');
  });

  it('says above the page what nobody handled, until it is dismissed', async () => {
    const { element, harness } = await open('/today');
    TestBed.inject(UnhandledProblem).show(problemError('unavailable', 'Not there.').problem);
    await harness.fixture.whenStable();
    const panel = element.querySelector('lm-problem-panel');
    expect(panel?.textContent).toContain('Not there.');
    panel?.querySelector('button')?.click();
    await harness.fixture.whenStable();
    expect(element.querySelector('lm-problem-panel')).toBeNull();
  });
});
