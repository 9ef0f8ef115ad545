import { EVALUATION_LIFE_CYCLE } from '@shared/workflow/evaluation-life-cycle';
import { LASER_LIFE_CYCLE } from '@shared/workflow/laser-life-cycle';

/** What was done, for actions that are no step of a life cycle. */
const ACTIONS: Readonly<Record<string, string>> = {
  'session.begin': 'Signed in',
  'session.end': 'Signed out',
  'account.set-up': 'Set up the first administrator',
  'account.accept-invitation': 'Set a password from an invitation',
  'account.change-password': 'Changed the password',
  'person.create': 'Entered a person',
  'person.update': 'Changed a person',
  'person.invite': 'Made an invitation link',
  'area.create': 'Entered an area',
  'area.update': 'Changed an area',
  'laser.register': 'Registered the laser',
  'laser.declare-found': 'Declared the laser found',
  'laser.update': 'Changed the laser',
  'laser.attach-file': 'Attached a file',
  'laser.remove-file': 'Removed a file',
  'laser.import': 'Imported lasers',
  'evaluation.begin': 'Began an evaluation',
  'evaluation.update': 'Changed the evaluation',
  'settings.update': 'Changed the settings',
};

/** An action or event of the audit trail in words; one event may be two steps by its state. */
export function actionWords(action: string, recordKind: string, fromState?: string | null): string {
  const words = ACTIONS[action] ?? stepWords(action, recordKind, fromState ?? 'start');
  if (words) return words;
  const plain = action.replace(/[.-]/g, ' ');
  return plain.charAt(0).toUpperCase() + plain.slice(1);
}

function stepWords(event: string, recordKind: string, state: string): string | undefined {
  if (recordKind === 'laser') return labelOf(LASER_LIFE_CYCLE.transitions, event, state);
  if (recordKind === 'evaluation') return labelOf(EVALUATION_LIFE_CYCLE.transitions, event, state);
  return undefined;
}

function labelOf(steps: readonly Step[], event: string, state: string): string | undefined {
  const named = steps.filter((step) => step.event === event);
  return (named.find((step) => step.from.includes(state)) ?? named[0])?.label;
}

interface Step {
  readonly event: string;
  readonly from: readonly string[];
  readonly label: string;
}
