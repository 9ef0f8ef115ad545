import type { Machine } from './machine';

export const LASER_STATES = [
  'requested',
  'approved-to-buy',
  'on-order',
  'received',
  'registered',
  'under-evaluation',
  'evaluated',
  'commissioning',
  'in-use',
  'change-open',
  'service-open',
  'blocked',
  'stored',
  'on-loan',
  'transferring',
  'rejected',
  'withdrawn',
  'transferred',
  'disposed',
] as const;
export type LaserState = (typeof LASER_STATES)[number];

export const LASER_EVENTS = [
  'register',
  'request-purchase',
  'declare-found',
  'take-over',
  'pass-preliminary-review',
  'reject',
  'withdraw',
  'order',
  'goods-in',
  'submit-record',
  'return',
  'open-evaluation',
  'data-insufficient',
  'evaluation-approved',
  'change-undone',
  'declare-ready',
  'not-ready',
  'release',
  'change-notice',
  'change-closed',
  'change-major',
  'service-starts',
  'service-closed',
  'service-failed',
  'block',
  're-evaluate',
  'store',
  'take-out',
  'take-out-unevaluated',
  'lend',
  'loan-returned',
  'transfer',
  'accept-in-house',
  'left-site',
  'decline',
  'clear-disposal',
] as const;
export type LaserEvent = (typeof LASER_EVENTS)[number];

/** The word on the chip. */
export const LASER_STATE_WORDS: Readonly<Record<LaserState, string>> = {
  requested: 'Requested',
  'approved-to-buy': 'Approved to buy',
  'on-order': 'On order',
  received: 'Received',
  registered: 'Registered',
  'under-evaluation': 'Under evaluation',
  evaluated: 'Evaluated',
  commissioning: 'Commissioning',
  'in-use': 'In use',
  'change-open': 'Change open',
  'service-open': 'Service open',
  blocked: 'Blocked',
  stored: 'Stored',
  'on-loan': 'On loan',
  transferring: 'Transferring',
  rejected: 'Rejected',
  withdrawn: 'Withdrawn',
  transferred: 'Transferred',
  disposed: 'Disposed',
};

/**
 * What must hold before a step. Those under `NOT_RECORDED_GUARDS` rest on records that this
 * version does not keep: they are never true by themselves.
 */
export type LaserGuard =
  | 'reason-given'
  | 'class-and-room-named'
  | 'photo-or-description'
  | 'dated-waiver'
  | 'not-the-requester'
  | 'registered-with-authority'
  | 'tag-and-photo'
  | 'record-complete'
  | 'verified-class-set'
  | 'evaluation-sealed'
  | 'inputs-equal-sealed'
  | 'evaluation-current'
  | 'no-current-evaluation-or-other-room'
  | 'not-own-area'
  | 'was-released-before'
  | 'never-released-or-needed'
  | 'other-person-asked'
  | 'controls-ticked'
  | 'commissioning-items-passed'
  | 'interlock-test-passed'
  | 'sign-photographed'
  | 'eyewear-sufficient'
  | 'procedure-in-force'
  | 'permit-active'
  | 'person-authorized'
  | 'change-note-signed'
  | 'service-permit-in-force'
  | 'panels-and-interlock-confirmed'
  | 'block-cause-closed'
  | 'key-and-cord-out'
  | 'loan-form'
  | 'both-supervisors'
  | 'new-owner-accepts'
  | 'written-disposition'
  | 'made-harmless';

/**
 * Guards whose records come with later parts of the product, and the words for what is missing. A
 * running waiver of the laser that names these very words meets them, and nothing else does.
 */
export const NOT_RECORDED_GUARDS: Readonly<Partial<Record<LaserGuard, string>>> = {
  'registered-with-authority': 'Registration with the authority is not recorded here.',
  'controls-ticked': 'The installed controls are not recorded here.',
  'commissioning-items-passed': 'The commissioning items of the checklist are not recorded here.',
  'interlock-test-passed': 'Interlock tests are not recorded here.',
  'sign-photographed': 'Door signs are not recorded here.',
  'eyewear-sufficient': 'Eyewear stock is not recorded here.',
  'procedure-in-force': 'Operating procedures are not recorded here.',
  'permit-active': 'Area permits are not recorded here.',
  'person-authorized': 'Authorizations of people are not recorded here.',
  'change-note-signed': 'Change notices are not recorded here.',
  'service-permit-in-force': 'Service permits are not recorded here.',
  'panels-and-interlock-confirmed': 'Close-out checks of a service visit are not recorded here.',
  'loan-form': 'Loan forms are not recorded here.',
};

