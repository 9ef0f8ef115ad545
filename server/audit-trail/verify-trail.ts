import { setImmediate } from 'node:timers/promises';

import type { Edges } from '../context/context';
import type { Db } from '../db/open-database';
import type { AuditTrailTable } from './audit-trail-table';
import { GENESIS_HASH, rowHash } from './row-hash';
import type { SignedHead } from './trail-heads';

export interface TrailVerification {
  intact: boolean;
  entries: number;
  checkpoints: number;
  headHash: string;
  firstBad: { sequence: number; problem: string } | null;
}

/** Rows checked before other requests get their turn. */
const BATCH = 2000;
const TRIGGERS = [
  'audit_trail_no_delete',
  'audit_trail_no_update',
  'trail_checkpoints_no_delete',
  'trail_checkpoints_no_update',
];

/** Checks every entry, the signed heads inside and outside the database, and the triggers. */
export async function verifyTrail(edges: Pick<Edges, 'db' | 'heads'>): Promise<TrailVerification> {
  const stored = storedCheckpoints(edges.db);
  const filed = edges.heads.readAll();
  const heads = new Map<number, string>();
  for (const head of [...stored, ...filed]) {
    if (head && edges.heads.isGenuine(head)) heads.set(head.sequence, head.hash);
  }
  const chain = await walkChain(edges.db, heads);
  const problems = [
    chain.bad,
    missingTail(heads, chain.entries),
    forgedHead(edges, [...stored, ...filed]),
    shortenedFile(stored, filed),
    missingTriggers(edges.db),
  ].filter((problem) => problem !== null);
  // What is wrong with an entry says more than what is wrong around the trail (sequence 0).
  const place = (bad: Bad): number => bad.sequence || Infinity;
  const [firstBad = null] = problems.sort((a, b) => place(a) - place(b));
  return {
    intact: firstBad === null,
    entries: chain.entries,
    checkpoints: stored.length,
    headHash: chain.headHash,
    firstBad,
  };
}

/** Checks only the newest entries among themselves: quick enough for every start. */
export function verifyNewest(db: Db, count: number): Bad | null {
  const rows = db
    .prepareRead<AuditTrailTable>('select * from audit_trail order by sequence desc limit ?')
    .all(count + 1)
    .reverse();
  const [first, ...rest] = rows;
  if (!first) return null;
  const startsTrail = rows.length <= count;
  const link = { sequence: first.sequence, hash: first.hash };
  if (startsTrail) {
    const bad = badEntry(first, { sequence: 0, hash: GENESIS_HASH });
    if (bad) return bad;
  }
  return rest.map((row) => step(link, row)).find((bad) => bad !== null) ?? null;
}

interface Link {
  sequence: number;
  hash: string;
}

type Bad = NonNullable<TrailVerification['firstBad']>;

async function walkChain(
  db: Db,
  heads: ReadonlyMap<number, string>,
): Promise<{ entries: number; headHash: string; bad: Bad | null }> {
  const read = db.prepareRead<AuditTrailTable>(
    'select * from audit_trail where sequence > ? order by sequence limit ?',
  );
  const link: Link = { sequence: 0, hash: GENESIS_HASH };
  for (;;) {
    const rows = read.all(link.sequence, BATCH);
    for (const row of rows) {
      const bad = step(link, row) ?? badHead(heads, row);
      if (bad) return { entries: link.sequence, headHash: link.hash, bad };
    }
    if (rows.length < BATCH) return { entries: link.sequence, headHash: link.hash, bad: null };
    await setImmediate();
  }
}

/** Moves the link on when the row follows it. */
function step(link: Link, row: AuditTrailTable): Bad | null {
  const bad = badEntry(row, link);
  link.sequence = row.sequence;
  link.hash = row.hash;
  return bad;
}

function badEntry(row: AuditTrailTable, link: Readonly<Link>): Bad | null {
  const { hash, ...content } = row;
  const expected = link.sequence + 1;
  if (row.sequence !== expected) {
    return { sequence: expected, problem: `Entry ${expected} is missing.` };
  }
  if (rowHash(link.hash, content) === hash) return null;
  const problem =
    'The entry does not agree with its hash: it, or what stood before it, was altered.';
  return { sequence: row.sequence, problem };
}

function badHead(heads: ReadonlyMap<number, string>, row: AuditTrailTable): Bad | null {
  const signed = heads.get(row.sequence);
  if (signed === undefined || signed === row.hash) return null;
  const problem = 'The hash is not the one that was signed: the trail up to here was rewritten.';
  return { sequence: row.sequence, problem };
}

function missingTail(heads: ReadonlyMap<number, string>, entries: number): Bad | null {
  const last = Math.max(0, ...heads.keys());
  if (last <= entries) return null;
  return {
    sequence: entries + 1,
    problem: `A head was signed at entry ${last}, but the trail ends at ${entries}: it was cut.`,
  };
}

function forgedHead(
  edges: Pick<Edges, 'heads'>,
  heads: readonly (SignedHead | null)[],
): Bad | null {
  const forged = heads.find((head) => head === null || !edges.heads.isGenuine(head));
  if (forged === undefined) return null;
  return {
    sequence: forged?.sequence ?? 0,
    problem: 'A signed head is not genuine: it was altered or signed with another key.',
  };
}

function shortenedFile(
  stored: readonly SignedHead[],
  filed: readonly (SignedHead | null)[],
): Bad | null {
  const known = new Set(filed.map((head) => head?.signature));
  const missing = stored.find((head) => !known.has(head.signature));
  if (!missing) return null;
  const problem = 'The file of signed heads lacks this one: the file was shortened or replaced.';
  return { sequence: missing.sequence, problem };
}

function missingTriggers(db: Db): Bad | null {
  const names = db
    .prepareRead<{ name: string }>("select name from sqlite_master where type = 'trigger'")
    .all()
    .map((row) => row.name);
  const missing = TRIGGERS.filter((trigger) => !names.includes(trigger));
  if (missing.length === 0) return null;
  return { sequence: 0, problem: `The append-only triggers are missing: ${missing.join(', ')}.` };
}

function storedCheckpoints(db: Db): SignedHead[] {
  return db.prepareRead<SignedHead>('select * from trail_checkpoints order by sequence').all();
}
