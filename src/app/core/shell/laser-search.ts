import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  inject,
  output,
  viewChild,
} from '@angular/core';
import { Router } from '@angular/router';

import { Icon } from '../../ui/icon/icon';

/** Finds a laser from anywhere; `/` puts the caret here. */
@Component({
  selector: 'lm-laser-search',
  imports: [Icon],
  template: `
    <form role="search" (submit)="search($event)">
      <lm-icon name="search" />
      <label class="lm-unseen" for="laser-search">Find a laser</label>
      <input
        #field
        id="laser-search"
        type="search"
        name="q"
        autocomplete="off"
        placeholder="Find a laser, maker, wavelength, room"
        aria-keyshortcuts="/"
        (keydown.escape)="field.blur()"
      />
      <kbd aria-hidden="true">/</kbd>
    </form>
  `,
  styleUrl: './laser-search.scss',
  host: { '(document:keydown)': 'focusBySlash($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserSearch {
  private readonly router = inject(Router);
  private readonly field = viewChild.required<ElementRef<HTMLInputElement>>('field');

  /** The person pressed `/`. */
  readonly summoned = output();

  focus(): void {
    this.field().nativeElement.focus();
    this.field().nativeElement.select();
  }

  protected search(event: Event): void {
    event.preventDefault();
    const q = this.field().nativeElement.value.trim();
    void this.router.navigate(['/lasers'], { queryParams: q ? { q } : {} });
  }

  protected focusBySlash(event: KeyboardEvent): void {
    if (event.key !== '/' || event.ctrlKey || event.metaKey || event.altKey) return;
    if (isTyping(event.target)) return;
    event.preventDefault();
    this.summoned.emit();
  }
}

function isTyping(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    (target.isContentEditable || target.matches('input, textarea, select'))
  );
}
