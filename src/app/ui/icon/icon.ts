import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

import { ICON_PATHS, type IconName } from './icon-paths';

/** A small drawing beside a word, or alone with `label` as its accessible name. */
@Component({
  selector: 'lm-icon',
  template: `
    <svg viewBox="0 -960 960 960" focusable="false">
      <path [attr.d]="path()" />
    </svg>
  `,
  styles: `
    :host {
      display: inline-flex;
      flex: none;
      inline-size: var(--lm-icon-size, 20px);
      block-size: var(--lm-icon-size, 20px);
    }
    svg {
      inline-size: 100%;
      block-size: 100%;
      fill: currentcolor;
    }
  `,
  host: {
    '[attr.role]': "label() ? 'img' : null",
    '[attr.aria-label]': 'label() || null',
    '[attr.aria-hidden]': "label() ? null : 'true'",
  },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Icon {
  readonly name = input.required<IconName>();
  readonly label = input('');

  protected readonly path = computed(() => ICON_PATHS[this.name()]);
}
