import { hash, verify } from '@node-rs/argon2';

import { Unavailable } from '../http/errors';

/** argon2id (what the library makes unless told otherwise), 19 MiB, two passes, one lane. */
const PARAMETERS = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };
const CURRENT = '$argon2id$v=19$m=19456,t=2,p=1$';

/** More would let a flood of sign-ins starve everything else. */
const MAX_AT_ONCE = 4;
const MAX_WAITING = 200;

let running = 0;
const waiting: (() => void)[] = [];

export function hashPassword(password: string): Promise<string> {
  return gated(() => hash(password, PARAMETERS));
}

export function isPasswordRight(passwordHash: string, password: string): Promise<boolean> {
  return gated(() => verify(passwordHash, password));
}

/** Takes as long as a real check, so that an unknown name cannot be told from a wrong password. */
export async function checkAgainstNobody(password: string): Promise<false> {
  await isPasswordRight(await nobodysHash(), password);
  return false;
}

/** Whether a stored hash is of older parameters and is to be made anew at the next sign-in. */
export function isWeakerThanNow(passwordHash: string): boolean {
  return !passwordHash.startsWith(CURRENT);
}

let nobody: Promise<string> | undefined;

function nobodysHash(): Promise<string> {
  nobody ??= hash('a password that nobody has', PARAMETERS);
  return nobody;
}

async function gated<T>(work: () => Promise<T>): Promise<T> {
  if (running >= MAX_AT_ONCE) {
    if (waiting.length >= MAX_WAITING) {
      throw new Unavailable('Too many sign-ins at this moment. Try again in a few seconds.');
    }
    await new Promise<void>((proceed) => waiting.push(proceed));
  } else {
    running += 1;
  }
  try {
    return await work();
  } finally {
    const next = waiting.shift();
    // The place is handed over, so that nobody slips in between.
    if (next) next();
    else running -= 1;
  }
}
