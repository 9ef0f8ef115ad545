import { createServer, type Server } from 'node:http';

import { type Config, ConfigError, readConfig } from './config/config';
import { NewerSchemaError } from './db/migrate';
import { isEmpty, seedDemo } from './demo/seed-demo';
import { offerSetup } from './features/account/account-service';
import { demoAccounts } from './config/demo-accounts';
import { createLog, openProduct, type Product } from './start';

const STOP_WITHIN_MS = 10_000;
/** sysexits: the configuration or the data does not fit this program; restarting does not help. */
const EXIT_CONFIG = 78;

try {
  const config = readConfig(process.env);
  await run(config);
} catch (error) {
  if (!(error instanceof Error)) throw error;
  console.error(error.message);
  process.exit(error instanceof ConfigError || error instanceof NewerSchemaError ? EXIT_CONFIG : 1);
}

async function run(config: Config): Promise<void> {
  const log = createLog(config);
  const product = await openProduct(config, { clock: () => new Date(), log });
  if (!config.production && (await isEmpty(product.edges))) {
    say('First start: the demo institute is being set up.');
    await seedDemo(product.edges);
  }
  const setupToken = await offerSetup(product.edges);
  const server = createServer(product.http);
  await listen(server, config);
  product.jobs.start();
  void product.jobs.tick();
  greet(config, setupToken);
  stopOn(['SIGTERM', 'SIGINT'], () => stop(server, product));
  for (const event of ['uncaughtException', 'unhandledRejection'] as const) {
    process.once(event, (error: unknown) => {
      // The state of the process is unknown: finish what is under way, then let it be restarted.
      log.fatal({ err: error }, 'unexpected failure; stopping');
      void stop(server, product).finally(() => process.exit(1));
    });
  }
}

function listen(server: Server, { port, host }: Config): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, resolve);
  });
}

function greet(config: Config, setupToken: string | undefined): void {
  say(`Limen is ready at ${config.publicUrl}`);
  if (setupToken !== undefined) {
    say(`No administrator yet. Open ${config.publicUrl}/set-up and enter this token, once:`);
    say(`  ${setupToken}`);
  }
  if (config.production || setupToken !== undefined) return;
  say('Sign in to the demo with one of these:');
  for (const { email, password, role } of demoAccounts()) {
    say(`  ${email.padEnd(42)} ${password}   ${role}`);
  }
}

function stopOn(signals: readonly NodeJS.Signals[], work: () => Promise<void>): void {
  let stopping = false;
  for (const signal of signals) {
    process.on(signal, () => {
      if (stopping) return;
      stopping = true;
      void work().then(
        () => process.exit(0),
        (error: unknown) => {
          console.error(error);
          process.exit(1);
        },
      );
    });
  }
}

/** Takes no new requests, finishes those under way, signs the trail, closes the database. */
async function stop(server: Server, product: Product): Promise<void> {
  const closed = new Promise<void>((resolve) => server.close(() => resolve()));
  server.closeIdleConnections();
  const forced = setTimeout(() => server.closeAllConnections(), STOP_WITHIN_MS - 1000);
  await closed;
  clearTimeout(forced);
  await product.close();
}

/** For the person at the terminal; everything else goes to the log. */
function say(line: string): void {
  process.stdout.write(`${line}\n`);
}
