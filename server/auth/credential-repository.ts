import type { Tx } from '../db/database';

export function passwordHashOf(tx: Tx, personId: string): Promise<string | undefined> {
  return tx
    .selectFrom('credentials')
    .select('credentials.password_hash')
    .where('credentials.person_id', '=', personId)
    .executeTakeFirst()
    .then((row) => row?.password_hash);
}

export async function storePasswordHash(
  tx: Tx,
  personId: string,
  { passwordHash, at }: { passwordHash: string; at: string },
): Promise<void> {
  const row = { person_id: personId, password_hash: passwordHash, changed_at: at };
  await tx
    .insertInto('credentials')
    .values(row)
    .onConflict((conflict) => conflict.column('person_id').doUpdateSet(row))
    .execute();
}
