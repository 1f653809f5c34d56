import { describe, expect, it } from 'vitest';
import { readWaveformCsv } from '#shared/signal/csv/read-waveform-csv.ts';
import { encodeUtf8 } from '#shared/signal/csv/utf8.ts';
import { rowsOf, someSamples } from './csv-texts.ts';

const oneColumn = (lineEnd = '\n') => rowsOf(10, (i) => String(someSamples[i]), lineEnd);
const samplesOf = (text: string) => [...readWaveformCsv(text).channels[0]!.samples];

describe('readWaveformCsv, one column', () => {
  it('takes a bare column as samples and leaves rate and unit unsaid', () => {
    const csv = readWaveformCsv(oneColumn());
    expect([...csv.channels[0]!.samples]).toEqual(someSamples);
    expect(csv.channels[0]).toMatchObject({ name: 'column 1', unit: null, gapCount: 0 });
    expect(csv).toMatchObject({ sampleRateHz: null, sampleRateSource: null, rowCount: 10 });
    expect(csv).toMatchObject({ separator: null, decimalMark: '.', firstDataLine: 1 });
  });

  it.each([
    ['line feeds', '\n'],
    ['carriage return and line feed', '\r\n'],
    ['carriage returns alone', '\r'],
    ['doubled carriage returns, as some transfers make them', '\r\r\n'],
  ])('reads lines ended by %s', (_, lineEnd) => {
    expect(samplesOf(oneColumn(lineEnd))).toEqual(someSamples);
  });

  it('reads a last line without line end', () => {
    expect(samplesOf(oneColumn().trimEnd())).toEqual(someSamples);
  });

  it('passes over a byte order mark, blank lines at both ends and blanks around numbers', () => {
    const text = `\ufeff\n\n${rowsOf(10, (i) => `  ${someSamples[i]} `)}\n\n\n`;
    expect(samplesOf(text)).toEqual(someSamples);
  });

  it('reads bytes as it reads a text', () => {
    const csv = readWaveformCsv(encodeUtf8(`Beschleunigung [m/s²]\n${oneColumn()}`));
    expect(csv.channels[0]).toMatchObject({ name: 'Beschleunigung', unit: 'm/s²' });
  });

  it('reads decimal commas', () => {
    const csv = readWaveformCsv(oneColumn().replaceAll('.', ','));
    expect([...csv.channels[0]!.samples]).toEqual(someSamples);
    expect(csv.decimalMark).toBe(',');
  });

  it('reads decimal commas without a digit before them', () => {
    const text = rowsOf(10, (i) => (i % 2 === 0 ? ',5' : '-,25'));
    expect(samplesOf(text).slice(0, 2)).toEqual([0.5, -0.25]);
  });

  it('takes 1,234 as a decimal comma where the numbers bounce about and one is below 1', () => {
    const text = rowsOf(12, (i) => ['1,234', '0,512', '-2,771', '-0,900'][i % 4]!);
    expect(samplesOf(text).slice(0, 4)).toEqual([1.234, 0.512, -2.771, -0.9]);
  });

  it('takes 1,234 as two columns where the first rises evenly', () => {
    const csv = readWaveformCsv(
      rowsOf(12, (i) => `${i},${[234, 12, -771][i % 3]!}`),
      {
        sampleRateHz: 1000,
      },
    );
    expect(csv.separator).toBe(',');
    expect([...csv.channels[0]!.samples.slice(0, 3)]).toEqual([234, 12, -771]);
  });

  it('reads quoted numbers, decimal commas inside quotes included', () => {
    expect(samplesOf(rowsOf(10, (i) => `"${someSamples[i]}"`))).toEqual(someSamples);
    const commas = rowsOf(10, (i) => `"${String(someSamples[i]).replace('.', ',')}"`);
    expect(samplesOf(commas)).toEqual(someSamples);
  });

  it('keeps and counts blank and non-finite cells as gaps', () => {
    const cells = ['1.5', 'NaN', '2', '', '-inf', '3', '1.#QNAN', '4', '""', '5'];
    const { channels } = readWaveformCsv(rowsOf(10, (i) => cells[i]!));
    const nan = NaN;
    expect([...channels[0]!.samples]).toEqual([1.5, nan, 2, nan, nan, 3, nan, 4, nan, 5]);
    expect(channels[0]!.gapCount).toBe(5);
  });

  it('drops a separator at the end of every row', () => {
    const csv = readWaveformCsv(`acceleration [g],\n${rowsOf(10, (i) => `${someSamples[i]},`)}`);
    expect(csv.channels).toHaveLength(1);
    expect([...csv.channels[0]!.samples]).toEqual(someSamples);
  });

  it('counts lines as an editor does when naming the first row', () => {
    const text = `# asset: P-1\n\nacceleration [g]\n# point: 1H\n\n${oneColumn()}`;
    expect(readWaveformCsv(text).firstDataLine).toBe(6);
  });
});

