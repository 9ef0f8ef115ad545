import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  type ElementRef,
  inject,
  input,
  signal,
  viewChild,
} from '@angular/core';
import { DOCUMENT } from '@angular/common';
import { MatButton } from '@angular/material/button';

import { Icon } from '../../../ui/icon/icon';

/** The link with which a person sets a password. It is shown here and nowhere again. */
@Component({
  selector: 'lm-invitation-link',
  imports: [Icon, MatButton],
  template: `
    <h2 #head tabindex="-1">Invitation for {{ name() }}</h2>
    <p>
      Give this link to {{ name() }}. It opens the page on which the password is set, works once
      within 60 minutes, and is not shown again.
    </p>
    <div class="link">
      <label class="lm-unseen" for="invitation-link">Invitation link</label>
      <input
        #field
        id="invitation-link"
        class="lm-control"
        type="text"
        readonly
        [value]="address()"
        (focus)="field.select()"
      />
      <button matButton="outlined" type="button" (click)="copy()">
        <lm-icon name="copy" />Copy
      </button>
    </div>
    <p class="lm-label" role="status">{{ said() }}</p>
  `,
  styles: `
    :host {
      display: grid;
      gap: 10px;
      padding: 16px 18px;
      border-inline-start: 4px solid var(--lm-spruce);
      background: var(--lm-spruce-soft);
    }

    h2:focus {
      outline: none;
    }

    .link {
      display: flex;
      flex-wrap: wrap;
      gap: 10px;

      .lm-control {
        flex: 1 1 320px;
        inline-size: auto;
        background: var(--lm-sheet);
        color: var(--lm-ink);
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InvitationLink {
  private readonly document = inject(DOCUMENT);
  private readonly head = viewChild.required<ElementRef<HTMLElement>>('head');
  private readonly field = viewChild.required<ElementRef<HTMLInputElement>>('field');

  readonly name = input.required<string>();
  readonly token = input.required<string>();

  protected readonly said = signal('');
  protected readonly address = computed(
    () => `${this.document.location.origin}/invitation?token=${encodeURIComponent(this.token())}`,
  );

  constructor() {
    afterNextRender(() => this.head().nativeElement.focus());
  }

  protected copy(): void {
    navigator.clipboard.writeText(this.address()).then(
      () => this.said.set('Copied.'),
      () => {
        // Without leave to write to the clipboard the person copies by hand.
        this.field().nativeElement.select();
        this.said.set('Copy it with Ctrl C.');
      },
    );
  }
}
