import { chromium } from 'playwright-core';
import type { BrowserContextOptions, Page } from 'playwright-core';
import { afterAll, afterEach, expect } from 'vitest';

/** The two screens every page is made for. */
export const phone = { viewport: { width: 390, height: 844 }, hasTouch: true, isMobile: true };
export const desktop = { viewport: { width: 1440, height: 900 } };

export interface Browser {
  /**
   * Opens a page with cookies of its own. What its console reports as an error fails the test that runs, except
   * messages that match one of `expected` (a 404 that the test asks for, say).
   */
  page: (options?: BrowserContextOptions & { expected?: RegExp[] }) => Promise<Page>;
}

/**
 * Opens Debian's Chromium for one test file and closes it after the file's last test. Call it at the top level:
 * `const browser = await openBrowser();`. Console errors, uncaught exceptions and content that the pages' security
 * policy refused fail the test during which they were seen.
 */
export async function openBrowser(): Promise<Browser> {
  const problems: string[] = [];
  afterEach(() => {
    expect(problems.splice(0), 'errors in the browser').toEqual([]);
  });
  const browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
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
  afterAll(() => browser.close());
  return {
    page: async ({ expected = [], ...options } = {}) => {
      const context = await browser.newContext(options);
      await context.addInitScript(reportPolicyViolations);
      const page = await context.newPage();
      const note = (text: string) => {
        if (!expected.some((pattern) => pattern.test(text))) problems.push(text);
      };
      page.on('console', (message) => {
        if (message.type() === 'error') note(`${message.text()} (${message.location().url})`);
      });
      page.on('pageerror', (error) => note(`uncaught: ${error.message}`));
      return page;
    },
  };
}

// Runs in the page: a policy that only reports would otherwise go unseen.
function reportPolicyViolations() {
  document.addEventListener('securitypolicyviolation', ({ violatedDirective, blockedURI }) => {
    console.error(`refused by ${violatedDirective}: ${blockedURI}`);
  });
}