describe('readWaveformCsv, several columns', () => {
  const seconds = (i: number) => (i / 1000).toFixed(3);

  it.each([
    ['a comma', ','],
    ['a comma and a blank', ', '],
    ['a semicolon', ';'],
    ['a tab', '\t'],
    ['blanks', '   '],
  ])('reads time and samples separated by %s', (_, between) => {
    const csv = readWaveformCsv(rowsOf(10, (i) => seconds(i) + between + someSamples[i]));
    expect([...csv.channels[0]!.samples]).toEqual(someSamples);
    expect(csv).toMatchObject({ sampleRateHz: 1000, sampleRateSource: 'time', startTimeS: 0 });
    expect(csv.separator).toBe(between === '   ' ? ' ' : between[0]);
  });

  it.each([
    ['semicolons', ';'],
    ['tabs', '\t'],
    ['blanks', '  '],
  ])('reads decimal commas between %s', (_, between) => {
    const row = (i: number) => `${seconds(i)}${between}${someSamples[i]}`.replaceAll('.', ',');
    const csv = readWaveformCsv(rowsOf(10, row));
    expect([...csv.channels[0]!.samples]).toEqual(someSamples);
    expect(csv).toMatchObject({ sampleRateHz: 1000, decimalMark: ',' });
  });

  it('makes one waveform of each further column, each with the unit of its header', () => {
    const header = 'time [s],1H acceleration [g],velocity (mm/s),shaft displacement [um]\n';
    const csv = readWaveformCsv(header + rowsOf(10, (i) => `${seconds(i)},${someSamples[i]},2,3`));
    expect(
      csv.channels.map(({ name, unit, quantity, columnIndex }) => ({
        name,
        unit,
        quantity,
        columnIndex,
      })),
    ).toEqual([
      { name: '1H acceleration', unit: 'g', quantity: 'acceleration', columnIndex: 1 },
      { name: 'velocity', unit: 'mm/s', quantity: 'velocity', columnIndex: 2 },
      { name: 'shaft displacement', unit: 'µm', quantity: 'displacement', columnIndex: 3 },
    ]);
  });

  it('reads headers with blanks in them where blanks separate', () => {
    const text = `Time [s]   Acc X [g]  Acc Y [g]\n${rowsOf(10, (i) => `${seconds(i)} 1.5 ${someSamples[i]}`)}`;
    expect(readWaveformCsv(text).channels.map((channel) => channel.name)).toEqual([
      'Acc X',
      'Acc Y',
    ]);
  });

  it('takes columns of samples without a time column where the header says so', () => {
    const text = `horizontal [mm/s];vertical [mm/s]\n${rowsOf(10, (i) => `${someSamples[i]};1`)}`;
    const csv = readWaveformCsv(text, { sampleRateHz: 5120 });
    expect(csv.channels).toHaveLength(2);
    expect(csv).toMatchObject({ sampleRateHz: 5120, sampleRateSource: 'told', startTimeS: null });
  });

  it('reads the time in the unit its header names', () => {
    const text = `Time (ms);acceleration [g]\n${rowsOf(10, (i) => `${i * 0.5};1`)}`;
    expect(readWaveformCsv(text)).toMatchObject({ sampleRateHz: 2000 });
  });

  it('passes over a running number and asks for the sampling rate', () => {
    const named = `sample,acceleration [g]\n${rowsOf(10, (i) => `${i},${someSamples[i]}`)}`;
    expect(readWaveformCsv(named)).toMatchObject({ sampleRateHz: null, startTimeS: null });
    const bare = rowsOf(10, (i) => `${i},${someSamples[i]}`);
    expect(readWaveformCsv(bare)).toMatchObject({ sampleRateHz: null, startTimeS: null });
    expect([...readWaveformCsv(bare).channels[0]!.samples]).toEqual(someSamples);
  });

  it('counts the gaps of each column by itself', () => {
    const row = (i: number) => `${seconds(i)},${i === 3 ? '' : 1},${i > 7 ? 'nan' : 2}`;
    const csv = readWaveformCsv(rowsOf(10, row));
    expect(csv.channels.map((channel) => channel.gapCount)).toEqual([1, 2]);
  });

  it('passes over blank lines between rows where the time goes on', () => {
    const text = rowsOf(10, (i) => `${seconds(i)},${someSamples[i]}${i === 4 ? '\n' : ''}`);
    expect([...readWaveformCsv(text).channels[0]!.samples]).toEqual(someSamples);
  });

  it('makes a row of gaps of a blank line where there is no time', () => {
    const text = `a [g],b [g]\n${rowsOf(10, (i) => `${someSamples[i]},1${i === 4 ? '\n' : ''}`)}`;
    expect(readWaveformCsv(text).channels.map((channel) => channel.gapCount)).toEqual([1, 1]);
  });
});

