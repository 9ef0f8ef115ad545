import { ChangeDetectionStrategy, Component, computed, effect, inject, input } from '@angular/core';
import { Title } from '@angular/platform-browser';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';

import { asProblem } from '../../../core/http/problem-error';
import { Icon } from '../../../ui/icon/icon';
import { ProblemPanel } from '../../../ui/problem-panel/problem-panel';
import { Quantity } from '../../../ui/quantity/quantity';
import { areaResource } from '../areas-api';
import { AreaLasers } from './area-lasers';

/** One room: who answers for it, how far the wall is, and the lasers in it. */
@Component({
  selector: 'lm-area-page',
  imports: [AreaLasers, Icon, MatButton, ProblemPanel, Quantity, RouterLink],
  templateUrl: './area-page.html',
  styleUrl: './area-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AreaPage {
  private readonly title = inject(Title);

  readonly id = input.required<string>();

  private readonly resource = areaResource(this.id);
  protected readonly area = computed(() =>
    this.resource.hasValue() ? this.resource.value() : null,
  );
  protected readonly problem = computed(() => {
    const error = this.resource.error();
    return error ? asProblem(error) : null;
  });

  constructor() {
    // The window is named after the room once it is known.
    effect(() => {
      const area = this.area();
      if (area) this.title.setTitle(`${area.code} ${area.name} · Limen`);
    });
  }
}
