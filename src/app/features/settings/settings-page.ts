import { ChangeDetectionStrategy, Component } from '@angular/core';

@Component({
  selector: 'lm-settings-page',
  template: `
    <h1>Settings</h1>
    <p class="lm-quiet">Rule set, periods and people of this site.</p>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SettingsPage {}