describe('readWaveformCsv, what the file says of itself', () => {
  it('reads all eight comment keys', () => {
    const text = [
      '# asset: P-101 A, cooling water',
      '#point: 2H',
      '# Taken_At: 2026-03-14T09:30:00+01:00',
      '# speed_rpm: 1480,5',
      '# sample_rate_hz: 25600',
      '# full_scale: 50',
      '# line_frequency_hz: 50',
      '# asset_kind: pump',
      '# recorder: serial 17',
      '# a remark',
      oneColumn(),
    ].join('\n');
    const csv = readWaveformCsv(text);
    expect(csv.comments).toEqual({
      asset: 'P-101 A, cooling water',
      point: '2H',
      takenAt: '2026-03-14T09:30:00+01:00',
      speedRpm: 1480.5,
      sampleRateHz: 25600,
      fullScale: 50,
      lineFrequencyHz: 50,
      assetKind: 'pump',
      other: [{ key: 'recorder', value: 'serial 17', line: 9 }],
    });
    expect(csv).toMatchObject({ sampleRateHz: 25600, sampleRateSource: 'comment' });
    expect(csv).toMatchObject({ speedRpm: 1480.5, speedSource: 'comment' });
  });

  it('reads comment lines a spreadsheet has quoted or padded to the width of the table', () => {
    const rows = rowsOf(10, (i) => `${(i / 1000).toFixed(3)},1,2`);
    const csv = readWaveformCsv(`"# asset: P-1, east",,\n# speed_rpm: 1480,,\n${rows}`);
    expect(csv.comments).toMatchObject({ asset: 'P-1, east', speedRpm: 1480 });
  });

  it('takes the same key twice with one value', () => {
    const csv = readWaveformCsv(`# speed_rpm: 1480\n# speed_rpm: 1480.0\n${oneColumn()}`);
    expect(csv.speedRpm).toBe(1480);
  });

  it('takes the noted rate exactly where the rounded times allow it, and theirs where not', () => {
    const row = (i: number) => `${(i / 25600).toFixed(6)},1`;
    const rounded = rowsOf(1000, row);
    expect(readWaveformCsv(`# sample_rate_hz: 25600.5\n${rounded}`).sampleRateHz).toBe(25600.5);
    const exact = rowsOf(1000, (i) => `${i / 25600},1`);
    expect(readWaveformCsv(`# sample_rate_hz: 25610\n${exact}`).sampleRateHz).toBe(25600);
  });
});

describe('readWaveformCsv, what a person says of it', () => {
  it('prefers the told rate and speed to the comment lines', () => {
    const text = `# sample_rate_hz: 1000\n# speed_rpm: 1480\n${oneColumn()}`;
    const csv = readWaveformCsv(text, { sampleRateHz: 2000, speedRpm: 2960 });
    expect(csv).toMatchObject({ sampleRateHz: 2000, sampleRateSource: 'told' });
    expect(csv).toMatchObject({ speedRpm: 2960, speedSource: 'told' });
  });

  it('gives the told unit to columns whose header names none', () => {
    const csv = readWaveformCsv(`vibration\n${oneColumn()}`, { unit: 'in/s' });
    expect(csv.channels[0]).toMatchObject({ unit: 'in/s', quantity: 'velocity' });
  });

  it('lets the mapping of a column win over its header', () => {
    const text = `clock;A [g];B [V]\n${rowsOf(10, (i) => `10:00:0${i};${someSamples[i]};7`)}`;
    const csv = readWaveformCsv(text, {
      columns: [
        { columnIndex: 0, role: 'ignore' },
        { columnIndex: 1, unit: 'mm/s', name: 'pump 1H' },
        { columnIndex: 2, role: 'ignore' },
      ],
      sampleRateHz: 1000,
    });
    expect(csv.channels).toHaveLength(1);
    expect(csv.channels[0]).toMatchObject({ name: 'pump 1H', unit: 'mm/s', columnIndex: 1 });
    expect([...csv.channels[0]!.samples]).toEqual(someSamples);
  });

  it('passes over an instrument’s preamble and ignores text without a header row', () => {
    const text = `Recorder 17\nDate;14.03.2026\n${rowsOf(10, (i) => `x${i};${someSamples[i]}`)}`;
    const csv = readWaveformCsv(text, {
      skipLines: 2,
      columns: [{ columnIndex: 0, role: 'ignore' }],
    });
    expect([...csv.channels[0]!.samples]).toEqual(someSamples);
    expect(csv.firstDataLine).toBe(3);
  });

  it('settles 1,234 by the told decimal mark or separator', () => {
    const text = rowsOf(10, (i) => `${i + 1},${500 + i}`);
    const comma = readWaveformCsv(text, { decimalMark: ',' });
    expect([...comma.channels[0]!.samples.slice(0, 2)]).toEqual([1.5, 2.501]);
    const cells = readWaveformCsv(text, { separator: ',' });
    expect([...cells.channels[0]!.samples.slice(0, 2)]).toEqual([500, 501]);
  });
});
