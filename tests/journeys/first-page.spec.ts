import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, inject, it } from 'vitest';
import { launchBrowser, openPage } from './support/browser';

let browser: Browser;
beforeAll(async () => {
  browser = await launchBrowser();
});
afterAll(() => browser.close());

it('the first page asks who one is, with our own fonts and without a request to another host', async () => {
  const { page, context, complaints } = await openPage(browser);
  const hosts = new Set<string>();
  page.on('request', (request) => hosts.add(new URL(request.url()).host));

  await page.goto('/');
  await page.getByRole('heading', { level: 1 }).waitFor();

  expect(page.url()).toContain('/sign-in');
  const title = page.getByRole('heading', { level: 1 });
  expect(await title.evaluate((node) => getComputedStyle(node).fontFamily)).toContain(
    'Limen Serif',
  );
  expect(
    await page.evaluate(() => [...document.fonts].some((face) => face.status === 'loaded')),
  ).toBe(true);
  expect([...hosts]).toEqual([new URL(inject('baseUrl')).host]);
  expect(complaints).toEqual([]);
  await context.close();
});

it('health and readiness answer without sign-in', async () => {
  for (const path of ['/healthz', '/readyz']) {
    const answer = await fetch(inject('baseUrl') + path);
    expect(answer.status, path).toBe(200);
  }
});
