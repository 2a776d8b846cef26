import { existsSync } from 'node:fs';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { test as base, inject } from 'vitest';
import type { DemoAccount } from '../support/product.ts';

const CHROMIUM = '/usr/bin/chromium';

export interface Visit {
  readonly context: BrowserContext;
  readonly page: Page;
}
export interface Visiting {
  readonly baseUrl: string;
  /** A browser window of its own, as one person's. */
  readonly visit: (options?: {
    width?: number;
    height?: number;
    theme?: 'light' | 'dark';
  }) => Promise<Visit>;
  /** Signs in through the page, as people do. */
  readonly signIn: (page: Page, account: DemoAccount) => Promise<void>;
  /** A demo account with this role. */
  readonly account: (role: string, which?: number) => DemoAccount;
  /** What went wrong in any window: script errors, refused content, requests to other hosts. */
  readonly faults: string[];
}

let browser: Promise<Browser> | null = null;
function openBrowser(): Promise<Browser> {
  if (!existsSync(CHROMIUM)) throw new Error(`${CHROMIUM} is missing: npm test installs it.`);
  browser ??= chromium.launch({
    executablePath: CHROMIUM,
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
  return browser;
}

/** A browser test: windows are closed at its end, and faults on the way fail it. */
export const test = base.extend<{ visiting: Visiting }>({
  visiting: async ({}, use) => {
    const baseUrl = inject('baseUrl');
    const accounts = inject('demoAccounts');
    const opened: BrowserContext[] = [];
    const faults: string[] = [];
    const own = await openBrowser();
    await use({
      baseUrl,
      faults,
      account: (role, which = 0) => {
        const found = accounts.filter((account) => account.role === role)[which];
        if (!found) throw new Error(`The demo has no ${role} number ${String(which)}.`);
        return found;
      },
      visit: async ({ width = 1280, height = 900, theme = 'light' } = {}) => {
        const context = await own.newContext({
          baseURL: baseUrl,
          viewport: { width, height },
          colorScheme: theme,
          locale: 'en-GB',
          timezoneId: 'Europe/London',
          reducedMotion: 'reduce',
        });
        opened.push(context);
        const page = await context.newPage();
        page.on('pageerror', (error) => faults.push(`script error: ${error.message}`));
        page.on('console', (message) => {
          const text = message.text();
          if (message.type() === 'error' && /content security policy/i.test(text))
            faults.push(text);
        });
        page.on('request', (request) => {
          const url = new URL(request.url());
          const own = url.origin === baseUrl || ['data:', 'blob:'].includes(url.protocol);
          if (!own) faults.push(`request to ${url.origin}`);
        });
        return { context, page };
      },
      signIn: async (page, account) => {
        await page.goto('/sign-in');
        await page.getByLabel('E-mail').fill(account.email);
        await page.getByLabel('Password').fill(account.password);
        await page.getByRole('button', { name: 'Sign in' }).click();
        await page.getByRole('link', { name: account.name }).waitFor();
      },
    });
    for (const context of opened) await context.close();
    if (faults.length > 0) throw new Error(`Faults in the browser:\n${faults.join('\n')}`);
  },
});
