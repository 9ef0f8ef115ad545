import { Clipboard } from '@angular/cdk/clipboard';
import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import type { ResultView } from '@shared/model/result-view';

import { Icon } from '../../../ui/icon/icon';
import { encodeCase } from '../free-bench/case-link';

/** Takes a result elsewhere: its JSON, and a link that gives the same case to the last bit. */
@Component({
  selector: 'lm-case-tools',
  imports: [Icon, MatButton, RouterLink],
  template: `
    <button matButton type="button" (click)="copyResult()">
      <lm-icon name="copy" />Copy as JSON
    </button>
    <button matButton type="button" (click)="copyLink()"><lm-icon name="link" />Copy link</button>
    @if (offersFreeBench()) {
      <a matButton routerLink="/bench" [queryParams]="{ case: encoded() }"
        ><lm-icon name="open" />Try changes on the free bench</a
      >
    }
    <span class="lm-label" role="status">{{ said() }}</span>
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 4px 8px;
    }
  `,
  host: { class: 'lm-screen-only' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CaseTools {
  private readonly clipboard = inject(Clipboard);

  readonly view = input.required<ResultView>();
  readonly offersFreeBench = input(true);

  protected readonly said = signal('');
  protected readonly encoded = computed(() => encodeCase(this.view().case));

  protected copyResult(): void {
    const { case: hazardCase, result } = this.view();
    this.copy(JSON.stringify({ case: hazardCase, result }, null, 2), 'Case and result copied.');
  }

  protected copyLink(): void {
    const link = `${location.origin}/bench?case=${this.encoded()}`;
    this.copy(link, 'Link copied. It holds the whole case; nothing is stored.');
  }

  private copy(text: string, said: string): void {
    const copied = this.clipboard.copy(text);
    this.said.set(copied ? said : 'This browser did not allow copying.');
  }
}
