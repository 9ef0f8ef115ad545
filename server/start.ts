import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';

import { type Logger, pino } from 'pino';

import { MIGRATIONS } from '../migrations/index';
import { signHead } from './audit-trail/checkpoint';
import { openTrailHeads } from './audit-trail/trail-heads';
import { verifyNewest } from './audit-trail/verify-trail';
import { type App, createApp } from './app';
import type { Config } from './config/config';
import type { Edges } from './context/context';
import { migrate } from './db/migrate';
import { databaseFile, type Db, openDatabase } from './db/open-database';
import { areaChanged } from './features/evaluations/evaluation-staleness-service';
import { openFileStore } from './files/file-store';

/** Entries of the audit trail that every start checks. */
const CHECKED_AT_START = 1000;

export interface Product extends App {
  readonly edges: Edges;
  /** Signs the head of the trail and closes the database. */
  close(): Promise<void>;
}

/** Opens the data directory, brings it up to date, checks it and puts the product together. */
export async function openProduct(
  config: Config,
  { clock, log }: { clock: () => Date; log: Logger },
): Promise<Product> {
  const edges = await openEdges(config, { clock, log });
  const app = createApp(edges, sessionSecret(config));
  return {
    ...app,
    edges,
    close: async () => {
      await app.jobs.stop();
      await signHead(edges);
      await edges.db.close();
    },
  };
}

/** Everything outside the process, checked: also for the command line and the demo. */
export async function openEdges(
  config: Config,
  { clock, log }: { clock: () => Date; log: Logger },
): Promise<Edges> {
  mkdirSync(config.dataDir, { recursive: true, mode: 0o700 });
  const db = openDatabase(databaseFile(config.dataDir));
  const applied = await migrate(db, MIGRATIONS, clock());
  if (applied.length > 0) log.info({ applied }, 'schema brought up to date');
  requireSound(db);
  return {
    config,
    db,
    clock,
    log,
    files: openFileStore(join(config.dataDir, 'files')),
    heads: openTrailHeads(config.dataDir),
    consequences: { areaChanged },
  };
}

export function createLog(config: Config): Logger {
  return pino({ level: config.logLevel, timestamp: pino.stdTimeFunctions.isoTime });
}

/** Fails closed: a damaged file must be looked at, not worked on. */
function requireSound(db: Db): void {
  const check = db.quickCheck();
  if (check !== 'ok') {
    throw new Error(`The database is damaged (${check}). Stop, keep the file, restore a backup.`);
  }
  const bad = verifyNewest(db, CHECKED_AT_START);
  if (bad) {
    throw new Error(
      `The audit trail is not intact at entry ${bad.sequence}: ${bad.problem} ` +
        'Run "npm run verify-trail" and find out before going on.',
    );
  }
}

/** From the environment; in the demo one is made at the first start and kept with the data. */
function sessionSecret(config: Config): Buffer {
  if (config.sessionSecret !== undefined) return Buffer.from(config.sessionSecret);
  const file = join(config.dataDir, 'keys', 'demo-session-secret');
  if (!existsSync(file)) {
    mkdirSync(dirname(file), { recursive: true, mode: 0o700 });
    writeFileSync(file, randomBytes(48), { mode: 0o600 });
  }
  return readFileSync(file);
}
