import { afterEach, beforeEach, expect, it } from 'vitest';

import { startTestApp, type TestApp } from '../../tests/support/test-app';
import { createJobRunner, type Job } from './job-runner';

let app: TestApp;
beforeEach(async () => {
  app = await startTestApp();
});
afterEach(() => app.close());

function recording(name: string, work = () => Promise.resolve()) {
  const periods: [string, string][] = [];
  const job: Job = {
    name,
    periodS: 3600,
    run: async (_edges, { from, to }) => {
      periods.push([from.toISOString(), to.toISOString()]);
      await work();
    },
  };
  return { job, periods };
}

it('a job runs once in its period, and after a pause once for the whole of it', async () => {
  const { job, periods } = recording('hourly');
  const runner = createJobRunner(app.edges, [job]);
  await runner.tick();
  await runner.tick();
  app.clock.advance({ minutes: 59 });
  await runner.tick();
  expect(periods).toHaveLength(1);
  app.clock.advance({ days: 3 });
  await runner.tick();
  expect(periods).toEqual([
    ['2026-12-01T08:00:00.000Z', '2026-12-01T09:00:00.000Z'],
    ['2026-12-01T09:00:00.000Z', '2026-12-04T09:59:00.000Z'],
  ]);
  await runner.stop();
});

it('two processes never run the same job at once', async () => {
  let finish = (): void => undefined;
  const slow = recording('shared', () => new Promise<void>((resolve) => (finish = resolve)));
  const other = recording('shared');
  const first = createJobRunner(app.edges, [slow.job]);
  const second = createJobRunner(app.edges, [other.job]);
  const running = first.tick();
  while (slow.periods.length === 0) await new Promise((next) => setImmediate(next));
  await second.tick();
  expect(other.periods).toHaveLength(0);
  finish();
  await running;
  await second.tick();
  expect(other.periods).toHaveLength(0);
});

it('a job that failed runs again, for the same period and longer; the others go on', async () => {
  let fails = true;
  const failing = recording('failing', () =>
    fails ? Promise.reject(new Error('no network')) : Promise.resolve(),
  );
  const next = recording('next');
  const runner = createJobRunner(app.edges, [failing.job, next.job]);
  await runner.tick();
  expect(next.periods).toHaveLength(1);
  fails = false;
  app.clock.advance({ minutes: 1 });
  await runner.tick();
  expect(failing.periods.map(([from]) => from)).toEqual([
    '2026-12-01T08:00:00.000Z',
    '2026-12-01T08:00:00.000Z',
  ]);
  expect(next.periods).toHaveLength(1);
});
