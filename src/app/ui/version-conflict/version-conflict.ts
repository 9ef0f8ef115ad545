import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  inject,
  input,
  output,
} from '@angular/core';
import { MatButton } from '@angular/material/button';

import { ChangeList } from '../change-list/change-list';
import { changedFields } from '../change-list/changed-fields';
import { Icon } from '../icon/icon';

/** Somebody else saved the same record meanwhile: both versions, and a way on. */
@Component({
  selector: 'lm-version-conflict',
  imports: [ChangeList, Icon, MatButton],
  template: `
    <div class="head">
      <lm-icon name="arrows" />
      <div>
        <h2>Somebody changed this record meanwhile</h2>
        <p>Nothing you typed is lost. These fields differ from what is stored now.</p>
      </div>
    </div>
    @if (differences().length) {
      <lm-change-list [changes]="differences()" beforeHead="Stored now" afterHead="Yours" />
    } @else {
      <p>Both versions say the same.</p>
    }
    <div class="actions">
      <button matButton="filled" type="button" (click)="mineKept.emit()">Save mine over it</button>
      <button matButton="outlined" type="button" (click)="theirsTaken.emit()">
        Take what is stored
      </button>
    </div>
  `,
  styleUrl: './version-conflict.scss',
  host: { role: 'alert', tabindex: '-1' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VersionConflict {
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);

  /** What is stored now and what the person typed, in the same shape. */
  readonly stored = input.required<object>();
  readonly mine = input.required<object>();

  readonly mineKept = output();
  readonly theirsTaken = output();

  protected readonly differences = computed(() => changedFields(this.stored(), this.mine()));

  constructor() {
    afterNextRender(() => this.host.nativeElement.focus());
  }
}
