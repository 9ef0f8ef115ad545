import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { emissionFigures } from '@shared/model/emission-figures';
import type { Emission } from '@shared/model/lasers';

/** The inputs of one line, each with where it came from. */
@Component({
  selector: 'lm-line-figures',
  template: `
    <dl>
      @for (figure of figures(); track figure.what) {
        <div>
          <dt>{{ figure.what }}</dt>
          <dd>{{ figure.text }}</dd>
          <dd class="source">{{ figure.provenance }}</dd>
        </div>
      }
    </dl>
  `,
  styles: `
    dl > div {
      display: grid;
      grid-template-columns: 96px minmax(0, 1fr) 74px;
      gap: 2px 8px;
      padding-block: 3px;
      font: var(--lm-label);
    }

    dt,
    .source {
      color: var(--lm-ink2);
    }

    .source {
      text-align: end;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LineFigures {
  readonly line = input.required<Emission>();

  protected readonly figures = computed(() => emissionFigures(this.line()));
}
