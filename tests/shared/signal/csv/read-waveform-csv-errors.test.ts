import { describe, expect, it } from 'vitest';
import { maxColumns, maxLineBytes } from '#shared/signal/csv/csv-limits.ts';
import { encodeUtf8 } from '#shared/signal/csv/utf8.ts';
import { faultOf, rowsOf, someSamples } from './csv-texts.ts';

const good = rowsOf(10, (i) => String(someSamples[i]));
const timed = (row: (i: number) => string) => rowsOf(12, row);

/** Good rows with one of them replaced; the header is line 1, so row i is on line i + 2. */
const withRow = (index: number, row: string) =>
  `acceleration [g]\n${rowsOf(10, (i) => (i === index ? row : String(someSamples[i])))}`;
const withTimedRow = (index: number, row: string) =>
  `time [s],a [g]\n${timed((i) => (i === index ? row : `${(i / 1000).toFixed(3)},1.5`))}`;

describe('readWaveformCsv refuses a file without samples', () => {
  it.each([
    ['an empty file', '', 'empty-file', null],
    ['blank lines only', '\n \n\r\n', 'empty-file', null],
    ['a byte order mark only', '\ufeff', 'empty-file', null],
    ['comments only', '# asset: P-1\n# a remark\n', 'no-data', null],
    ['a remark without a key only', '# a remark\n', 'no-data', null],
    ['a header only', '# asset: P-1\nacceleration [g]\n', 'no-data', 2],
    ['two samples', '1.5\n2.5\n', 'too-few-samples', 2],
    ['gaps only', rowsOf(10, () => 'NaN'), 'only-gaps', null],
  ])('%s', (_, text, code, line) => {
    expect(faultOf(text)).toMatchObject({ code, line });
  });
});

describe('readWaveformCsv refuses what is not UTF-8 text', () => {
  const utf16 = (text: string, low: 0 | 1) => {
    const bytes = new Uint8Array(text.length * 2);
    for (let i = 0; i < text.length; i += 1) bytes[2 * i + low] = text.charCodeAt(i);
    return bytes;
  };

  it.each([
    ['UTF-16 with a mark, low byte first', Uint8Array.of(0xff, 0xfe, ...utf16(good, 0))],
    ['UTF-16 with a mark, high byte first', Uint8Array.of(0xfe, 0xff, ...utf16(good, 1))],
    ['UTF-16 without a mark, low byte first', utf16(good, 0)],
    ['UTF-16 without a mark, high byte first', utf16(good, 1)],
  ])('%s', (_, bytes) => {
    expect(faultOf(bytes)).toMatchObject({ code: 'utf-16', line: 1 });
    expect(faultOf(bytes).message).toContain('UTF-8');
  });

  it.each([
    ['a ZIP archive or an Excel workbook', [0x50, 0x4b, 3, 4]],
    ['a PDF', [0x25, 0x50, 0x44, 0x46]],
    ['a gzip archive', [0x1f, 0x8b]],
  ])('%s, by name', (what, signature) => {
    const fault = faultOf(Uint8Array.of(...signature, 1, 2, 3));
    expect(fault).toMatchObject({ code: 'binary', line: 1 });
    expect(fault.message).toContain(what);
  });

  it('a control character in the head, with its line', () => {
    expect(faultOf(withRow(3, '1.\u00005'))).toMatchObject({ code: 'binary', line: 5 });
  });

  it('a control character far behind the head, with its line', () => {
    const text = rowsOf(20_000, (i) => (i === 19_998 ? '1\u0007' : '0.25'));
    expect(faultOf(text)).toMatchObject({ code: 'binary', line: 19_999 });
  });

  it('a header in an old code page', () => {
    const bytes = encodeUtf8(`displacement [?m]\n${good}`);
    bytes[bytes.indexOf(63)] = 0xb5;
    expect(faultOf(bytes)).toMatchObject({ code: 'not-utf-8', line: 1 });
  });
});

