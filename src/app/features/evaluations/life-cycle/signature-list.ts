import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { Evaluation, Signature } from '@shared/model/evaluations';

import { SiteDatePipe } from '../../../core/time/site-date-pipe';
import { Icon } from '../../../ui/icon/icon';
import { MEANING_WORDS } from './life-cycle-words';

/** Who signed what, when, in which role, and whether it is still what was signed. */
@Component({
  selector: 'lm-signature-list',
  imports: [Icon, SiteDatePipe],
  templateUrl: './signature-list.html',
  styleUrl: './signature-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignatureList {
  readonly evaluation = input.required<Evaluation>();

  protected meaning(signature: Signature): string {
    return MEANING_WORDS[signature.meaning];
  }
}
