import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({
  selector: 'lm-evaluation-list-page',
  template: `
    <h1>Evaluations</h1>
    <p class="lm-quiet">No evaluation yet.</p>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EvaluationListPage {}
