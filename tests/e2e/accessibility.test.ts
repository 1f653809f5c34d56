import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { AxeResults } from 'axe-core';
import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { openPage, useBrowser } from './support/browser.ts';
import { useDemoProduct } from './support/demo-product.ts';

const product = useDemoProduct();
const browser = useBrowser();
const axeSource = readFileSync(
  createRequire(import.meta.url).resolve('axe-core/axe.min.js'),
  'utf8',
);

/** Every page of each role that a plant without surveys has; the address below the site. */
const pages: Readonly<Record<string, readonly string[]>> = {
  Analyst: [
    '/surveys',
    '/surveys/new',
    '/review',
    '/findings',
    '/inspections',
    '/outcomes',
    '/routes/1',
  ],
  'Reliability lead': [
    '/machines',
    '/machines/new',
    '/machines/import',
    '/machines/1',
    '/machines/1/edit',
    '/machines/1/positions/1/seats/shaft',
    '/routes/new',
    '/desk',
    '/mails',
    '/webhook',
    '/outcomes',
    '/limits',
  ],
  'Asset owner': [
    '/inspections',
    '/machines',
    '/findings',
    '/fit-workbench?designation=6312&shaftClass=k5&housingClass=H7&innerLoad=rotating&outerLoad=stationary',
  ],
};

/** Axe runs from its source: the page's security policy lets no script tag in. */
async function violationsOf(page: Page): Promise<string[]> {
  await page.evaluate(axeSource);
  const results = await page.evaluate(() =>
    (window as unknown as { axe: { run: () => Promise<AxeResults> } }).axe.run(),
  );
  return results.violations.flatMap(({ id, nodes }) =>
    nodes.map((node) => `${id}: ${node.target.join(' ')}`),
  );
}

describe.each(['light', 'dark'] as const)('every page, %s', (theme) => {
  it('has nothing that axe objects to, signed out', async () => {
    const { page, close } = await openPage(browser(), { theme });
    for (const address of ['/sign-in', '/demo/mailbox', '/unsubscribe/nonsense', '/no-such-page']) {
      await page.goto(product().url + address);
      await page.getByRole('heading', { level: 1 }).first().waitFor();
      expect(await violationsOf(page), address).toEqual([]);
    }
    await close();
  });

  it.each(Object.keys(pages))('has nothing that axe objects to: %s', async (role) => {
    const { url, account } = product();
    const { page, close } = await openPage(browser(), { theme });
    const { email, password } = account(role);
    await page.context().request.post(`${url}/api/session`, { data: { email, password } });
    await page.goto(url);
    await page.waitForURL(/\/sites\/\d+\//);
    const site = /\/sites\/\d+/.exec(page.url())?.[0] ?? '';
    for (const address of pages[role] ?? []) {
      // Ids of the demo's machines and routes begin where the database lets them.
      await page.goto(url + site + (await realAddress(page, url + site, address)));
      await page.getByRole('heading', { level: 1 }).first().waitFor();
      expect(await violationsOf(page), address).toEqual([]);
    }
    for (const address of ['/method', '/account']) {
      await page.goto(url + address);
      await page.getByRole('heading', { level: 1 }).first().waitFor();
      expect(await violationsOf(page), address).toEqual([]);
    }
    await close();
  });
});

/** Puts the own ids of the first machine, its first position or the first route in the place of 1. */
async function realAddress(page: Page, site: string, address: string): Promise<string> {
  const match = /^\/(machines|routes)\/1(\/|$)/.exec(address);
  if (match === null) return address;
  const api = site.replace('/sites/', '/api/sites/');
  const answer = await page.context().request.get(`${api}/${match[1]}`);
  const { items } = (await answer.json()) as { items: { id: number }[] };
  const id = items[0]?.id ?? 0;
  const real = address.replace('/1', `/${id}`);
  if (!real.includes('/positions/1/')) return real;
  const machine = await page.context().request.get(`${api}/machines/${id}`);
  const { positions } = (await machine.json()) as { positions: { id: number }[] };
  return real.replace('/positions/1/', `/positions/${positions[0]?.id ?? 0}/`);
}
