import { readFile } from 'node:fs/promises';
import { describe, expect, it } from 'vitest';
import { openPage, useBrowser } from './support/browser.ts';
import { useDemoProduct } from './support/demo-product.ts';

const product = useDemoProduct();
const browser = useBrowser();

describe('a register kept in a spreadsheet', () => {
  it('is exported, changed, checked in a dry run, written and taken back', async () => {
    const { url, account } = product();
    const { email, password } = account('Reliability lead');
    const { page, close } = await openPage(browser());
    await page.context().request.post(`${url}/api/session`, { data: { email, password } });
    await page.goto(url);
    await page.getByRole('link', { name: 'Machines' }).click();
    await page.getByRole('link', { name: 'Import and export' }).click();

    const saving = page.waitForEvent('download');
    await page.getByRole('button', { name: 'Machines' }).click();
    const exported = await readFile(await (await saving).path(), 'utf8');
    const [header = '', ...machines] = exported.trim().split('\r\n');
    const commas = ','.repeat(header.split(',').length - 3);
    // The export itself would change nothing.
    const send = (name: string, text: string) =>
      page
        .getByLabel('Machines file: files')
        .setInputFiles({ name, mimeType: 'text/csv', buffer: Buffer.from(text) });
    await send('same.csv', exported);
    await page.getByText('Nothing to write: every row is the same as the register.').waitFor();

    // A wrong row keeps all of them out, and says what to mend.
    await page.getByRole('link', { name: 'Another file' }).click();
    await send('wrong.csv', `${exported}Z-900,Spare pump,pmp${commas}\r\n`);
    await page.getByText('1 row wrong: nothing can be written yet.').waitFor();
    await page.getByLabel('Fate').selectOption({ label: 'Wrong (1)' });
    await page.getByText('"pmp" is not known here.').waitFor();

    await page.getByRole('link', { name: 'Another file' }).click();
    await send('right.csv', `${exported}Z-900,Spare pump,pump${commas}\r\n`);
    await page.getByRole('button', { name: 'Write 1 row to the register' }).click();
    await page.getByText('1 row written to the register.', { exact: true }).waitFor();
    const tags = async () => {
      const site = /\/sites\/\d+/.exec(page.url())?.[0] ?? '';
      const list = await page.context().request.get(`${url}/api${site}/machines?pageSize=200`);
      return ((await list.json()) as { items: { tag: string }[] }).items.map(({ tag }) => tag);
    };
    expect(await tags()).toHaveLength(machines.length + 1);
    expect(await tags()).toContain('Z-900');

    await page.getByRole('button', { name: 'Undo this import' }).click();
    await page.getByRole('button', { name: 'Undo the import' }).click();
    await page.getByText('The register is as it was before the import.').first().waitFor();
    expect(await tags()).not.toContain('Z-900');
    await close();
  });
});
