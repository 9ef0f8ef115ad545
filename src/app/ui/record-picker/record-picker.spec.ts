import { ChangeDetectionStrategy, Component, provideZonelessChangeDetection } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { of } from 'rxjs';

import type { FindRecords, RecordOption } from './record-option';
import { RecordPicker } from './record-picker';

const AREAS: readonly RecordOption[] = [
  { id: 'a1', name: 'B-203', note: 'Tunable spectroscopy' },
  { id: 'a2', name: 'B-204', note: 'Cold atoms' },
];

@Component({
  selector: 'lm-test-host',
  imports: [ReactiveFormsModule, RecordPicker],
  template: `
    <lm-record-picker
      label="Area"
      path="areaId"
      what="an area"
      [formControl]="control"
      [find]="find"
      [chosen]="chosen"
    />
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {
  readonly control = new FormControl('a1', { nonNullable: true });
  readonly chosen = AREAS[0] ?? null;
  readonly find: FindRecords = (text) =>
    of(AREAS.filter(({ name }) => name.toLowerCase().includes(text.toLowerCase())));
}

describe('picking a record by its name', () => {
  async function open() {
    vi.useFakeTimers();
    TestBed.configureTestingModule({ providers: [provideZonelessChangeDetection()] });
    const fixture = TestBed.createComponent(Host);
    fixture.detectChanges();
    const input = (fixture.nativeElement as HTMLElement).querySelector('input')!;
    const type = (text: string) => {
      input.focus();
      input.value = text;
      input.dispatchEvent(new Event('input'));
      vi.advanceTimersByTime(200);
      fixture.detectChanges();
    };
    return { fixture, input, type, control: fixture.componentInstance.control };
  }

  afterEach(() => vi.useRealTimers());

  it('shows the name of the record that the form begins with', async () => {
    const { input } = await open();
    expect(input.value).toBe('B-203');
  });

  it('holds the id of the one picked', async () => {
    const { fixture, input, type, control } = await open();
    type('204');
    const option = document.querySelector<HTMLElement>('mat-option')!;
    expect(option.textContent).toContain('Cold atoms');
    option.click();
    fixture.detectChanges();
    expect(control.value).toBe('a2');
    expect(input.value).toBe('B-204');
  });

  it('does not take a name that was typed and not picked', async () => {
    const { fixture, input, type, control } = await open();
    type('B-2');
    expect(control.value).toBe('');
    control.markAsTouched();
    fixture.detectChanges();
    expect(control.errors).toEqual({
      unpicked: 'Choose an area from the list, or empty the field.',
    });
    type('');
    expect(control.valid).toBe(true);
    expect(input.value).toBe('');
  });
});
