import { spawn, type ChildProcess } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { TestProject } from 'vitest/node';

declare module 'vitest' {
  interface ProvidedContext {
    baseUrl: string;
  }
}

const READY_WITHIN_MS = 60_000;

/** Serves the built product with a freshly seeded demo institute for all journeys. */
export async function setup(project: TestProject): Promise<() => Promise<void>> {
  const dataDir = mkdtempSync(path.join(tmpdir(), 'limen-journeys-'));
  const port = await freePort();
  const baseUrl = `http://localhost:${port}`;
  const server = spawn(process.execPath, ['dist/server/main.js'], {
    env: {
      ...process.env,
      PORT: String(port),
      DATA_DIR: dataDir,
      PUBLIC_URL: baseUrl,
      NODE_ENV: '',
    },
    stdio: ['ignore', 'ignore', 'inherit'],
  });
  await untilReady(baseUrl, server);
  project.provide('baseUrl', baseUrl);
  return async () => {
    server.kill('SIGTERM');
    await new Promise((resolve) => server.once('exit', resolve));
    rmSync(dataDir, { recursive: true, force: true });
  };
}

async function untilReady(baseUrl: string, server: ChildProcess): Promise<void> {
  const end = Date.now() + READY_WITHIN_MS;
  while (Date.now() < end) {
    if (server.exitCode !== null) throw new Error(`The server ended with ${server.exitCode}.`);
    // A refused connection is expected until the server listens.
    const ready = await fetch(`${baseUrl}/readyz`).catch(() => undefined);
    if (ready?.ok) return;
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
  throw new Error('The server was not ready in time.');
}

function freePort(): Promise<number> {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.listen(0, () => {
      const { port } = probe.address() as AddressInfo;
      probe.close(() => resolve(port));
    });
  });
}
