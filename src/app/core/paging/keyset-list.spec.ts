import { computed, provideZonelessChangeDetection, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { Subject } from 'rxjs';

import { CurrentSession } from '../session/current-session';
import { problemError } from '../http/problem-error';
import { KeysetList, type KeysetPage, type KeysetRange } from './keyset-list';

type Page = KeysetPage<number>;

interface Asked {
  readonly q: string;
  readonly range: KeysetRange;
  readonly answer: Subject<Page>;
}

function page(from: number, count: number, total: number): Page {
  const rows = Array.from({ length: count }, (_, index) => from + index);
  const end = from + count;
  return { rows, next: end < total ? String(end) : null, total };
}

describe('a list paged by key', () => {
  const asked: Asked[] = [];
  const q = signal('');
  const shown = signal(50);

  function open() {
    const list = TestBed.runInInjectionContext(
      () =>
        new KeysetList({
          name: 'numbers',
          query: computed(() => ({ q: q() })),
          shown,
          load: (query, range): Subject<Page> => {
            const answer = new Subject<Page>();
            asked.push({ q: query.q, range, answer });
            return answer;
          },
        }),
    );
    TestBed.tick();
    return list;
  }

  function answer(with_: Page) {
    const last = asked.at(-1)!;
    last.answer.next(with_);
    last.answer.complete();
    TestBed.tick();
  }

  beforeEach(() => {
    asked.length = 0;
    q.set('');
    shown.set(50);
    TestBed.configureTestingModule({
      providers: [
        provideZonelessChangeDetection(),
        { provide: CurrentSession, useValue: { user: signal({ id: 'P01' }) } },
      ],
    });
  });

  it('begins with the first rows and adds the next ones', () => {
    const list = open();
    expect(list.isLoading()).toBe(true);
    answer(page(0, 50, 120));
    expect(list.rows()).toHaveLength(50);
    expect(list.nextCount()).toBe(50);
    list.more();
    expect(asked.at(-1)?.range).toEqual({ after: '50', limit: 50 });
    answer(page(50, 50, 120));
    expect(list.rows().at(-1)).toBe(99);
    expect(list.nextCount()).toBe(20);
    expect(shown()).toBe(100);
  });

  it('reads as many rows as the address says, at most 200 at once', () => {
    shown.set(250);
    const list = open();
    expect(asked[0]?.range).toEqual({ after: undefined, limit: 200 });
    answer(page(0, 200, 400));
    expect(asked[1]?.range).toEqual({ after: '200', limit: 50 });
    answer(page(200, 50, 400));
    expect(list.rows()).toHaveLength(250);
  });

  it('begins again when the question changes and drops the late answer', () => {
    const list = open();
    const late = asked[0]!;
    q.set('532');
    TestBed.tick();
    answer(page(7, 1, 1));
    late.answer.next(page(0, 50, 50));
    expect(list.rows()).toEqual([7]);
  });

  it('says what is wrong and reads again on request', () => {
    const list = open();
    asked[0]!.answer.error(problemError('unavailable', 'Try again.'));
    expect(list.problem()?.name).toBe('unavailable');
    list.reload();
    answer(page(0, 3, 3));
    expect(list.problem()).toBeNull();
    expect(list.rows()).toEqual([0, 1, 2]);
  });

  it('shows the rows of before at once on a return', () => {
    open();
    answer(page(0, 3, 3));
    const again = open();
    expect(again.rows()).toEqual([0, 1, 2]);
    expect(again.isLoading()).toBe(false);
  });
});
