/** How fast the review desk is in Chromium, printed beside what is wanted: `npm run bench:client`. */
import { gzipSync } from 'node:zlib';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { findProgram } from '#server/cli/setup/debian.mjs';
import { frameRates, noteDrawing, timeToPlots } from './client-page.ts';
import { startClientPlant, type ClientPlant } from './client-plant.ts';

const rounds = 9;
const viewport = { width: 1280, height: 800 };

const median = (values: readonly number[]) =>
  [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? Number.NaN;

function print(what: string, found: string, wanted: string, isMet: boolean): void {
  process.stdout.write(
    `${what.padEnd(52)}${found.padStart(12)}   wanted ${wanted.padEnd(10)}${isMet ? 'met' : 'NOT MET'}\n`,
  );
}

const printMs = (what: string, values: readonly number[], belowMs: number) => {
  const middle = median(values);
  print(what, `${middle.toFixed(0)} ms`, `< ${belowMs} ms`, middle < belowMs);
};

async function signedIn(browser: Browser, plant: ClientPlant): Promise<BrowserContext> {
  const context = await browser.newContext({ viewport, baseURL: plant.url });
  const { email, password } = plant;
  const answer = await context.request.post('/api/session', { data: { email, password } });
  if (!answer.ok()) throw new Error(`Signing in was answered by ${answer.status()}.`);
  // tsx names inner functions by a helper of its own, which a page doesn't have.
  await context.addInitScript({ content: 'globalThis.__name = (named) => named;' });
  await context.addInitScript(noteDrawing);
  return context;
}

async function openDesk(context: BrowserContext, plant: ClientPlant): Promise<Page> {
  const page = await context.newPage();
  await page.goto(`/sites/${plant.siteId}/review`);
  await page.getByRole('application', { name: /^Waveform/ }).waitFor();
  await page.waitForLoadState('networkidle');
  return page;
}

/** Script that a page loads at first, gzip, kB. */
async function scriptKb(context: BrowserContext, path: string): Promise<number> {
  const page = await context.newPage();
  const sizes: Promise<number>[] = [];
  page.on('response', (response) => {
    if (response.request().resourceType() !== 'script') return;
    sizes.push(response.body().then((body) => gzipSync(body).length));
  });
  await page.goto(path);
  await page.waitForLoadState('networkidle');
  const all = await Promise.all(sizes);
  await page.close();
  return all.reduce((sum, size) => sum + size, 0) / 1000;
}

async function bench(browser: Browser, plant: ClientPlant): Promise<void> {
  const nobody = await browser.newContext({ viewport, baseURL: plant.url });
  const signInKb = await scriptKb(nobody, '/sign-in');
  print(
    'First load of the sign-in page, script gzip',
    `${signInKb.toFixed(0)} kB`,
    '< 250 kB',
    signInKb < 250,
  );
  const context = await signedIn(browser, plant);
  const deskKb = await scriptKb(context, `/sites/${plant.siteId}/review`);
  print(
    'First load of the review desk, script gzip',
    `${deskKb.toFixed(0)} kB`,
    '< 400 kB',
    deskKb < 400,
  );

  const clicks: number[] = [];
  // The first round warms the server and is not counted.
  for (let round = 0; round <= rounds; round += 1) {
    // A page of its own each time: nothing is in its cache but the first flags.
    const page = await openDesk(context, plant);
    const tookMs = await timeToPlots(page, 4 + (round % 5));
    if (round > 0) clicks.push(tookMs);
    await page.close();
  }
  printMs('Click on a flag to both plots drawn, median', clicks, 150);

  const page = await openDesk(context, plant);
  const keys: number[] = [];
  for (let step = 0; step < 8; step += 1) {
    // As long as anybody needs to judge a flag, and the next one is there.
    await page.waitForLoadState('networkidle');
    await page.waitForTimeout(500);
    keys.push(await timeToPlots(page, null));
  }
  printMs('Next flag by key to both plots drawn, median', keys, 80);

  await page.goto(`/sites/${plant.siteId}/review`);
  const long = page.getByText(/65537 lines in sight/);
  const flags = page.getByRole('list', { name: 'Queue' }).getByRole('button');
  await flags.first().waitFor();
  for (let place = 0; place < (await flags.count()); place += 1) {
    await flags.nth(place).click();
    await page.waitForTimeout(500);
    if ((await long.count()) > 0) break;
  }
  await long.waitFor({ timeout: 5000 });
  for (const what of ['cursor', 'zoom'] as const) {
    const { framesPerS, slowFrameMs } = await frameRates(page, what);
    const found = `${framesPerS.toFixed(1)}/s`;
    const label = `Frames with moving ${what}, 65 537 lines (5 % over ${slowFrameMs.toFixed(0)} ms)`;
    // A browser's own clock gives 60 give or take a half.
    print(label, found, '60/s', framesPerS > 59);
  }
}

const executablePath = findProgram('chromium');
if (executablePath === null) throw new Error('Chromium is not installed; npm test installs it.');
const plant = await startClientPlant();
const browser = await chromium.launch({ executablePath, args: ['--no-sandbox'] });
try {
  await bench(browser, plant);
} finally {
  await browser.close();
  await plant.stop();
}
