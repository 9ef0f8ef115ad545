import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, inject, it } from 'vitest';
import { launchBrowser, openPage, signIn } from './support/browser';

let browser: Browser;
beforeAll(async () => {
  browser = await launchBrowser();
});
afterAll(() => browser.close());

it('a CSV with bad rows is refused row by row, stores nothing, and is taken once corrected', async () => {
  const { page, context, complaints } = await openPage(browser);
  await signIn(page, 'lso');
  await page.goto('/lasers/import');
  const template = await context.request.get(`${inject('baseUrl')}/api/laser-imports/template.csv`);
  const [header, example] = (await template.text()).trim().split(/\r?\n/);
  const columns = header!.split(',');
  const row = (cells: Record<string, string>) =>
    columns
      .map((column, index) => cells[column] ?? keep(column, example!.split(',')[index]!))
      .join(',');
  const keep = (column: string, cell: string) => (['tag', 'serial'].includes(column) ? '' : cell);
  const wavelength = columns.find((column) => column.startsWith('wavelength'))!;
  const good = row({ tag: 'CSV-1', serial: 'CSV-0001' });
  const bad = row({
    tag: 'CSV-2',
    serial: 'CSV-0002',
    [wavelength]: 'IR',
    declared_class: 'IIIb/4',
  });
  const before = await countOf();

  await upload([header!, good, bad]);
  await page.getByRole('heading', { name: /Errors in 1 row/ }).waitFor();
  const errors = page.getByRole('region', { name: 'Errors' });
  await errors.getByRole('cell', { name: 'IIIb/4', exact: true }).waitFor();
  expect(await errors.getByRole('rowheader', { name: '3' }).count()).toBeGreaterThan(0);
  expect(await page.getByRole('button', { name: /^Save/ }).count()).toBe(0);
  expect(await countOf()).toBe(before);

  await page.getByRole('button', { name: 'Read another file' }).click();
  await upload([header!, good]);
  await page.getByRole('button', { name: /^Save 1 laser/ }).click();
  await page.getByRole('link', { name: 'To the list of lasers' }).waitFor();
  expect(await countOf()).toBe(before + 1);
  expect(complaints).toEqual([]);
  await context.close();

  async function upload(lines: readonly string[]): Promise<void> {
    await page.getByLabel('CSV file').setInputFiles({
      name: 'lasers.csv',
      mimeType: 'text/csv',
      buffer: Buffer.from(`${lines.join('\r\n')}\r\n`),
    });
  }

  async function countOf(): Promise<number> {
    const answer = await context.request.get(`${inject('baseUrl')}/api/lasers?limit=1`);
    return ((await answer.json()) as { total: number }).total;
  }
});
