/** `npm run dev`: server restarted and client rebuilt on every change; the page is served by the server. */
import { spawn } from 'node:child_process';
import { installIfMissing } from './start.mjs';

installIfMissing();
const children = [
  spawn('npx', ['ng', 'build', '--configuration', 'development', '--watch'], { stdio: 'inherit' }),
  spawn('npx', ['tsx', 'watch', 'server/main.ts'], { stdio: 'inherit' }),
];
for (const child of children) child.on('exit', (code) => stop(code ?? 0));
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => stop(0));

function stop(code) {
  for (const child of children) child.kill();
  process.exit(code);
}
