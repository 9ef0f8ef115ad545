import { ChangeDetectionStrategy, Component } from '@angular/core';

/** The name with its mark: the jamb of a door and its sill. */
@Component({
  selector: 'lm-word-mark',
  template: `
    <svg viewBox="0 0 32 32" aria-hidden="true">
      <path d="M8 4h4v19H8zM4 28l2.6-5H26l2.6 5z" />
    </svg>
    <span>Limen</span>
  `,
  styles: `
    :host {
      display: inline-flex;
      align-items: center;
      gap: 8px;
      color: var(--lm-ink);
    }
    svg {
      inline-size: 30px;
      block-size: 30px;
      fill: var(--lm-spruce);
    }
    span {
      font: 500 1.75rem/2rem var(--lm-serif);
      letter-spacing: 0.005em;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WordMark {}
