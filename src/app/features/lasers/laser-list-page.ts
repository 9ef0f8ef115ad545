import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({
  selector: 'lm-laser-list-page',
  template: `
    <h1>Lasers</h1>
    <p class="lm-quiet">No laser yet.</p>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserListPage {}
