import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  input,
  viewChild,
} from '@angular/core';
import { outputFromObservable } from '@angular/core/rxjs-interop';
import { debounceTime, merge, Subject } from 'rxjs';

import { Icon } from '../icon/icon';

let count = 0;

/** Narrows the list below it while one types. */
@Component({
  selector: 'lm-search-box',
  imports: [Icon],
  template: `
    <lm-icon name="search" />
    <label class="lm-unseen" [for]="id">{{ label() }}</label>
    <input
      #box
      class="lm-control"
      type="search"
      autocomplete="off"
      spellcheck="false"
      [id]="id"
      [placeholder]="placeholder() || label()"
      [value]="text()"
      (input)="typed.next(box.value.trim())"
      (keydown.enter)="entered.next(box.value.trim())"
    />
  `,
  styles: `
    :host {
      position: relative;
      display: block;
    }

    lm-icon {
      position: absolute;
      inset-block-start: calc((var(--lm-field) - 18px) / 2);
      inset-inline-start: 10px;
      color: var(--lm-ink2);
      --lm-icon-size: 18px;
    }

    .lm-control {
      padding-inline-start: 36px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SearchBox {
  readonly label = input.required<string>();
  readonly placeholder = input('');
  readonly text = input('');

  private readonly box = viewChild.required<ElementRef<HTMLInputElement>>('box');
  protected readonly typed = new Subject<string>();
  protected readonly entered = new Subject<string>();
  protected readonly id = `search-box-${++count}`;

  readonly searched = outputFromObservable(merge(this.typed.pipe(debounceTime(250)), this.entered));

  focus(): void {
    this.box().nativeElement.focus();
  }
}
