import { DestroyRef, ElementRef, inject, type Signal, signal } from '@angular/core';

/** Width of the component's own box, in px; 0 until it is laid out. */
export function elementWidth(): Signal<number> {
  const host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  const width = signal(0);
  const observer = new ResizeObserver(([entry]) => {
    if (entry) width.set(Math.floor(entry.contentRect.width));
  });
  observer.observe(host);
  inject(DestroyRef).onDestroy(() => observer.disconnect());
  return width.asReadonly();
}
