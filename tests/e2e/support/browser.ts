import { chromium, type Browser, type Page } from 'playwright-core';
import { afterAll, beforeAll, expect } from 'vitest';
import { findProgram } from '#server/cli/setup/debian.mjs';

/** Debian's Chromium for a file of tests. */
export function useBrowser(): () => Browser {
  let browser: Browser | undefined;
  beforeAll(async () => {
    const executablePath = findProgram('chromium');
    if (executablePath === null)
      throw new Error('Chromium is not installed; npm test installs it.');
    browser = await chromium.launch({ executablePath, args: ['--no-sandbox'] });
  });
  afterAll(() => browser?.close());
  return () => {
    if (browser === undefined) throw new Error('The browser is not open yet.');
    return browser;
  };
}

/** Messages a page may print to the console: a refused request is an answer, not a fault. */
const expectedMessages = [/Failed to load resource: the server responded with a status of 4\d\d/];

/** A page of its own session; whatever it complains about in the console fails the test at its end. */
export async function openPage(
  browser: Browser,
  options: { width?: number; height?: number; theme?: 'light' | 'dark' } = {},
): Promise<{ page: Page; close: () => Promise<void> }> {
  const { width = 1280, height = 800, theme = 'light' } = options;
  const context = await browser.newContext({ viewport: { width, height }, colorScheme: theme });
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on('pageerror', (error) => complaints.push(error.message));
  page.on('console', (message) => {
    if (message.type() !== 'error' && message.type() !== 'warning') return;
    if (!expectedMessages.some((expected) => expected.test(message.text()))) {
      complaints.push(message.text());
    }
  });
  return {
    page,
    close: async () => {
      await context.close();
      expect(complaints).toEqual([]);
    },
  };
}
