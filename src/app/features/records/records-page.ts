import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({
  selector: 'lm-records-page',
  template: `
    <h1>Records</h1>
    <p class="lm-quiet">The audit trail, its signatures and their verification.</p>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RecordsPage {}
