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

const EVENTS: ReadonlyMap<string, string> = new Map(
  [EVALUATION_LIFE_CYCLE, LASER_LIFE_CYCLE].flatMap((machine) =>
    machine.transitions.map((step) => [`${machine.name}:${step.event}`, step.label] as const),
  ),
);

/** An action or event of the audit trail in words. */
export function actionWords(action: string, recordKind: string): string {
  const words = ACTIONS[action] ?? EVENTS.get(`${recordKind}:${action}`);
  if (words) return words;
  const plain = action.replace(/[.-]/g, ' ');
  return plain.charAt(0).toUpperCase() + plain.slice(1);
}
