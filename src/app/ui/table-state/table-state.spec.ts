import { TestBed } from '@angular/core/testing';

import { TableState } from './table-state';

async function show(inputs: Record<string, unknown>) {
  const fixture = TestBed.createComponent(TableState);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  return fixture;
}

describe('a list without rows', () => {
  it('is silent at first, then lines, then a sentence with a way out', async () => {
    vi.useFakeTimers();
    try {
      const fixture = TestBed.createComponent(TableState);
      fixture.componentRef.setInput('state', 'loading');
      fixture.componentRef.setInput('cancellable', true);
      const text = async (ms: number) => {
        await vi.advanceTimersByTimeAsync(ms);
        return (fixture.nativeElement as HTMLElement).textContent ?? '';
      };
      await text(250);
      expect((fixture.nativeElement as HTMLElement).querySelectorAll('.line')).toHaveLength(0);
      await text(100);
      expect((fixture.nativeElement as HTMLElement).querySelectorAll('.line')).toHaveLength(6);
      expect(await text(1800)).toContain('Still reading…');
      expect(await text(0)).toContain('Cancel');
    } finally {
      vi.useRealTimers();
    }
  });

  it('offers to try again when it could not be read', async () => {
    const fixture = await show({ state: 'error' });
    let tries = 0;
    fixture.componentInstance.retry.subscribe(() => (tries += 1));
    (fixture.nativeElement as HTMLElement).querySelector('button')?.click();
    expect(tries).toBe(1);
  });
});
