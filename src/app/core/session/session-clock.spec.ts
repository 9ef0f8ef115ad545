import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { Session } from '@shared/model/session';

import { CurrentSession } from './current-session';
import { SessionClock } from './session-clock';

const SESSION: Session = {
  user: { id: 'p1', name: 'Ada', email: 'ada@site.example', roles: ['lso'], areaIds: [] },
  site: { name: 'Site', zone: 'UTC' },
  demo: null,
  needsSetup: false,
  idleTimeoutS: 1800,
};

describe('the session clock', () => {
  beforeEach(() => vi.useFakeTimers());
  afterEach(() => vi.useRealTimers());

  it('says two minutes ahead that the session ends, counted from the last answer', async () => {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting()],
    });
    const http = TestBed.inject(HttpTestingController);
    const clock = TestBed.inject(SessionClock);
    const loaded = TestBed.inject(CurrentSession).load();
    http.expectOne('/api/session').flush(SESSION);
    await loaded;
    TestBed.tick();
    const after = async (seconds: number) => {
      await vi.advanceTimersByTimeAsync(1000 * seconds);
      return clock.isEnding();
    };
    expect(await after(1000)).toBe(false);
    clock.noteAnswer();
    TestBed.tick();
    expect(await after(1679)).toBe(false);
    expect(await after(2)).toBe(true);
    clock.extend();
    http.expectOne('/api/session').flush(SESSION);
    await vi.advanceTimersByTimeAsync(0);
    TestBed.tick();
    expect(clock.isEnding()).toBe(false);
  });
});
