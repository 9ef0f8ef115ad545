import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { inject } from 'vitest';

export const DEMO_PASSWORD = 'threshold-and-door';

/** The people of the demo institute who act in the journeys. */
export const PEOPLE = {
  lso: { name: 'Ilse Brandmoor', email: 'ilse.brandmoor@halvermere.example' },
  deputy: { name: 'Kofi Asantewell', email: 'kofi.asantewell@halvermere.example' },
  supervisor: { name: 'Leif Arnmarken', email: 'leif.arnmarken@halvermere.example' },
  operator: { name: 'Noor Hadiqani', email: 'noor.hadiqani@halvermere.example' },
  auditor: { name: 'Hanae Morishiba', email: 'hanae.morishiba@halvermere.example' },
  administrator: { name: 'Teodor Lindqvarn', email: 'teodor.lindqvarn@halvermere.example' },
} as const;
export type Part = keyof typeof PEOPLE;

export function launchBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
}

export interface Visit {
  readonly context: BrowserContext;
  readonly page: Page;
  /** What went wrong in the page: console errors, uncaught errors, refused content. */
  readonly complaints: string[];
}

export const WIDTHS = { desktop: 1440, tablet: 1024, phone: 390 } as const;

export async function openPage(
  browser: Browser,
  {
    width = WIDTHS.desktop,
    colorScheme = 'light',
  }: { width?: number; colorScheme?: 'light' | 'dark' } = {},
): Promise<Visit> {
  const context = await browser.newContext({
    baseURL: inject('baseUrl'),
    viewport: { width, height: width < 600 ? 844 : 900 },
    colorScheme,
    acceptDownloads: true,
    reducedMotion: 'reduce',
  });
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on('pageerror', (error) => complaints.push(`uncaught: ${error.message}`));
  page.on('console', (message) => {
    // A refused request is the point of some journeys and reported by the browser as an error.
    const expected = /status of (401|403|404|409|412)/.test(message.text());
    if (message.type() === 'error' && !expected) complaints.push(message.text());
  });
  return { context, page, complaints };
}

/** Signs in through the form, as a person does. */
export async function signIn(page: Page, part: Part): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(PEOPLE[part].email);
  await page.getByLabel('Password', { exact: true }).fill(DEMO_PASSWORD);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.waitForURL((url) => url.pathname !== '/sign-in');
}
