import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({
  selector: 'lm-area-list-page',
  template: `
    <h1>Areas</h1>
    <p class="lm-quiet">No area yet.</p>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AreaListPage {}
