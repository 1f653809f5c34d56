import { describe, expect, it } from 'vitest';
import { decodeCsv } from '#server/features/register-import/decode-csv.ts';
import { openTable, readRows, type RawRow } from '#server/features/register-import/read-table.ts';
import { importLimits } from '#shared/contracts/register-import.ts';

const utf16 = (text: string, bigEndian = false) => {
  const bytes = Buffer.from(text, 'utf16le');
  return bigEndian ? bytes.swap16() : bytes;
};

describe('the encoding of a file', () => {
  const text = 'tag,name\nP-1,Pumpe für Öl – groß\n';
  it.each([
    ['UTF-8', Buffer.from(text), 'UTF-8'],
    ['UTF-8 with a byte order mark', Buffer.from(`\uFEFF${text}`), 'UTF-8'],
    ['UTF-16 little endian', utf16(`\uFEFF${text}`), 'UTF-16'],
    ['UTF-16 big endian', utf16(`\uFEFF${text}`, true), 'UTF-16'],
    ['UTF-16 without a mark', utf16(text), 'UTF-16'],
  ])('is found out: %s', (_name, bytes, encoding) => {
    expect(decodeCsv(bytes)).toEqual({ text, encoding });
  });

  it('is Windows-1252 where it is no UTF-8', () => {
    const latin1 = Buffer.from('tag,name\nP-1,Lüfter', 'latin1');
    expect(decodeCsv(latin1)).toEqual({ text: 'tag,name\nP-1,Lüfter', encoding: 'Windows-1252' });
  });

  it.each([
    ['a workbook', Buffer.from([0x50, 0x4b, 3, 4, 20, 0, 6, 0]), /workbook/],
    ['an empty file', Buffer.alloc(0), /empty/],
    ['an image', Buffer.from([0x89, 0x50, 0x4e, 0x47, 0, 0, 0, 13, 0]), /not text/],
  ])('of %s is refused by name', (_name, bytes, message) => {
    expect(() => decodeCsv(bytes)).toThrow(message);
  });
});

async function rowsOf(text: string): Promise<RawRow[]> {
  const table = await openTable(text, 'machines');
  const all: RawRow[] = [];
  await readRows(table, (rows) => {
    all.push(...rows);
  });
  return all;
}

describe('the table of a file', () => {
  it.each([
    ['comma', ','],
    ['semicolon', ';'],
    ['tab', '\t'],
  ])('is read with a %s between its cells', async (separator, sign) => {
    const text = `tag${sign}name${sign}power [kW]\nP-1${sign}"A; b, c\tand ""d"""${sign}5\n`;
    expect(await openTable(text, 'machines')).toMatchObject({ separator, rowCount: 1 });
    expect(await rowsOf(text)).toEqual([{ rowNumber: 2, cells: ['P-1', 'A; b, c\tand "d"', '5'] }]);
  });

  it('counts rows as a spreadsheet does: line ends inside a cell and empty rows', async () => {
    const rows = await rowsOf('tag,name\r\nP-1,"two\nlines"\r\n,\r\n\r\nP-2,x\r\n');
    expect(rows.map(({ rowNumber }) => rowNumber)).toEqual([2, 5]);
    expect(rows[0]?.cells[1]).toBe('two\nlines');
  });

  it('reads the same rows when they cross the pieces it is read in', async () => {
    const names = Array.from({ length: 9000 }, (_, i) => `Pump "${i}"\nof, the "plant"`);
    const quoted = names.map((name, i) => `P-${i},"${name.replaceAll('"', '""')}"`);
    const rows = await rowsOf(`tag,name\n${quoted.join('\n')}`);
    expect(rows.map(({ cells }) => cells[1])).toEqual(names);
  });

  it('sees a decimal comma only where commas do not part the cells', async () => {
    const semicolons = await openTable('tag;power [kW]\nP-1;7,5', 'machines');
    const commas = await openTable('tag,power [kW]\nP-1,"7,5"', 'machines');
    expect([semicolons.decimalComma, commas.decimalComma]).toEqual([true, false]);
  });

  it.each([
    ['a missing column', 'name\nx', 'Missing columns: "tag"'],
    ['an unknown column', 'tag,colour\nP-1,red', 'Unknown columns: "colour"'],
    ['a column that stands twice', 'tag,name,Tag\nP-1,a,b', 'stand twice: "Tag"'],
    ['a separator that is none', 'tag|name\nP-1|a', 'Missing columns: "tag"'],
    ['no rows', 'tag,name\n', 'no rows below'],
    ['an open quotation mark', 'tag,name\nP-1,a\nP-2,"open\nP-3,b', 'Row 3: a quotation mark'],
  ])('is refused for %s, by name', async (_name, text, message) => {
    await expect(openTable(text, 'machines')).rejects.toThrow(message);
  });

  it('is refused when it has more rows than are taken', async () => {
    const text = `tag\n${'P\n'.repeat(importLimits.rowsMax + 1)}`;
    await expect(openTable(text, 'machines')).rejects.toMatchObject({ code: 'too_large' });
  });
});
