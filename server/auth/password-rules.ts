import { InvalidInput } from '../http/errors';

/** Words that somebody would try first here, and the commonest of all long passwords. */
const GUESSED = [
  'limen',
  'laser',
  'safety',
  'password',
  'passwort',
  'qwerty',
  'asdfgh',
  'letmein',
  'welcome',
  'administrator',
  'changeme',
  'iloveyou',
  'abc123',
  '123456',
  '1q2w3e',
];

/**
 * No rules of composition; but what is left after the guessed words and the person's own names
 * must not be trivial.
 */
export function requireGoodPassword(
  path: string,
  password: string,
  person?: { readonly name: string; readonly email: string },
): void {
  const own = person ? [...person.name.split(/\s+/), ...person.email.split(/[@.]/)] : [];
  const words = [...GUESSED, ...own.filter((word) => word.length > 3)];
  const rest = words.reduce(
    (text, word) => text.replaceAll(word.toLowerCase(), ''),
    password.toLowerCase(),
  );
  if (new Set(rest).size >= 5) return;
  throw new InvalidInput([
    {
      path,
      message: 'This password is easy to guess. Take several unrelated words, or a random text.',
      allowed: '12 to 128 characters that are not a name or a common password',
    },
  ]);
}
