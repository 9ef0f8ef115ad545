import { mkdirSync } from 'node:fs';
import { dirname, join } from 'node:path';

import BetterSqlite, { type Database as Connection } from 'better-sqlite3';
import {
  CompiledQuery,
  type DatabaseConnection,
  Kysely,
  SqliteDialect,
  SqliteDriver,
} from 'kysely';

import type { Database } from './database';

/** One file, one writer; reads have a connection of their own and never wait for a write. */
export interface Db {
  readonly file: string;
  readonly write: Kysely<Database>;
  readonly read: Kysely<Database>;
  /** A cached prepared statement on the reading connection, for the few hottest reads. */
  prepareRead<Row>(sql: string): PreparedRead<Row>;
  /** Rows changed on the writing connection since it was opened. */
  totalChanges(): number;
  quickCheck(): string;
  backup(toFile: string): Promise<void>;
  close(): Promise<void>;
}

export interface PreparedRead<Row> {
  get(...parameters: readonly unknown[]): Row | undefined;
  all(...parameters: readonly unknown[]): Row[];
  iterate(...parameters: readonly unknown[]): IterableIterator<Row>;
}

/** Pragmas and what they must read back as. */
const PRAGMAS = [
  { name: 'journal_mode', set: 'WAL', reads: 'wal' },
  { name: 'synchronous', set: 'FULL', reads: 2 },
  { name: 'foreign_keys', set: 'ON', reads: 1 },
  { name: 'busy_timeout', set: '5000', reads: 5000 },
  { name: 'trusted_schema', set: 'OFF', reads: 0 },
] as const;

export function databaseFile(dataDir: string): string {
  return join(dataDir, 'limen.db');
}

export function openDatabase(file: string): Db {
  mkdirSync(dirname(file), { recursive: true });
  const writer = connect(file, false);
  const reader = connect(file, true);
  const changes = writer.prepare<[], number>('select total_changes()').pluck();
  const write = new Kysely<Database>({ dialect: new ImmediateDialect({ database: writer }) });
  const read = new Kysely<Database>({ dialect: new SqliteDialect({ database: reader }) });
  const statements = new Map<string, unknown>();
  return {
    file,
    write,
    read,
    prepareRead<Row>(sql: string): PreparedRead<Row> {
      const statement = statements.get(sql) ?? reader.prepare(sql);
      statements.set(sql, statement);
      return statement as PreparedRead<Row>;
    },
    totalChanges: () => changes.get() ?? 0,
    quickCheck: () => String(reader.pragma('quick_check', { simple: true })),
    backup: async (toFile) => {
      await reader.backup(toFile);
    },
    close: async () => {
      // Kysely closes only a connection that it has used. The reader goes first: while it is open
      // the log cannot be folded into the file.
      await read.destroy();
      if (reader.open) reader.close();
      writer.pragma('wal_checkpoint(TRUNCATE)');
      await write.destroy();
      if (writer.open) writer.close();
    },
  };
}

function connect(file: string, readonly: boolean): Connection {
  const connection = new BetterSqlite(file, { readonly });
  for (const pragma of PRAGMAS) {
    // The journal mode belongs to the file; a reading connection cannot set it.
    if (!(readonly && pragma.name === 'journal_mode')) {
      connection.pragma(`${pragma.name} = ${pragma.set}`);
    }
    const value = connection.pragma(pragma.name, { simple: true });
    if (value !== pragma.reads) {
      throw new Error(`SQLite did not take ${pragma.name} = ${pragma.set}; it says ${value}.`);
    }
  }
  return connection;
}

/** Takes the write lock at once, so that no transaction fails half way because of another process. */
class ImmediateDriver extends SqliteDriver {
  override async beginTransaction(connection: DatabaseConnection): Promise<void> {
    await connection.executeQuery(CompiledQuery.raw('begin immediate'));
  }
}

class ImmediateDialect extends SqliteDialect {
  readonly #config: { database: Connection };

  constructor(config: { database: Connection }) {
    super(config);
    this.#config = config;
  }

  override createDriver(): SqliteDriver {
    return new ImmediateDriver(this.#config);
  }
}
