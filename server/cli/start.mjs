/**
 * `npm start`: installs what is missing, builds what is out of date, then serves.
 * Plain Node without packages, since it also runs before anything is installed.
 */
import { spawn, spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, readdirSync, statSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import path from 'node:path';

const root = fileURLToPath(new URL('../..', import.meta.url));
process.chdir(root);

/** Installs when `node_modules` does not stem from this very lock file. */
export function installIfMissing() {
  const stamp = 'node_modules/.installed-from';
  const lock = createHash('sha256').update(readFileSync('package-lock.json')).digest('hex');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === lock) return;
  run('npm', ['ci'], 'Installing packages (the database module compiles, about three minutes)');
  writeFileSync(stamp, lock);
}

export function buildIfOutdated() {
  const stamp = 'dist/built-from';
  const sources = [
    'src',
    'server',
    'shared',
    'migrations',
    'public',
    'angular.json',
    'package-lock.json',
    'tsconfig.json',
    'tsconfig.app.json',
  ];
  const newest = String(Math.max(...sources.map(newestChange)));
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === newest) return;
  run('npm', ['run', '--silent', 'build'], 'Building');
  mkdirSync('dist', { recursive: true });
  writeFileSync(stamp, newest);
}

function newestChange(entry) {
  const status = statSync(entry, { throwIfNoEntry: false });
  if (!status) return 0;
  if (!status.isDirectory()) return status.mtimeMs;
  return Math.max(
    status.mtimeMs,
    ...readdirSync(entry).map((name) => newestChange(path.join(entry, name))),
  );
}

function run(command, args, what) {
  console.log(`${what} …`);
  const { status } = spawnSync(command, args, { stdio: 'inherit' });
  if (status !== 0) {
    console.error(`${what} failed.`);
    process.exit(status ?? 1);
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  installIfMissing();
  buildIfOutdated();
  const server = spawn(process.execPath, ['dist/server/main.js'], { stdio: 'inherit' });
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill(signal));
  server.on('exit', (code, signal) => process.exit(code ?? (signal ? 1 : 0)));
}
