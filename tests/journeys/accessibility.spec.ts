import AxeBuilder from '@axe-core/playwright';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest';
import { launchBrowser, openPage, signIn, WIDTHS } from './support/browser';

/** Some twenty pages, each looked at node by node. */
const LONG_MS = 600_000;
const TAGS = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

let browser: Browser;
/** Every kind of page, with a real record where it shows one. */
let pages: string[] = [];

beforeAll(async () => {
  browser = await launchBrowser();
  const { page, context } = await openPage(browser);
  await signIn(page, 'lso');
  const rows = async (list: string) => {
    const answer = await context.request.get(`${inject('baseUrl')}/api/${list}`);
    return ((await answer.json()) as { rows: { id: string }[] }).rows;
  };
  const first = async (list: string) => (await rows(list))[0]!.id;
  const laser = await first('lasers?attention=stale');
  pages = [
    '/today',
    '/lasers',
    '/lasers?q=nothing-has-this-name',
    '/lasers/new',
    '/lasers/import',
    `/lasers/${laser}`,
    `/lasers/${laser}/edit`,
    '/evaluations',
    `/evaluations/${await first('evaluations?state=approved')}`,
    `/evaluations/${await first('evaluations?state=stale')}`,
    `/evaluations/${await first('evaluations?state=checked')}`,
    '/bench',
    '/areas',
    '/areas/new',
    `/areas/${await first('areas')}`,
    '/people',
    `/people/${await first('people')}`,
    '/records',
    '/settings',
    '/account',
    '/help',
    '/no-such-page',
  ];
  await context.close();
});
afterAll(() => browser.close());

describe.each(['light', 'dark'] as const)('in %s', (colorScheme) => {
  it(
    'no page breaks a rule of WCAG 2.2 A or AA that a program can check',
    async () => {
      const { page, context, complaints } = await openPage(browser, { colorScheme });
      await page.goto('/sign-in');
      await page.getByRole('heading', { level: 1 }).waitFor();
      const found = await violations('/sign-in');
      await signIn(page, 'lso');
      for (const path of pages) {
        await page.goto(path);
        await page.getByRole('heading', { level: 1 }).first().waitFor();
        await page.waitForLoadState('networkidle');
        found.push(...(await violations(path)));
      }
      expect(found).toEqual([]);
      expect(complaints).toEqual([]);
      await context.close();

      async function violations(path: string): Promise<string[]> {
        const { violations: broken } = await new AxeBuilder({ page }).withTags(TAGS).analyze();
        return broken.map(
          ({ id, nodes }) => `${path} ${id}: ${nodes.map((node) => node.html).join(' ')}`,
        );
      }
    },
    LONG_MS,
  );
});

it(
  'no page scrolls sideways on a phone, and each has one title',
  async () => {
    const { page, context } = await openPage(browser, { width: WIDTHS.phone });
    await signIn(page, 'lso');
    const wrong: string[] = [];
    for (const path of pages) {
      await page.goto(path);
      await page.getByRole('heading', { level: 1 }).first().waitFor();
      await page.waitForLoadState('networkidle');
      const { overflow, titles } = await page.evaluate(() => ({
        overflow: document.documentElement.scrollWidth - document.documentElement.clientWidth,
        titles: document.querySelectorAll('h1').length,
      }));
      if (overflow > 0) wrong.push(`${path} is ${overflow} px too wide`);
      if (titles !== 1) wrong.push(`${path} has ${titles} titles`);
    }
    expect(wrong).toEqual([]);
    await context.close();
  },
  LONG_MS,
);
