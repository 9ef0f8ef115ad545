import { execFileSync } from 'node:child_process';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { DEMO_PASSWORD, launchBrowser, openPage, signIn } from './support/browser';

let browser: Browser;
beforeAll(async () => {
  browser = await launchBrowser();
});
afterAll(() => browser.close());

/** User story 1 of the job: 532 nm, 10 W CW, 1 mm (1/e²), 1 mrad. */
async function fillStoryOneLaser(page: Page, serial: string): Promise<void> {
  await page.getByLabel('Maker', { exact: false }).first().fill('Quenlorn');
  await page.getByLabel('Model').fill('QG-10');
  await page.getByLabel('Serial').fill(serial);
  await page.getByLabel('Class declared by the maker').selectOption({ label: 'Class 4' });
  await page.getByRole('textbox', { name: 'Wavelength' }).fill('532 nm');
  await page.getByRole('textbox', { name: 'Power, maximum' }).fill('10 W');
  await page.getByRole('textbox', { name: /^Diameter/ }).fill('1 mm');
  await page.getByRole('textbox', { name: /^Divergence/ }).fill('1 mrad');
}

async function save(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Save the laser' }).click();
  await page.waitForURL(/\/lasers\/(?!new)[\w-]+$/);
}

describe('from a data sheet to a sealed evaluation', () => {
  let evaluationUrl = '';
  let report = '';

  it('a supervisor registers the laser, evaluates it and sends it to check', async () => {
    const { page, context, complaints } = await openPage(browser);
    await signIn(page, 'supervisor');
    await page.goto('/lasers/new');
    await fillStoryOneLaser(page, 'QG10-0417');
    await choose(page, 'Area', 'B-203');
    await page.getByRole('complementary', { name: 'Preview' }).getByText(/km/).first().waitFor();
    await save(page);

    await page.getByRole('button', { name: 'Evaluate' }).click();
    await page.waitForURL(/\/evaluations\/[\w-]+/);
    evaluationUrl = new URL(page.url()).pathname;
    await page.getByText('Eye hazard distance').first().waitFor();
    for (const activity of ['Maintenance', 'Service']) {
      const why = page.getByLabel(activity, { exact: true });
      if (await why.count()) await why.fill('Done by the maker on its own premises.');
    }
    await page.getByText('Saved').first().waitFor();
    await page.getByRole('button', { name: 'Send to check' }).click();
    await page.getByText('In check').first().waitFor();
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('the laser safety officer confirms the check, signs and prints', async () => {
    const { page, context, complaints } = await openPage(browser);
    await signIn(page, 'lso');
    await page.goto(evaluationUrl);
    for (const [act, state] of [
      ['Confirm the check', 'Checked'],
      ['Sign and seal', 'Signed'],
    ] as const) {
      await page.getByLabel('Your password, to show you are here').fill(DEMO_PASSWORD);
      await page.getByRole('button', { name: act, exact: true }).last().click();
      await page.getByText(state, { exact: true }).first().waitFor();
    }
    const href = await page.getByRole('link', { name: 'Print' }).getAttribute('href');
    const answer = await context.request.get(href!);
    expect(answer.status()).toBe(200);
    report = execFileSync('pdftotext', ['-layout', '-', '-'], {
      input: await answer.body(),
      encoding: 'utf8',
    });
    expect(complaints).toEqual([]);
    await context.close();
  });

  it('the print names rule set, limits, who signed what and when, and the hash', () => {
    // Eye limit 25.4 W/m² at 0.25 s: C_A·18·t^0.75 of every current rule set, rounded down.
    expect(report).toMatch(/25\.4/);
    expect(report).toMatch(/Leif Arnmarken/);
    expect(report).toMatch(/Ilse Brandmoor/);
    expect(report).toMatch(/[0-9a-f]{16}/);
    expect(report).toMatch(/2006\/25\/EC|IEC 60825-1:2014/);
    expect(report).toMatch(/page 1 of \d/i);
    expect(report).not.toMatch(/DRAFT|OUTDATED/);
  });

  it('its author could not sign it, and an operator is offered nothing', async () => {
    for (const part of ['supervisor', 'operator'] as const) {
      const { page, context } = await openPage(browser);
      await signIn(page, part);
      await page.goto(evaluationUrl);
      await page.getByRole('heading', { level: 1 }).waitFor();
      expect(await page.getByRole('button', { name: 'Sign and seal' }).count(), part).toBe(0);
      await context.close();
    }
  });
});

it('the whole way from registration to a draft works by keyboard alone', async () => {
  const { page, context } = await openPage(browser);
  await signInByKeyboard(page);
  await page.goto('/lasers/new');
  await typeInto(page, 'Maker', 'Quenlorn');
  await typeInto(page, 'Model', 'QG-1');
  await typeInto(page, 'Wavelength', '532 nm');
  await typeInto(page, 'Power, maximum', '50 mW');
  await typeInto(page, 'Diameter', '1 mm');
  await typeInto(page, 'Divergence', '1 mrad');
  await typeInto(page, 'Area', 'B-203');
  await page.getByRole('option', { name: /B-203/ }).waitFor();
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Enter');
  await tabTo(page, 'Save the laser');
  await page.keyboard.press('Enter');
  await page.waitForURL(/\/lasers\/(?!new)[\w-]+$/);
  await tabTo(page, 'Evaluate');
  await page.keyboard.press('Enter');
  await page.waitForURL(/\/evaluations\/[\w-]+/);
  await page.getByText('Eye hazard distance').first().waitFor();
  await context.close();
});

/** Picks a record in a search field: types, takes the first suggestion. */
async function choose(page: Page, label: string, words: string): Promise<void> {
  const field = page.getByRole('combobox', { name: new RegExp(`^${label}`) });
  await field.fill(words);
  await page
    .getByRole('option', { name: new RegExp(words) })
    .first()
    .click();
}

async function signInByKeyboard(page: Page): Promise<void> {
  await page.goto('/sign-in');
  await tabTo(page, 'E-mail');
  await page.keyboard.type('leif.arnmarken@halvermere.example');
  await tabTo(page, 'Password');
  await page.keyboard.type(DEMO_PASSWORD);
  await page.keyboard.press('Enter');
  await page.getByRole('navigation', { name: 'Main' }).waitFor();
}

async function typeInto(page: Page, label: string, text: string): Promise<void> {
  await tabTo(page, label);
  await page.keyboard.press('Control+A');
  await page.keyboard.type(text);
}

/** Presses Tab until the focused element bears the name; every stop must be visible. */
async function tabTo(page: Page, name: string): Promise<void> {
  for (let stops = 0; stops < 150; stops += 1) {
    await page.keyboard.press('Tab');
    const stop = await page.evaluate(() => {
      const element = document.activeElement as HTMLElement | null;
      if (!element) return { name: '', visible: true };
      const label =
        (element as HTMLInputElement).labels?.[0]?.textContent ??
        element.getAttribute('aria-label') ??
        element.textContent ??
        '';
      const { width, height } = element.getBoundingClientRect();
      return { name: label.trim(), visible: width > 0 && height > 0 };
    });
    if (stop.name.startsWith(name)) return;
  }
  throw new Error(`No Tab stop is named "${name}".`);
}
