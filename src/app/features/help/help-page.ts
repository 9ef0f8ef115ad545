import { ChangeDetectionStrategy, Component, inject } from '@angular/core';

import { UserBlock } from '../../core/shell/user-block';
import { CurrentSession } from '../../core/session/current-session';

interface Shortcut {
  readonly keys: readonly string[];
  readonly act: string;
}

const SHORTCUTS: readonly { readonly where: string; readonly keys: readonly Shortcut[] }[] = [
  {
    where: 'Everywhere',
    keys: [
      { keys: ['/'], act: 'Search for a laser' },
      { keys: ['Tab'], act: 'Next control; the first one on a page skips to the content' },
      { keys: ['Esc'], act: 'Close a dialog or a menu; leave the search' },
    ],
  },
  {
    where: 'Reach strip and chart',
    keys: [
      { keys: ['←', '→'], act: 'Next or previous threshold; on the chart, the reading' },
      { keys: ['Home', 'End'], act: 'The nearest or the farthest distance' },
      { keys: ['Page Up', 'Page Down'], act: 'One decade farther or nearer' },
    ],
  },
  {
    where: 'Beam table',
    keys: [
      { keys: ['Ctrl', 'Enter'], act: 'Add a line' },
      { keys: ['Enter'], act: 'Take the value and stay' },
    ],
  },
];

/** The keyboard, the ways to write a quantity, and where to read on. */
@Component({
  selector: 'lm-help-page',
  imports: [UserBlock],
  templateUrl: './help-page.html',
  styleUrl: './help-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HelpPage {
  protected readonly user = inject(CurrentSession).user;
  protected readonly shortcuts = SHORTCUTS;
}
