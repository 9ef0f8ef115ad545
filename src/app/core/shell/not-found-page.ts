import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink } from '@angular/router';

@Component({
  selector: 'lm-not-found-page',
  imports: [RouterLink],
  template: `
    <h1>Nothing is here</h1>
    <p>The address may be mistyped, or the record was never on this site.</p>
    <p>
      <a routerLink="/today">To Today</a>
      or
      <a routerLink="/lasers">to the lasers</a>
    </p>
  `,
  styles: `
    :host {
      display: grid;
      gap: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotFoundPage {}
