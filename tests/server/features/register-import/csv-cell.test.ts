import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { guard, unguard } from '#server/csv/formula-guard.ts';
import { readCell, writeCell } from '#server/features/register-import/csv-cell.ts';
import { columnsOf, type Column } from '#server/features/register-import/import-columns.ts';

const columnOf = (key: string): Column => {
  const found = [...columnsOf.machines, ...columnsOf.positions].find((one) => one.key === key);
  if (found === undefined) throw new Error(`There is no column ${key}.`);
  return found;
};
const name = columnOf('name');
const power = columnOf('powerKw');
const stop = columnOf('nextPlannedStopOn');
const kind = columnOf('kind');
const split = columnOf('splitHousing');
const valueOf = (column: Column, raw: string, decimalComma = false) => {
  const read = readCell(column, raw, decimalComma);
  return 'value' in read ? read.value : `wrong: ${read.fault.reason}`;
};

describe('the guard against formulas', () => {
  it.each(['=1+1', '+49 30', '-P-101', '@SUM(A1)', '\tx', '\rx', "'=1+1", "''-x", '＝1+1'])(
    'puts an apostrophe before %j and takes it away again',
    (text) => {
      expect(guard(text)).toBe(`'${text}`);
      expect(unguard(guard(text))).toBe(text);
    },
  );

  it.each(['P-101', "'s-Hertogenbosch", "don't", '6" pipe', 'a=b', ''])(
    'leaves %j as it is',
    (text) => {
      expect(guard(text)).toBe(text);
      expect(unguard(text)).toBe(text);
    },
  );

  it('gives every text back, and never lets one begin as a formula', () => {
    const nasty = fc.string({
      unit: fc.constantFrom("'", '=', '+', '-', '@', '\t', 'a', '"', ' '),
    });
    fc.assert(
      fc.property(fc.oneof(nasty, fc.string({ unit: 'binary' })), (text) => {
        expect(unguard(guard(text))).toBe(text);
        expect(guard(text)).not.toMatch(/^[=+\-@\t\r]/);
      }),
    );
  });

  it('leaves negative numbers of number columns numbers', () => {
    expect(writeCell(columnOf('shaftC'), -12.5)).toBe('-12.5');
    expect(writeCell(name, '-12.5')).toBe("'-12.5");
  });
});

describe('reading a cell', () => {
  it.each([
    ['12.5', false, 12.5],
    ['12,5', true, 12.5],
    ['1e3', false, 1000],
    ['-0.5', false, -0.5],
  ])('takes %s (decimal comma: %s) for %d', (raw, decimalComma, value) => {
    expect(valueOf(power, raw, decimalComma)).toBe(value);
  });

  it.each([
    ['30 kW', false],
    ['1,480.5', false],
    ['0x10', false],
    ['1.480', true],
    ['1.480,5', true],
    ['12,5', false],
    ['NaN', false],
    ['1e999', false],
  ])('refuses %s (decimal comma: %s) as a number', (raw, decimalComma) => {
    expect(valueOf(power, raw, decimalComma)).toMatch(/^wrong: "/);
  });

  it('takes days in two unmistakable spellings and no others', () => {
    expect(valueOf(stop, '2026-05-04')).toBe('2026-05-04');
    expect(valueOf(stop, '4.5.2026')).toBe('2026-05-04');
    expect(valueOf(stop, '05/04/2026')).toMatch(/^wrong/);
    expect(valueOf(stop, '2026-02-30')).toMatch(/^wrong/);
  });

  it('takes words and yes or no whatever their case, and an empty cell for nothing', () => {
    expect(valueOf(kind, 'PUMP')).toBe('pump');
    expect(valueOf(columnOf('seatTaper'), '01:12')).toBe('1:12');
    expect(valueOf(kind, 'pumpe')).toMatch(/^wrong/);
    expect([valueOf(split, 'TRUE'), valueOf(split, 'no')]).toEqual([true, false]);
    expect(valueOf(power, '  ')).toBeNull();
  });
});
