import {
  booleanAttribute,
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { ROLE_WORDS } from '@shared/model/people';
import type { AuditEntry } from '@shared/model/records';

import { ChangeList } from '../change-list/change-list';
import { actionWords } from './action-words';
import { stateWords } from './state-words';

const LINKED: Readonly<Record<string, string>> = {
  laser: '/lasers',
  evaluation: '/evaluations',
  area: '/areas',
  person: '/people',
};

const ROLES: Readonly<Record<string, string>> = ROLE_WORDS;

/** One entry of the audit trail: who did what, and on request what changed. */
@Component({
  selector: 'lm-audit-entry',
  imports: [ChangeList, RouterLink],
  templateUrl: './audit-entry-view.html',
  styleUrl: './audit-entry-view.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AuditEntryView {
  readonly entry = input.required<AuditEntry>();
  /** The entry's time, as the page writes times. */
  readonly at = input.required<string>();
  /** Inside of one record's page, which needs not be named again. */
  readonly brief = input(false, { transform: booleanAttribute });

  protected readonly action = computed(() =>
    actionWords(this.entry().action, this.entry().recordKind, this.entry().fromState),
  );
  protected readonly who = computed(() => {
    const { actorName, actorRole, actingFor } = this.entry();
    const role = ROLES[actorRole] ?? actorRole;
    return [actorName, role, actingFor && `for ${actingFor}`].filter(Boolean).join(', ');
  });
  protected readonly states = computed(() => {
    const { fromState, toState, recordKind } = this.entry();
    if (!toState || fromState === toState) return '';
    const to = stateWords(toState, recordKind);
    return fromState ? `${stateWords(fromState, recordKind)} → ${to}` : to;
  });
  protected readonly link = computed(() => {
    const { recordKind, recordId } = this.entry();
    const base = LINKED[recordKind];
    return base ? [base, recordId] : null;
  });
  protected readonly summary = computed(() => {
    const count = this.entry().changes.length;
    if (count === 0) return 'Proof';
    return count === 1 ? 'One field changed' : `${count} fields changed`;
  });
}
