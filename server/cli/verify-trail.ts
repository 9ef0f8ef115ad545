import { existsSync } from 'node:fs';

import { openTrailHeads } from '../audit-trail/trail-heads';
import { verifyTrail } from '../audit-trail/verify-trail';
import { databaseFile, openDatabase } from '../db/open-database';

const dataDir = process.env['DATA_DIR'] ?? './data';
const file = databaseFile(dataDir);
if (!existsSync(file)) {
  console.error(
    `There is no database in ${dataDir}. Say where it is: DATA_DIR=… npm run verify-trail`,
  );
  process.exit(2);
}

const db = openDatabase(file);
const result = await verifyTrail({ db, heads: openTrailHeads(dataDir) });
await db.close();

const entries = result.entries.toLocaleString('en-US');
if (result.firstBad) {
  const { sequence, problem } = result.firstBad;
  console.error(`NOT INTACT at entry ${sequence}: ${problem}`);
  console.error(`${entries} entries before it are in order.`);
  process.exit(1);
}
console.log(
  `Intact: ${entries} entries, ${result.checkpoints} signed heads, head ${result.headHash}`,
);
