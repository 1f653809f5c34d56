import { fileURLToPath } from 'node:url';
import type { Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { openPage, useBrowser } from './support/browser.ts';
import { useDemoProduct, type DemoProduct } from './support/demo-product.ts';

/** Made outside the product, see survey-files/make_survey_files.py: a loose pump, sound machines, dialects, one broken. */
const surveyFiles = [
  'P-101_M-DE_H.csv',
  'P-102_M-DE_H.csv',
  'P-201_P-NDE_H.csv',
  'F-302_F-DE_H.csv',
  'P-101_P-DE_H.csv',
].map((name) => fileURLToPath(new URL(`survey-files/${name}`, import.meta.url)));

const product = useDemoProduct();
const browser = useBrowser();

async function signIn(page: Page, { account }: DemoProduct, role: string): Promise<void> {
  const { email, password } = account(role);
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).first().click();
}

const inDays = (days: number) =>
  new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10);

describe('the main job', () => {
  it('leads from a survey’s files to a closed inspection, each step by the role that may', async () => {
    const demo = product();

    // The analyst takes a survey in.
    const analyst = await openPage(browser());
    let { page } = analyst;
    await page.goto(demo.url);
    await signIn(page, demo, 'Analyst');
    await page.getByRole('link', { name: 'New survey' }).first().click();
    await page.getByLabel('Route', { exact: true }).selectOption({ label: 'Monthly walk, mill' });
    await page.getByLabel('Date of the walk').fill(inDays(0));
    await page
      .getByRole('button', { name: /Start|survey/i })
      .last()
      .click();
    await page.waitForURL(/\/surveys\/\d+$/);
    await page.locator('input[type=file]').first().setInputFiles(surveyFiles);
    const list = page.getByRole('list', { name: 'Files' });
    await list.getByText(/White-water pump.*matched by its comment lines/).waitFor();
    // The broken file says which line and why before anything is sent; the others go on.
    await list.getByText(/1208/).first().waitFor();
    await page.getByRole('button', { name: 'Send 4 files' }).click();
    const table = page.getByRole('region', { name: /points/i });
    await table.getByText('Looseness likely').waitFor({ timeout: 60_000 });
    await page
      .getByText(/No looseness signs/)
      .nth(2)
      .waitFor({ timeout: 60_000 });
    expect(await page.getByText('56 points without a waveform').count()).toBe(1);

    // And reviews its flags with the keyboard.
    await page.getByRole('link', { name: /Review \d+ flag/ }).click();
    await page.getByRole('heading', { name: 'Evidence' }).waitFor();
    await page.getByText('Speaks for looseness').waitFor();
    await page.keyboard.press('a');
    await page
      .getByText(/Finding \d+ is open/)
      .first()
      .waitFor();
    await analyst.close();

    // The lead opens the finding with its fits and assigns the inspection.
    const lead = await openPage(browser());
    ({ page } = lead);
    await page.goto(demo.url);
    await signIn(page, demo, 'Reliability lead');
    await page.getByRole('link', { name: /P-201/ }).first().click();
    await page.getByRole('heading', { name: 'Which seat can explain it' }).waitFor();
    await page.getByText(/The housing seat of .* explains the finding best/).waitFor();
    await page.getByRole('button', { name: 'Assign inspection' }).click();
    const dialog = page.getByRole('dialog');
    await dialog.getByLabel('Due').fill(inDays(14));
    await dialog.getByLabel(/Work order/).fill('WO 51170');
    await dialog.getByRole('button', { name: 'Assign and send the e-mail' }).click();
    await page.getByText('Inspecting').first().waitFor();

    // The e-mail arrives once, with the link to the inspection.
    await page.goto(`${demo.url}/demo/mailbox`);
    const mails = page.getByRole('list', { name: 'Mails received' });
    const about = mails.getByRole('button', { name: /Fit inspection of P-201/ });
    await about.first().waitFor({ timeout: 20_000 });
    expect(await about.count()).toBe(1);
    await about.click();
    const link = page.getByRole('link', { name: /\/inspections\/\d+/ }).first();
    const address = (await link.getAttribute('href')) ?? '';
    expect(address).toMatch(/\/sites\/\d+\/inspections\/\d+$/);
    await lead.close();

    // The owner follows the link on a phone, signs in, reads the cautions, measures and reports.
    const owner = await openPage(browser(), { width: 390, height: 844 });
    ({ page } = owner);
    await page.goto(new URL(address, demo.url).href);
    await signIn(page, demo, 'Asset owner');
    await page.getByRole('button', { name: 'Accept this inspection' }).click();
    await page.getByLabel('I have read the cautions and will work by them.').check();
    for (const directionDeg of [0, 45, 90, 135]) {
      for (const plane of [1, 2]) {
        await page
          .getByLabel(new RegExp(`^Housing bore.*plane ${plane}, ${directionDeg}°$`))
          .first()
          .fill('140.078');
      }
    }
    for (const condition of await page.getByLabel('Condition').all()) {
      await condition.selectOption('fretting corrosion');
    }
    await page.getByLabel('Work done').fill('Housing bore sleeved and bored to H7; new bearing.');
    await page.getByLabel('The fit was put right').check();
    await page.getByRole('radio', { name: /^Loose/ }).check();
    await page.getByRole('button', { name: 'Report', exact: true }).click();
    await page.getByText('Reported').first().waitFor();
    await owner.close();

    // The lead closes it.
    const closing = await openPage(browser());
    ({ page } = closing);
    await page.goto(new URL(address, demo.url).href);
    await signIn(page, demo, 'Reliability lead');
    await page.getByRole('button', { name: 'Close inspection' }).click();
    await page
      .getByRole('dialog')
      .getByRole('button', { name: /Close inspection/ })
      .click();
    await page.getByText('Closed').first().waitFor();
    await page
      .getByRole('main')
      .getByRole('link', { name: /finding/i })
      .first()
      .click();
    await page.getByRole('main').getByText('Repaired').first().waitFor();
    await closing.close();
  });
});