describe('readWaveformCsv refuses a cell that is no number', () => {
  it.each([
    ['a word', 'abc', 'not-a-number'],
    ['a number with its unit', '1.5 g', 'not-a-number'],
    ['a hexadecimal number', '0x10', 'not-a-number'],
    ['half an exponent', '1e', 'not-a-number'],
    ['a typographic minus', '−1.5', 'not-a-number'],
    ['a date', '2026-03-14', 'not-a-number'],
    ['a not-breaking blank inside', '1\u00a0234', 'not-a-number'],
    ['a second header row', 'g', 'not-a-number'],
    ['an absurd number', '1e308', 'number-out-of-range'],
    ['an absurd negative number', '-2e12', 'number-out-of-range'],
    ['a number too large for a double', '1e400', 'number-out-of-range'],
    ['thousands and decimals', '1,234.5', 'mixed-decimal-marks'],
    ['thousands and a decimal comma', '1.234,5', 'mixed-decimal-marks'],
    ['two points', '1.2.3', 'mixed-decimal-marks'],
    ['an open quote', '"1.5', 'unclosed-quote'],
    ['text behind a quote', '"1.5"2', 'unclosed-quote'],
    ['a comment', '# a remark', 'comment-after-data'],
  ])('%s', (_, cell, code) => {
    const separatorTold = { separator: ';' as const };
    const fault = faultOf(withRow(6, cell), separatorTold);
    expect(fault).toMatchObject({ code, line: 8 });
    expect(fault.message).toMatch(/expected/u);
  });

  it('shows the cell it found, cut short where it is long', () => {
    expect(faultOf(withRow(6, 'abc')).message).toContain('“abc”');
    expect(faultOf(withRow(6, 'x'.repeat(500))).message.length).toBeLessThan(300);
  });

  it('in the first row, between text and numbers', () => {
    const text = `0.000,oops\n${timed((i) => `${((i + 1) / 1000).toFixed(3)},1.5`)}`;
    expect(faultOf(text)).toMatchObject({ code: 'not-a-number', line: 1 });
  });

  it('a decimal comma in a file with decimal points, and the other way round', () => {
    const points = rowsOf(10, (i) => `0.00${i};${i === 7 ? '1,5' : '1.5'}`);
    expect(faultOf(points)).toMatchObject({ code: 'mixed-decimal-marks', line: 8 });
    const commas = rowsOf(10, (i) => `0,00${i};${i === 7 ? '1.5' : '1,5'}`);
    expect(faultOf(commas)).toMatchObject({ code: 'mixed-decimal-marks', line: 8 });
  });

  it('a quoted decimal comma where commas separate', () => {
    const text = rowsOf(10, (i) => `0.00${i},"1,5"`);
    expect(faultOf(text)).toMatchObject({ code: 'mixed-decimal-marks', line: 1 });
  });
});

describe('readWaveformCsv refuses commas it can’t tell', () => {
  it('thousands that could be decimals', () => {
    const text = rowsOf(10, (i) => String(['1,234', '2,250', '-1,999', '12,345'][i % 4]));
    expect(faultOf(text)).toMatchObject({ code: 'ambiguous-comma', line: 1 });
  });

  it('a torn row in a column of whole numbers', () => {
    const text = rowsOf(40, (i) => (i === 20 ? '7,8' : String(100 + i)));
    expect(faultOf(text)).toMatchObject({ code: 'ambiguous-comma' });
  });

  it('a row cut short in two columns of whole numbers', () => {
    const text = rowsOf(40, (i) => (i === 20 ? '20' : `${i},${(i * 37) % 11}`));
    expect(faultOf(text)).toMatchObject({ code: 'mixed-columns', line: 21 });
  });
});