export type LaserEffect =
  | 'quarantine'
  | 'under-waiver'
  | 'released'
  | 'blocked'
  | 'unblock'
  | 'move-place'
  | 'note-receiver'
  | 'forget-receiver'
  | 'old-approval-void';

/** Job specification 6.1. */
export const LASER_LIFE_CYCLE: Machine<LaserState, LaserEvent, LaserGuard, LaserEffect> = {
  name: 'laser',
  states: LASER_STATES,
  terminal: ['rejected', 'withdrawn', 'transferred', 'disposed'],
  // prettier-ignore
  transitions: [
    { from: ['start'], event: 'register', label: 'Register a laser that is here', actors: ['supervisor', 'lso', 'deputy-lso'], guards: [], to: 'received', effects: [] },
    { from: ['start'], event: 'request-purchase', label: 'Request a purchase', actors: ['supervisor'], guards: ['class-and-room-named'], to: 'requested', effects: [] },
    { from: ['start'], event: 'declare-found', label: 'Declare a laser found, given, brought or home-built', actors: ['anyone'], guards: ['photo-or-description'], to: 'received', effects: ['quarantine'] },
    { from: ['start', 'received', 'registered', 'under-evaluation', 'evaluated', 'commissioning'], event: 'take-over', label: 'Take over from a former register', actors: ['lso'], guards: ['reason-given', 'dated-waiver'], to: 'in-use', effects: ['under-waiver', 'released'], asks: ['reason', 'waiver'] },
    { from: ['requested'], event: 'pass-preliminary-review', label: 'Pass the preliminary review', actors: ['lso'], guards: ['not-the-requester'], to: 'approved-to-buy', effects: [] },
    { from: ['requested'], event: 'reject', label: 'Reject', actors: ['lso'], guards: ['reason-given'], to: 'rejected', effects: [], asks: ['reason'] },
    { from: ['requested', 'approved-to-buy', 'on-order'], event: 'withdraw', label: 'Withdraw', actors: ['supervisor'], guards: [], to: 'withdrawn', effects: [] },
    { from: ['approved-to-buy'], event: 'order', label: 'Note the order', actors: ['supervisor', 'purchasing'], guards: ['registered-with-authority'], to: 'on-order', effects: [] },
    { from: ['on-order'], event: 'goods-in', label: 'Goods in', actors: ['supervisor', 'purchasing'], guards: ['tag-and-photo'], to: 'received', effects: ['quarantine'] },
    { from: ['received'], event: 'submit-record', label: 'Submit the record', actors: ['supervisor'], guards: ['record-complete'], to: 'registered', effects: [] },
    { from: ['registered'], event: 'return', label: 'Return to the supervisor', actors: ['lso'], guards: ['reason-given'], to: 'received', effects: [], asks: ['reason'] },
    { from: ['registered'], event: 'open-evaluation', label: 'Open the evaluation', actors: ['lso'], guards: ['verified-class-set'], to: 'under-evaluation', effects: [] },
    { from: ['under-evaluation'], event: 'data-insufficient', label: 'Data insufficient', actors: ['lso'], guards: ['reason-given'], to: 'registered', effects: [], asks: ['reason'] },
    { from: ['under-evaluation'], event: 'evaluation-approved', label: 'Evaluation signed', actors: ['system'], guards: ['evaluation-sealed'], to: 'evaluated', effects: [] },
    { from: ['under-evaluation'], event: 'change-undone', label: 'Change undone and verified', actors: ['system'], guards: ['inputs-equal-sealed', 'change-note-signed'], to: 'in-use', effects: [] },
    { from: ['evaluated'], event: 'declare-ready', label: 'Declare ready', actors: ['supervisor'], guards: ['controls-ticked'], to: 'commissioning', effects: [] },
    { from: ['commissioning'], event: 'not-ready', label: 'Not ready', actors: ['lso'], guards: ['reason-given'], to: 'evaluated', effects: [], asks: ['reason'] },
    { from: ['commissioning'], event: 'release', label: 'Release for use', actors: ['lso'], guards: ['evaluation-current', 'commissioning-items-passed', 'interlock-test-passed', 'sign-photographed', 'eyewear-sufficient', 'procedure-in-force', 'permit-active', 'person-authorized', 'not-own-area'], to: 'in-use', effects: ['released'] },
    { from: ['in-use'], event: 'change-notice', label: 'Declare a change', actors: ['supervisor', 'system'], guards: ['reason-given'], to: 'change-open', effects: [], asks: ['reason'] },
    { from: ['change-open'], event: 'change-closed', label: 'Change closed', actors: ['system'], guards: ['change-note-signed'], to: 'in-use', effects: [] },
    { from: ['change-open'], event: 'change-major', label: 'Class the change as major', actors: ['lso'], guards: [], to: 'under-evaluation', effects: [] },
    { from: ['in-use', 'blocked', 'stored'], event: 'service-starts', label: 'Service visit starts', actors: ['system'], guards: ['service-permit-in-force'], to: 'service-open', effects: [] },
    { from: ['service-open'], event: 'service-closed', label: 'Service visit closed', actors: ['system'], guards: ['panels-and-interlock-confirmed'], to: 'in-use', effects: [] },
    { from: ['service-open'], event: 'service-failed', label: 'Close-out failed', actors: ['lso', 'system'], guards: ['reason-given'], to: 'blocked', effects: ['blocked'], asks: ['reason'] },
    { from: ['registered', 'under-evaluation', 'evaluated', 'commissioning', 'in-use', 'change-open', 'service-open'], event: 'block', label: 'Block', actors: ['lso', 'deputy-lso', 'supervisor', 'system'], guards: ['reason-given'], to: 'blocked', effects: ['blocked'], asks: ['reason'] },
    { from: ['blocked'], event: 'release', label: 'Release the block', actors: ['lso'], guards: ['reason-given', 'block-cause-closed', 'evaluation-current', 'was-released-before', 'not-own-area'], to: 'in-use', effects: ['unblock'], asks: ['reason'] },
    { from: ['blocked'], event: 're-evaluate', label: 'Evaluate again', actors: ['lso'], guards: ['never-released-or-needed'], to: 'under-evaluation', effects: ['unblock'], asks: ['reason'] },
    { from: ['registered', 'evaluated', 'commissioning', 'in-use', 'blocked'], event: 'store', label: 'Store', actors: ['supervisor'], guards: ['key-and-cord-out'], to: 'stored', effects: [], asks: ['reason'] },
    { from: ['stored'], event: 'take-out', label: 'Take out of store', actors: ['supervisor'], guards: ['evaluation-current'], to: 'commissioning', effects: [] },
    { from: ['stored'], event: 'take-out-unevaluated', label: 'Take out for a new evaluation', actors: ['supervisor'], guards: ['no-current-evaluation-or-other-room'], to: 'under-evaluation', effects: ['move-place'], asks: ['area'] },
    { from: ['in-use', 'stored'], event: 'lend', label: 'Lend', actors: ['supervisor'], guards: ['loan-form'], to: 'on-loan', effects: [] },
    { from: ['on-loan'], event: 'loan-returned', label: 'Returned from loan', actors: ['supervisor'], guards: ['reason-given'], to: 'stored', effects: [], asks: ['reason'] },
    { from: ['received', 'in-use', 'stored', 'blocked', 'on-loan'], event: 'transfer', label: 'Transfer', actors: ['supervisor'], guards: ['both-supervisors'], to: 'transferring', effects: ['note-receiver'], asks: ['area', 'reason'] },
    { from: ['transferring'], event: 'accept-in-house', label: 'Accept in house', actors: ['supervisor', 'lso'], guards: ['new-owner-accepts'], to: 'registered', effects: ['old-approval-void'] },
    { from: ['transferring'], event: 'left-site', label: 'Left the site', actors: ['lso'], guards: ['written-disposition'], to: 'transferred', effects: [], asks: ['reason'] },
    { from: ['transferring'], event: 'decline', label: 'Decline the transfer', actors: ['supervisor', 'lso'], guards: ['reason-given'], to: 'stored', effects: ['forget-receiver'], asks: ['reason'] },
    { from: ['received', 'registered', 'stored', 'blocked', 'in-use'], event: 'clear-disposal', label: 'Clear for disposal', actors: ['lso'], guards: ['other-person-asked', 'made-harmless'], to: 'disposed', effects: [], asks: ['reason'] },
  ],
};
