import { existsSync } from 'node:fs';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { demoPeople } from '../../../server/services/demo/demo-people';
import type { Role } from '../../../shared/api/roles';

/** Debian's Chromium. */
const executablePath = '/usr/bin/chromium';

/** Whether the browser is there; in CI a missing one is an error, because nothing may be skipped there. */
export function hasBrowser(): boolean {
  const found = existsSync(executablePath);
  if (!found && process.env.CI) throw new Error('chromium is missing, and in CI nothing may be skipped');
  return found;
}

export function launchBrowser(): Promise<Browser> {
  return chromium.launch({
    executablePath,
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
}

/** Everything a page did that it should not: errors, warnings, requests to other origins. */
export interface Trouble {
  readonly messages: string[];
}

export interface Visit {
  context: BrowserContext;
  page: Page;
  trouble: Trouble;
}

/** The browser logs an answer of 4xx as an error by itself; those are what such tests ask for. */
const expectedLog = /Failed to load resource: the server responded with a status of (4\d\d|503)|net::ERR_/;

export function watch(page: Page, origin: string): Trouble {
  const messages: string[] = [];
  page.on('console', (message) => {
    const bad = message.type() === 'error' || message.type() === 'warning';
    if (bad && !expectedLog.test(message.text())) messages.push(message.text());
  });
  page.on('pageerror', (error) => messages.push(error.message));
  page.on('request', (request) => {
    const url = request.url();
    if (!url.startsWith(origin) && !/^(data|blob):/.test(url)) messages.push(`left the origin: ${url}`);
  });
  return { messages };
}

export async function openPage(
  browser: Browser,
  origin: string,
  size: { width: number; height: number } = { width: 1440, height: 900 },
): Promise<Visit> {
  const context = await browser.newContext({ viewport: size, baseURL: origin });
  const page = await context.newPage();
  page.setDefaultTimeout(15_000);
  return { context, page, trouble: watch(page, origin) };
}

/** Signs in by typing, as the demonstration's person of a role. */
export async function signInAs(page: Page, role: Role): Promise<void> {
  const person = demoPeople.find((one) => one.role === role);
  if (!person) throw new Error(`no ${role} in the demonstration`);
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(person.email);
  await page.getByLabel('Password').fill(person.password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.waitForURL((url) => url.pathname !== '/sign-in');
}