describe('readWaveformCsv refuses rows of different width', () => {
  it.each([
    ['a cell too many', '0.005,1.5,2.5'],
    ['a cell too few', '0.005'],
  ])('%s', (_, row) => {
    expect(faultOf(withTimedRow(5, row))).toMatchObject({ code: 'mixed-columns', line: 7 });
  });

  it('a value in the blank column behind a last separator', () => {
    const text = rowsOf(20_000, (i) => `${(i / 1000).toFixed(3)},1.5,${i === 15_000 ? '2' : ''}`);
    expect(faultOf(text)).toMatchObject({ code: 'mixed-columns', line: 15_001 });
  });

  it('a header that names another number of columns, on the line of the first row', () => {
    const text = `# asset: P-1\ntime [s],a [g],b [g]\n${timed((i) => `0.00${i},1.5`)}`;
    expect(faultOf(text)).toMatchObject({ code: 'header-mismatch', line: 3 });
  });

  it('decimal commas between commas, with the reason', () => {
    const text = `time [s],a [g]\n${timed((i) => `0,00${i},1,5`)}`;
    expect(faultOf(text).code).toBe('header-mismatch');
    const bare = faultOf(timed((i) => (i === 5 ? '0,005,1,5' : `0.00${i},1.5`)));
    expect(bare).toMatchObject({ code: 'mixed-columns', line: 6 });
    expect(bare.message).toContain('decimal comma');
  });

  it('a file in which every second line is blank', () => {
    const text = rowsOf(10, (i) => `${someSamples[i]}\n`);
    expect(faultOf(text)).toMatchObject({ code: 'blank-lines', line: 2 });
  });
});

describe('readWaveformCsv refuses a time column that is not one', () => {
  it.each([
    ['a step of half as much again', '0.0055,1.5', 'time-not-uniform', 7],
    ['a jump backwards', '0.0035,1.5', 'time-not-rising', 7],
    ['a repeated time', '0.004,1.5', 'time-not-rising', 7],
    ['a blank time', ',1.5', 'time-missing', 7],
    ['a time that is not a number', 'nan,1.5', 'time-missing', 7],
    ['an infinite time', '1e400,1.5', 'number-out-of-range', 7],
  ])('%s', (_, row, code, line) => {
    expect(faultOf(withTimedRow(5, row))).toMatchObject({ code, line });
  });

  it('a missing row, on the line behind the gap', () => {
    const text = rowsOf(2000, (i) => `${((i < 700 ? i : i + 1) / 25600).toFixed(7)},1`);
    expect(faultOf(text)).toMatchObject({ code: 'time-not-uniform', line: 701 });
  });

  it('a missing row far behind the first rows of a long file', () => {
    const text = rowsOf(150_000, (i) => `${((i < 140_000 ? i : i + 1) / 25600).toFixed(7)},1`);
    expect(faultOf(text)).toMatchObject({ code: 'time-not-uniform', line: 140_001 });
  });

  it('times in no unit that make an impossibly slow rate', () => {
    const text = rowsOf(12, (i) => `${(i * 0.39).toFixed(2)};1`);
    expect(faultOf(text)).toMatchObject({ code: 'implausible-rate', line: null });
  });

  it('two time columns', () => {
    const text = `time [s],a [g],time [s],b [g]\n${timed((i) => `0.00${i},1,0.00${i},1`)}`;
    expect(faultOf(text)).toMatchObject({ code: 'contradictory-header', line: 1 });
  });
});

describe('readWaveformCsv refuses contradictions', () => {
  it.each([
    [
      'a key twice with two values',
      '# speed_rpm: 1480\n# speed_rpm: 1490\n',
      'contradictory-comments',
      2,
    ],
    ['a text twice with two values', '# asset: A\n#\n# asset: B\n', 'contradictory-comments', 3],
    ['a time in no unit of time', 'time [m];a [g]\n', 'contradictory-header', 1],
    ['a bracket left open', 'time [ms;a [g]\n', 'contradictory-header', 1],
    ['a quantity in another one’s unit', 'velocity [g]\n', 'contradictory-header', 1],
  ])('%s', (_, head, code, line) => {
    const rows = head.includes(';') ? timed((i) => `${i};1`) : good;
    expect(faultOf(head + rows)).toMatchObject({ code, line });
  });

  it('a noted rate against the time column, on the line of the comment', () => {
    const text = `# asset: P-1\n# sample_rate_hz: 25600\n${withTimedRow(-1, '')}`;
    expect(faultOf(text)).toMatchObject({ code: 'contradictory-rate', line: 2 });
  });

  it('a told rate against the time column', () => {
    const fault = faultOf(withTimedRow(-1, ''), { sampleRateHz: 512 });
    expect(fault).toMatchObject({ code: 'contradictory-rate', line: null });
  });

  it('a told unit against the header', () => {
    expect(faultOf(`a [mm/s]\n${good}`, { unit: 'g' })).toMatchObject({
      code: 'contradictory-unit',
      line: 1,
    });
    expect(faultOf(`velocity\n${good}`, { unit: 'g' })).toMatchObject({
      code: 'contradictory-unit',
      line: 1,
    });
  });
});

