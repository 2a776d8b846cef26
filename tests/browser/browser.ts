import { existsSync } from 'node:fs';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { test as base, inject } from 'vitest';
import type { DemoAccount } from '../support/product.ts';

const CHROMIUM = '/usr/bin/chromium';

export interface Visit {
  readonly context: BrowserContext;
  readonly page: Page;
}
export interface VisitOptions {
  readonly width?: number;
  readonly height?: number;
  readonly theme?: 'light' | 'dark';
  /** Signed in as this account from the start. */
  readonly as?: DemoAccount;
}
export interface Visiting {
  readonly baseUrl: string;
  readonly dataFolder: string;
  /** A browser window of its own, as one person's. */
  readonly visit: (options?: VisitOptions) => Promise<Visit>;
  /** Signs in through the page, as people do. */
  readonly signIn: (
    page: Page,
    account: Pick<DemoAccount, 'name' | 'email' | 'password'>,
  ) => Promise<void>;
  /** The first demo account with this role or name. */
  readonly account: (roleOrName: string) => DemoAccount;
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

type Kept = Awaited<ReturnType<BrowserContext['storageState']>>;
/** Signing in once is enough for a whole file. */
const keptSessions = new Map<string, Kept>();

/** A browser test: windows are closed at its end, and faults on the way fail it. */
export const test = base.extend<{ visiting: Visiting }>({
  visiting: async ({ task }, use) => {
    const baseUrl = inject('baseUrl');
    const accounts = inject('demoAccounts');
    const opened: BrowserContext[] = [];
    const faults: string[] = [];
    const own = await openBrowser();

    const watch = (page: Page): void => {
      page.on('pageerror', (error) => faults.push(`script error: ${error.message}`));
      page.on('console', (message) => {
        // A refused request is part of many a story; a part of a page that broke is not.
        const isAnswer = message.text().startsWith('Failed to load resource');
        if (message.type() === 'error' && !isAnswer) faults.push(`console: ${message.text()}`);
      });
      page.on('request', (request) => {
        const url = new URL(request.url());
        const isOwn = url.origin === baseUrl || ['data:', 'blob:'].includes(url.protocol);
        if (!isOwn) faults.push(`request to ${url.origin}`);
      });
    };
    const signIn: Visiting['signIn'] = async (page, account) => {
      await page.goto('/sign-in');
      await page.getByLabel('E-mail address').fill(account.email);
      await page.getByLabel(/^Password/).fill(account.password);
      await page.getByRole('button', { name: 'Sign in' }).click();
      await page.getByRole('link', { name: account.name }).waitFor();
    };
    const visit: Visiting['visit'] = async ({
      width = 1280,
      height = 900,
      theme = 'light',
      as: account,
    } = {}) => {
      const storageState = account && keptSessions.get(account.email);
      const context = await own.newContext({
        baseURL: baseUrl,
        viewport: { width, height },
        colorScheme: theme,
        locale: 'en-GB',
        timezoneId: 'Europe/London',
        reducedMotion: 'reduce',
        ...(storageState ? { storageState } : {}),
      });
      opened.push(context);
      context.on('page', watch);
      await context.exposeFunction('tellRefused', (what: string) => faults.push(what));
      await context.addInitScript(() => {
        document.addEventListener('securitypolicyviolation', (event) => {
          const { tellRefused } = window as unknown as { tellRefused: (what: string) => void };
          tellRefused(
            `${location.pathname}: the policy refused ${event.blockedURI} (${event.violatedDirective}) from ${event.sourceFile}:${event.lineNumber}`,
          );
        });
      });
      const page = await context.newPage();
      if (account && !storageState) {
        await signIn(page, account);
        keptSessions.set(account.email, await context.storageState());
      }
      return { context, page };
    };

    await use({
      baseUrl,
      dataFolder: inject('dataFolder'),
      faults,
      signIn,
      visit,
      account: (roleOrName) => {
        const found = accounts.find(({ role, name }) => role === roleOrName || name === roleOrName);
        if (!found) throw new Error(`The demo has no ${roleOrName}.`);
        return found;
      },
    });
    const { SHOTS: shots } = process.env;
    if (shots !== undefined && task.result?.state === 'fail') {
      // Where each window stood when the test failed, for whoever asks for it.
      for (const [index, page] of opened.flatMap((context) => context.pages()).entries()) {
        await page.screenshot({ path: `${shots}/failed-${index}.png`, fullPage: true });
      }
    }
    for (const context of opened) await context.close();
    if (faults.length > 0) {
      throw new Error(`Faults in the browser in “${task.name}”:\n${faults.join('\n')}`);
    }
  },
});
