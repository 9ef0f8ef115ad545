import type { Session } from '@shared/model/session';

type DemoAccount = NonNullable<Session['demo']>['accounts'][number];

/** Password of every person of the demo institute; no such account exists in real use. */
export const DEMO_PASSWORD = 'threshold-and-door';

/** E-mail address of a person of the demo institute. */
export function demoEmail(name: string): string {
  const ascii = name.normalize('NFKD').replaceAll(/[^\w\s-]/g, '');
  const parts = ascii.toLowerCase().split(/\s+/);
  return `${parts[0]}.${parts.slice(1).join('-')}@halvermere.example`;
}

const ACCOUNTS: readonly (readonly [name: string, role: string, note: string])[] = [
  [
    'Ilse Brandmoor',
    'Laser safety officer',
    'Checks, signs and seals evaluations; sees everything.',
  ],
  [
    'Kofi Asantewell',
    'Deputy laser safety officer',
    'Writes and checks evaluations; to sign needs a delegation.',
  ],
  [
    'Leif Arnmarken',
    'Laser supervisor, B-203',
    'Registers lasers of the room and writes their evaluations.',
  ],
  ['Aiko Tanabeshi', 'Laser supervisor, A-101', 'The same for the ultrafast lab.'],
  ['Noor Hadiqani', 'Operator', 'Reads the lasers and evaluations of the department; cannot sign.'],
  ['Hanae Morishiba', 'Auditor', 'Reads everything and verifies the audit trail; changes nothing.'],
  [
    'Teodor Lindqvarn',
    'Administrator',
    'Keeps people, areas and settings; decides nothing on safety.',
  ],
];

export function demoAccounts(): DemoAccount[] {
  return ACCOUNTS.map(([name, role, note]) => ({
    email: demoEmail(name),
    password: DEMO_PASSWORD,
    name,
    role,
    note,
  }));
}
