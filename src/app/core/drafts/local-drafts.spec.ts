import { provideZonelessChangeDetection, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';

import { CurrentSession } from '../session/current-session';
import { LocalDrafts } from './local-drafts';

describe('drafts on this device', () => {
  const user = signal<{ id: string } | null>({ id: 'P18' });
  let drafts: LocalDrafts;

  beforeEach(() => {
    localStorage.clear();
    user.set({ id: 'P18' });
    TestBed.configureTestingModule({
      providers: [
        provideZonelessChangeDetection(),
        { provide: CurrentSession, useValue: { user } },
      ],
    });
    drafts = TestBed.inject(LocalDrafts);
    TestBed.tick();
  });

  it('come back as they were written', () => {
    drafts.write('laser.new', { maker: 'Quenlorn' });
    expect(drafts.read('laser.new')?.value).toEqual({ maker: 'Quenlorn' });
  });

  it('belong to the person who typed them', () => {
    drafts.write('laser.new', { maker: 'Quenlorn' });
    user.set({ id: 'P21' });
    expect(drafts.read('laser.new')).toBeUndefined();
  });

  it('are gone after sign-out, other things stay', () => {
    localStorage.setItem('limen.theme', 'dark');
    drafts.write('laser.new', { maker: 'Quenlorn' });
    user.set(null);
    TestBed.tick();
    expect(Object.keys(localStorage)).toEqual(['limen.theme']);
  });

  it('that cannot be read count as none', () => {
    localStorage.setItem('limen.draft.P18.laser.new', '{broken');
    expect(drafts.read('laser.new')).toBeUndefined();
  });
});
