import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { provideZonelessChangeDetection, signal } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { MAT_DIALOG_DATA, MatDialogRef } from '@angular/material/dialog';
import type { OfferedEvent } from '@shared/model/lasers';
import { PROBLEMS } from '@shared/model/problem';
import { NOT_RECORDED_GUARDS } from '@shared/workflow/laser-life-cycle';

import { problemInterceptor } from '../../../core/http/problem-interceptor';
import { CurrentSession } from '../../../core/session/current-session';
import { StepDialog } from './step-dialog';

const WAIVABLE = Object.values(NOT_RECORDED_GUARDS);

describe('the dialog of a step', () => {
  let fixture: ComponentFixture<StepDialog>;
  let element: HTMLElement;
  let http: HttpTestingController;
  const close = vi.fn();

  async function open(offered: Partial<OfferedEvent>) {
    close.mockReset();
    const data = {
      laser: { id: 'l1', tag: 'L-02', version: 7 },
      offered: { event: 'block', label: 'Block', reasons: [], asks: [], ...offered },
    };
    TestBed.configureTestingModule({
      providers: [
        provideZonelessChangeDetection(),
        provideHttpClient(withInterceptors([problemInterceptor])),
        provideHttpClientTesting(),
        { provide: MAT_DIALOG_DATA, useValue: data },
        { provide: MatDialogRef, useValue: { close, id: 'd', addPanelClass: () => undefined } },
        {
          provide: CurrentSession,
          useValue: { user: signal({ id: 'P01' }), site: signal({ name: 'x', zone: 'UTC' }) },
        },
      ],
    });
    http = TestBed.inject(HttpTestingController);
    fixture = TestBed.createComponent(StepDialog);
    element = fixture.nativeElement;
    await fixture.whenStable();
  }

  async function write(selector: string, text: string) {
    const field = element.querySelector<HTMLInputElement>(selector)!;
    field.value = text;
    field.dispatchEvent(new Event('input'));
    await fixture.whenStable();
  }

  async function submit() {
    element.querySelector('form')!.dispatchEvent(new Event('submit'));
    await fixture.whenStable();
  }

  it('asks for the reason before anything is sent', async () => {
    await open({ asks: ['reason'] });
    await submit();
    expect(element.textContent).toContain('Give a reason of at least 10 characters');
    http.expectNone('/api/lasers/l1/transitions');
  });

  it('sends the step over the version that the person looked at', async () => {
    await open({ asks: ['reason'] });
    await write('#field-reason', 'Shutter does not close.');
    await submit();
    const { request } = http.expectOne('/api/lasers/l1/transitions');
    expect(request.body).toEqual({ event: 'block', reason: 'Shutter does not close.' });
    expect(request.headers.get('If-Match')).toBe('"7"');
  });

  it('names in a waiver what is not recorded here, in the words of the workflow', async () => {
    await open({ event: 'take-over', label: 'Take over', asks: ['reason', 'waiver'] });
    await write('#field-reason', 'Taken over from paper.');
    await write('#field-waiver-untilOn', '2027-06-30');
    element.querySelector<HTMLInputElement>('fieldset input')!.click();
    await write('#field-alsoMissing', 'The room plan\n\n');
    await submit();
    const { request } = http.expectOne('/api/lasers/l1/transitions');
    expect(request.body.waiver).toEqual({
      untilOn: '2027-06-30',
      missing: [...WAIVABLE.slice(1), 'The room plan'],
    });
  });

  it('says every reason why the server refused', async () => {
    await open({});
    await submit();
    const { status, title } = PROBLEMS['guard-failed'];
    http.expectOne('/api/lasers/l1/transitions').flush(
      {
        type: '/problems/guard-failed',
        name: 'guard-failed',
        status,
        title,
        reasons: ['The key is in.', 'The cord is in.'],
      },
      { status, statusText: title },
    );
    await fixture.whenStable();
    expect(element.textContent).toContain('The key is in.');
    expect(element.textContent).toContain('The cord is in.');
    expect(close).not.toHaveBeenCalled();
  });
});