describe('readWaveformCsv refuses comment values that can’t be', () => {
  it.each([
    'speed_rpm: 0',
    'speed_rpm: -1480',
    'speed_rpm: fast',
    'speed_rpm: 1480 r/min',
    'speed_rpm: 1,480',
    'speed_rpm: 1e308',
    'speed_rpm:',
    'sample_rate_hz: 0',
    'sample_rate_hz: -25600',
    'sample_rate_hz: NaN',
    'sample_rate_hz: Infinity',
    'full_scale: -50',
    'line_frequency_hz: 5000',
    'taken_at: yesterday',
    'taken_at: 14.03.2026',
    'taken_at: 2026-02-30',
    'taken_at: 2026-03-14T25:00:00Z',
    'asset:',
    `point: ${'x'.repeat(201)}`,
  ])('# %s', (comment) => {
    expect(faultOf(`# asset_kind: pump\n# ${comment}\n${good}`)).toMatchObject({
      code: 'bad-comment',
      line: 2,
    });
  });
});

describe('readWaveformCsv refuses files made to exhaust it', () => {
  it('one endless line', () => {
    const fault = faultOf(`1.5\n2.5\n${'3'.repeat(maxLineBytes * 3)}`);
    expect(fault).toMatchObject({ code: 'line-too-long', line: 3 });
  });

  it('one endless line of cells behind good rows', () => {
    const fault = faultOf(`${good}${'1,'.repeat(maxLineBytes)}\n`);
    expect(fault).toMatchObject({ code: 'line-too-long', line: 11 });
  });

  it('a header cell of thousands of characters', () => {
    expect(faultOf(`${'x'.repeat(5000)}\n${good}`)).toMatchObject({
      code: 'line-too-long',
      line: 1,
    });
  });

  it('too many columns', () => {
    const row = Array.from({ length: maxColumns + 1 }, () => '1').join(';');
    expect(faultOf(rowsOf(10, () => row))).toMatchObject({ code: 'too-many-columns', line: 1 });
    expect(
      faultOf(
        rowsOf(10, () => '0.1;1;2;3'),
        { maxChannels: 2 },
      ).code,
    ).toBe('too-many-columns');
  });

  it('more rows than allowed, on the line that is too many', () => {
    const fault = faultOf(`a [g]\n${rowsOf(200, () => '1.5')}`, { maxRows: 100 });
    expect(fault).toMatchObject({ code: 'too-many-rows', line: 102 });
  });

  it('comments without end', () => {
    expect(faultOf(rowsOf(5000, (i) => `# remark ${i}`) + good).code).toBe('too-many-comments');
  });

  it('quotes that never close', () => {
    expect(faultOf(`"${rowsOf(5000, () => '1,2')}`)).toMatchObject({
      code: 'unclosed-quote',
      line: 1,
    });
  });
});

describe('readWaveformCsv refuses options that can’t be', () => {
  it.each([
    ['a rate of zero', { sampleRateHz: 0 }],
    ['a negative rate', { sampleRateHz: -1 }],
    ['a rate that is not a number', { sampleRateHz: NaN }],
    ['a negative speed', { speedRpm: -1480 }],
    ['an infinite speed', { speedRpm: Infinity }],
    ['the comma for both marks', { separator: ',' as const, decimalMark: ',' as const }],
    ['a column the file has not', { columns: [{ columnIndex: 3, role: 'samples' as const }] }],
    ['half a line to pass over', { skipLines: 0.5 }],
  ])('%s', (_, options) => {
    expect(faultOf(good, options)).toMatchObject({ code: 'bad-option', line: null });
  });

  it('a mapping that leaves no samples', () => {
    const fault = faultOf(good, { columns: [{ columnIndex: 0, role: 'ignore' }] });
    expect(fault.code).toBe('no-data');
  });
});
