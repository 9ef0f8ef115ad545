import { provideZonelessChangeDetection } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { AuditEntry } from '@shared/model/records';

import { actionWords } from './action-words';
import { AuditEntryView } from './audit-entry-view';

const ENTRY: AuditEntry = {
  sequence: 12,
  at: '2026-11-24T14:05:00.000Z',
  actorId: 'P02',
  actorName: 'Kofi Asantewell',
  actorRole: 'deputy-lso',
  actingFor: 'Ilse Brandmoor',
  action: 'block',
  recordKind: 'laser',
  recordId: 'l3',
  recordName: 'L-03',
  fromState: 'change-open',
  toState: 'blocked',
  changes: [{ field: 'emissions[0].powerW', before: null, after: { value: 5, source: 'label' } }],
  reason: 'Near miss in alignment.',
  requestId: 'r1',
  via: 'web',
  hash: 'abc',
};

describe('an entry of the audit trail', () => {
  async function show(entry: AuditEntry, brief = false) {
    TestBed.configureTestingModule({
      providers: [provideZonelessChangeDetection(), provideRouter([])],
    });
    const fixture = TestBed.createComponent(AuditEntryView);
    fixture.componentRef.setInput('entry', entry);
    fixture.componentRef.setInput('at', '24 Nov 2026, 15:05');
    fixture.componentRef.setInput('brief', brief);
    await fixture.whenStable();
    return (fixture.nativeElement as HTMLElement).textContent?.replace(/\s+/g, ' ') ?? '';
  }

  it('says who did what to which record, for whom and why', async () => {
    const text = await show(ENTRY);
    expect(text).toMatch(/Block · L-03 ?Change open → Blocked/);
    expect(text).toContain('Kofi Asantewell, Deputy laser safety officer, for Ilse Brandmoor');
    expect(text).toContain('Near miss in alignment.');
  });

  it('shows old and new values', async () => {
    expect(await show(ENTRY)).toMatch(/line 1, power\s*not given\s*5\u202f?\s?W \(label\)/);
  });

  it('does not name the record on its own page', async () => {
    expect(await show(ENTRY, true)).not.toContain('L-03');
  });
});

describe('actions in words', () => {
  it.each([
    ['laser.update', 'laser', 'in-use', 'Changed the laser'],
    ['sign', 'evaluation', 'checked', 'Sign and seal'],
    ['release', 'laser', 'commissioning', 'Release for use'],
    ['release', 'laser', 'blocked', 'Release the block'],
    ['something.new-here', 'laser', null, 'Something new here'],
  ])('%s of a %s that is %s reads "%s"', (action, kind, state, words) => {
    expect(actionWords(action, kind, state)).toBe(words);
  });
});
