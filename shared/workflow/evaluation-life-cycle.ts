import type { Machine } from './machine';

export const EVALUATION_STATES = [
  'draft',
  'in-check',
  'checked',
  'approved',
  'stale',
  'superseded',
  'withdrawn',
  'discarded',
] as const;
export type EvaluationState = (typeof EVALUATION_STATES)[number];

export const EVALUATION_EVENTS = [
  'begin',
  'send-to-check',
  'discard',
  'return',
  'confirm',
  'input-changed',
  'sign',
  'go-stale',
  'confirm-unchanged',
  'supersede',
  'withdraw',
] as const;
export type EvaluationEvent = (typeof EVALUATION_EVENTS)[number];

/** The word on the chip. */
export const EVALUATION_STATE_WORDS: Readonly<Record<EvaluationState, string>> = {
  draft: 'Draft',
  'in-check': 'In check',
  checked: 'Checked',
  approved: 'Signed',
  stale: 'Stale',
  superseded: 'Superseded',
  withdrawn: 'Withdrawn',
  discarded: 'Discarded',
};

export type EvaluationGuard =
  | 'rule-set-chosen'
  | 'inputs-complete'
  | 'all-lines-covered'
  | 'all-activities-answered'
  | 'evaluates-without-error'
  | 'checker-is-not-author'
  | 'approver-is-not-author'
  | 'deputy-has-delegation'
  | 'lso-is-not-a-party'
  | 'laser-inputs-equal'
  | 'results-equal'
  | 'presence-proven'
  | 'reason-given';

export type EvaluationEffect =
  | 'sign-prepared'
  | 'sign-reviewed'
  | 'sign-confirmed'
  | 'sign-withdrawn'
  | 'note-return'
  | 'seal'
  | 'supersede-predecessor'
  | 'refresh-laser-reach'
  | 'move-laser'
  | 'new-review-date'
  | 'block-laser';

/** Separation of duties: SD2 checker and approver are not the author; SD6 a deputy acts inside a delegation; SD9 nobody decides in a matter of their own. */
export const EVALUATION_LIFE_CYCLE: Machine<
  EvaluationState,
  EvaluationEvent,
  EvaluationGuard,
  EvaluationEffect
> = {
  name: 'evaluation',
  states: EVALUATION_STATES,
  terminal: ['superseded', 'withdrawn', 'discarded'],
  // prettier-ignore
  transitions: [
    { from: ['start'],                 event: 'begin',             label: 'Begin an evaluation', actors: ['lso', 'deputy-lso', 'supervisor'], guards: ['rule-set-chosen'], to: 'draft', effects: [] },
    { from: ['draft'],                 event: 'send-to-check',     label: 'Send to check',       actors: ['author'], guards: ['inputs-complete', 'all-lines-covered', 'all-activities-answered', 'evaluates-without-error'], to: 'in-check', effects: ['sign-prepared'] },
    { from: ['draft'],                 event: 'discard',           label: 'Discard',             actors: ['author'], guards: ['reason-given'], to: 'discarded', effects: [], asks: ['reason'] },
    { from: ['in-check'],              event: 'return',            label: 'Return to the author', actors: ['lso', 'deputy-lso'], guards: ['checker-is-not-author', 'reason-given'], to: 'draft', effects: ['note-return'], asks: ['reason'] },
    { from: ['in-check'],              event: 'confirm',           label: 'Confirm the check',   actors: ['lso', 'deputy-lso'], guards: ['checker-is-not-author', 'laser-inputs-equal', 'evaluates-without-error', 'presence-proven'], to: 'checked', effects: ['sign-reviewed'], asks: ['comment', 'password'] },
    { from: ['in-check', 'checked'],   event: 'input-changed',     label: 'Change an input',     actors: ['system', 'author'], guards: [], to: 'draft', effects: ['note-return'] },
    { from: ['checked'],               event: 'return',            label: 'Return to the author', actors: ['lso'], guards: ['reason-given'], to: 'draft', effects: ['note-return'], asks: ['reason'] },
    { from: ['checked'],               event: 'sign',              label: 'Sign and seal',       actors: ['lso', 'deputy-lso'], guards: ['approver-is-not-author', 'deputy-has-delegation', 'lso-is-not-a-party', 'laser-inputs-equal', 'evaluates-without-error', 'presence-proven'], to: 'approved', effects: ['seal', 'supersede-predecessor', 'refresh-laser-reach', 'move-laser'], asks: ['comment', 'password'] },
    { from: ['approved'],              event: 'go-stale',          label: 'Becomes stale',       actors: ['system'], guards: [], to: 'stale', effects: ['refresh-laser-reach', 'move-laser'] },
    { from: ['stale'],                 event: 'confirm-unchanged', label: 'Confirm unchanged',   actors: ['lso'], guards: ['laser-inputs-equal', 'results-equal', 'presence-proven'], to: 'approved', effects: ['sign-confirmed', 'new-review-date', 'refresh-laser-reach'], asks: ['comment', 'password'] },
    { from: ['approved', 'stale'],     event: 'supersede',         label: 'Superseded by a newer version', actors: ['system'], guards: [], to: 'superseded', effects: [] },
    { from: ['approved', 'stale'],     event: 'withdraw',          label: 'Withdraw as wrong',   actors: ['lso', 'committee'], guards: ['reason-given', 'presence-proven'], to: 'withdrawn', effects: ['sign-withdrawn', 'refresh-laser-reach', 'block-laser'], asks: ['reason', 'password'] },
  ],
};
