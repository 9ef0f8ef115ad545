/**
 * `npm test`: installs what is missing, then runs every check, cheap ones first, and ends with the
 * counts. Plain Node without packages, since it also runs before anything is installed.
 */
import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { installIfMissing } from '../../server/cli/start.mjs';

const CHROMIUM = '/usr/bin/chromium';
const DEBIAN_PACKAGES = ['chromium', 'poppler-utils'];
const counts = { passed: 0, failed: 0 };
const failures = [];

installIfMissing();
installDebianPackages();
rmSync('tmp/test-reports', { recursive: true, force: true });
mkdirSync('tmp/test-reports', { recursive: true });

check('format', 'npx', ['prettier', '--check', '--log-level', 'warn', '.']);
check('lint', 'npx', ['eslint', '.', '--max-warnings', '0']);
check('types', 'npm', ['run', '--silent', 'types']);
check('dead code', 'npx', ['knip']);
suite('units, engine, API', ['vitest', 'run', '--config', 'vitest.config.ts']);
check('build', 'npm', ['run', '--silent', 'build']);
suite('components', ['ng', 'test', '--watch=false']);
const journeys = suite('journeys', ['vitest', 'run', '--config', 'vitest.journeys.config.ts']);

console.log(`\nJourneys in a real browser: ${journeys} ran.`);
for (const failure of failures) console.log(`Failed: ${failure}`);
console.log(`${counts.passed} passed, ${counts.failed} failed`);
process.exit(counts.failed === 0 ? 0 : 1);

function installDebianPackages() {
  if (existsSync(CHROMIUM) && existsSync('/usr/bin/pdftotext')) return;
  console.log(`Installing ${DEBIAN_PACKAGES.join(', ')} …`);
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const sudo = process.getuid?.() === 0 ? [] : ['sudo'];
  for (const args of [
    ['update', '-qq'],
    ['install', '-y', '-qq', ...DEBIAN_PACKAGES],
  ]) {
    const [command, ...rest] = [...sudo, 'apt-get', ...args];
    spawnSync(command, rest, { stdio: ['ignore', 'ignore', 'inherit'], env });
  }
}

/** One command that passes or fails as a whole. */
function check(name, command, args) {
  console.log(`\n== ${name}`);
  const { status } = spawnSync(command, args, { stdio: 'inherit' });
  count(name, status === 0 ? 1 : 0, status === 0 ? 0 : 1);
}

/** A test runner that writes a JSON report; counts come from the report. Returns how many ran. */
function suite(name, args) {
  console.log(`\n== ${name}`);
  const report = `tmp/test-reports/${name.replaceAll(/[^a-z]+/g, '-')}.json`;
  const reporters =
    args[0] === 'ng'
      ? ['--reporters=default', '--reporters=json', `--output-file=${report}`]
      : ['--reporter=default', '--reporter=json', `--outputFile.json=${report}`];
  const { status } = spawnSync('npx', [...args, ...reporters], { stdio: 'inherit' });
  if (!existsSync(report)) {
    count(`${name} (no report)`, 0, 1);
    return 0;
  }
  const {
    numPassedTests,
    numTotalTests,
    numPendingTests = 0,
    success,
  } = JSON.parse(readFileSync(report, 'utf8'));
  const failed = numTotalTests - numPassedTests;
  // A suite that fails before its tests, or skips any, is a failure too.
  const broken = (status !== 0 || !success || numTotalTests === 0) && failed === 0 ? 1 : 0;
  if (numPendingTests > 0) console.log(`${numPendingTests} skipped count as failed.`);
  count(name, numPassedTests, failed + broken);
  return numTotalTests;
}

function count(name, passed, failed) {
  counts.passed += passed;
  counts.failed += failed;
  if (failed > 0) failures.push(`${name} (${failed})`);
}
