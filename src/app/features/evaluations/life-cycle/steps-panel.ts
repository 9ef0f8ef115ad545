import {
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  inject,
  input,
  linkedSignal,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { ruleSetById } from '@shared/hazard/rule-sets';
import type { Evaluation, EvaluationTransition } from '@shared/model/evaluations';
import type { OfferedEvent } from '@shared/model/lasers';
import type { Problem } from '@shared/model/problem';
import { statementOf } from '@shared/text/statements';
import { EVALUATION_LIFE_CYCLE } from '@shared/workflow/evaluation-life-cycle';
import { type Actor, transitionsFrom } from '@shared/workflow/machine';

import { ConfirmDialog } from '../../../ui/confirm-dialog/confirm-dialog';
import { Icon } from '../../../ui/icon/icon';
import { PasswordPrompt } from '../../../ui/password-prompt/password-prompt';

const ACTOR_WORDS: Readonly<Partial<Record<Actor, string>>> = {
  lso: 'the laser safety officer',
  'deputy-lso': 'a deputy',
  committee: 'the committee',
  supervisor: 'the laser supervisor',
};

const TITLES: Readonly<Record<string, string>> = {
  'send-to-check': 'Send to check',
  confirm: 'Check this evaluation',
  sign: 'Sign this evaluation',
  'confirm-unchanged': 'Confirm it unchanged',
  withdraw: 'Withdraw as wrong',
};

/** What can be done with an evaluation now, by whom, and why not by oneself. */
@Component({
  selector: 'lm-steps-panel',
  imports: [Icon, MatButton, PasswordPrompt],
  templateUrl: './steps-panel.html',
  styleUrl: './steps-panel.scss',
  host: { tabindex: '-1' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StepsPanel {
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef);
  private readonly confirm = inject(ConfirmDialog);

  readonly evaluation = input.required<Evaluation>();
  /** What must be mended on this page before any step: an input that is not valid. */
  readonly obstacle = input('');
  readonly busy = input(false);
  readonly problem = input<Problem | null>(null);

  readonly stepped = output<EvaluationTransition>();

  protected readonly commentBox = viewChild<ElementRef<HTMLInputElement>>('commentBox');
  protected readonly reasonBox = viewChild<ElementRef<HTMLTextAreaElement>>('reasonBox');

  /** The event chosen among those that are signed; the first of them until another is. */
  protected readonly chosen = linkedSignal<OfferedEvent | undefined>(() =>
    this.evaluation().offered.find((offer) => isSigned(offer) && !offer.asks.includes('reason')),
  );
  protected readonly missingReason = signal(false);
  protected readonly others = computed(() =>
    this.evaluation().offered.filter(
      (offer) => offer !== this.chosen() && offer.event !== 'input-changed',
    ),
  );
  protected readonly people = computed(() => {
    const { author, checker, approver } = this.evaluation();
    return [
      `Author ${author.name}`,
      ...(checker ? [`checked by ${checker.name}`] : []),
      ...(approver ? [`signed by ${approver.name}`] : []),
    ].join(' · ');
  });
  /** Steps that others can take from here, and who they are. */
  protected readonly forOthers = computed(() => {
    const { state, offered, author } = this.evaluation();
    return transitionsFrom(EVALUATION_LIFE_CYCLE, state)
      .filter(({ event, actors }) => {
        const isOffered = offered.some((offer) => offer.event === event);
        return !isOffered && event !== 'input-changed' && actors.some((one) => one !== 'system');
      })
      .map(({ label, actors }) => ({
        label,
        who: actors
          .flatMap((actor) => (actor === 'author' ? [author.name] : (ACTOR_WORDS[actor] ?? [])))
          .join(' or '),
      }));
  });
  protected readonly title = computed(() => {
    const event = this.chosen()?.event ?? this.others()[0]?.event ?? '';
    return TITLES[event] ?? 'Next step';
  });
  /** The server names the sentence of the next step; a withdrawal beside it has its own. */
  protected readonly statement = computed(() => {
    const { statement, number, laser, input } = this.evaluation();
    if (this.chosen()?.event !== 'withdraw') return statement;
    const { edition } = ruleSetById(input.ruleSet);
    return statementOf('withdrawn', { number, tag: laser.tag, edition });
  });
  protected readonly reasons = computed(() => {
    const reasons = this.chosen()?.reasons ?? [];
    return this.obstacle() ? [this.obstacle(), ...reasons] : reasons;
  });
  protected readonly working = computed(() =>
    this.chosen()?.event === 'confirm' ? 'Confirming…' : 'Signing…',
  );

  focus(): void {
    this.host.nativeElement.scrollIntoView({ block: 'center' });
    this.host.nativeElement.focus({ preventScroll: true });
  }

  /** Begins a step that needs no signature, asking for its reason where one is kept. */
  begin(offer: OfferedEvent): void {
    if (isSigned(offer)) {
      this.chosen.set(offer);
      this.focus();
      return;
    }
    const event = offer.event as EvaluationTransition['event'];
    if (!offer.asks.includes('reason')) {
      this.stepped.emit({ event });
      return;
    }
    this.confirm
      .ask({
        title: offer.label,
        text:
          event === 'discard'
            ? 'A discarded evaluation stays readable and cannot be taken up again.'
            : 'The author sees the reason beside the evaluation.',
        action: offer.label,
        reason: { label: 'Reason, kept with the record', minLength: 10 },
      })
      .subscribe((answer) => {
        if (answer) this.stepped.emit({ event, reason: answer.reason });
      });
  }

  protected sign(password: string): void {
    const offer = this.chosen();
    if (!offer) return;
    const reasonBox = this.reasonBox()?.nativeElement;
    const reason = reasonBox?.value.trim() ?? '';
    const comment = this.commentBox()?.nativeElement.value.trim() ?? '';
    this.missingReason.set(reasonBox !== undefined && reason.length < 10);
    if (this.missingReason()) {
      reasonBox?.focus();
      return;
    }
    this.stepped.emit({
      event: offer.event as EvaluationTransition['event'],
      password,
      ...(comment ? { comment } : {}),
      ...(reason ? { reason } : {}),
    });
  }
}

function isSigned(offer: OfferedEvent): boolean {
  return offer.asks.includes('password');
}
