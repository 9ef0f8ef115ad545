import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({
  selector: 'lm-today-page',
  template: `
    <h1>Today</h1>
    <p class="lm-quiet">Nothing waits for you.</p>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TodayPage {}
