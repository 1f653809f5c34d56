import { describe, expect, it } from 'vitest';
import { folderOfFiles, runFretline } from './run-fretline.ts';

const rate = 1000;
const rows = (count: number, value: (i: number) => number) =>
  Array.from({ length: count }, (_, i) => value(i).toFixed(9)).join('\n');
const tone = (i: number) =>
  0.25 +
  3 * Math.sin((2 * Math.PI * 50 * i) / rate) +
  0.5 * Math.cos((2 * Math.PI * 120 * i) / rate);

const folder = folderOfFiles({
  'tone.csv': `# sample_rate_hz: ${rate}\nacceleration [g]\n${rows(2000, tone)}\n`,
  'bare.csv': `${rows(1000, tone)}\n`,
  'two.csv': `time [s],a [g],b [mm/s]\n${Array.from({ length: 500 }, (_, i) => `${(i / rate).toFixed(3)},${tone(i)},1`).join('\n')}\n`,
  'gap.csv': `# sample_rate_hz: ${rate}\nacceleration [g]\n${rows(100, tone)}\nNaN\n${rows(100, tone)}\n`,
});

interface Spectrum {
  frequencyHz: number[];
  amplitudePeak: number[];
}
const spectrumOf = async (...args: string[]) => {
  const { lines } = await runFretline(['spectrum', ...args], folder.path);
  return lines[0] as unknown as Spectrum;
};

describe('fretline spectrum', { timeout: 30_000 }, () => {
  it.each(['hann', 'none'])(
    'shows each tone with its peak value on its line, window %s',
    async (window) => {
      const { frequencyHz, amplitudePeak } = await spectrumOf('tone.csv', '--window', window);
      expect(frequencyHz).toHaveLength(1001);
      expect(frequencyHz.at(-1)).toBe(500);
      // Closed form: a tone on a line has its own amplitude there, whatever the window's gain.
      expect(amplitudePeak[frequencyHz.indexOf(50)]).toBeCloseTo(3, 6);
      expect(amplitudePeak[frequencyHz.indexOf(120)]).toBeCloseTo(0.5, 6);
      expect(amplitudePeak[frequencyHz.indexOf(200)]).toBeLessThan(1e-6);
      expect(amplitudePeak[0]).toBeCloseTo(0.25, 6);
    },
  );

  it('takes the Hann window where none is named, which spreads a tone over two lines beside it', async () => {
    const { frequencyHz, amplitudePeak } = await spectrumOf('tone.csv');
    expect(amplitudePeak[frequencyHz.indexOf(50.5)]).toBeCloseTo(1.5, 6);
  });

  it('prints one line a channel, the unit beside it', async () => {
    const { status, lines } = await runFretline(['spectrum', 'two.csv'], folder.path);
    expect(status).toBe(0);
    expect(lines.map(({ channel, unit }) => [channel, unit])).toEqual([
      ['a', 'g'],
      ['b', 'mm/s'],
    ]);
  });

  it('takes the told sampling rate where the file tells none', async () => {
    const { frequencyHz } = await spectrumOf('bare.csv', '--sample-rate-hz', '2000');
    expect(frequencyHz.at(-1)).toBe(1000);
    const { status, lines } = await runFretline(['spectrum', 'bare.csv'], folder.path);
    expect(status).toBe(1);
    expect(lines[0]).toMatchObject({ file: 'bare.csv', error: { code: 'sample-rate-missing' } });
  });

  it('refuses a record with gaps rather than showing what they make', async () => {
    const { status, lines } = await runFretline(['spectrum', 'gap.csv'], folder.path);
    expect(status).toBe(1);
    expect(lines[0]).toMatchObject({ channel: 'acceleration', error: { code: 'gaps' } });
  });

  it.each([
    ['no file', []],
    ['two files', ['tone.csv', 'bare.csv']],
    ['an unknown window', ['tone.csv', '--window', 'flat']],
  ])('refuses %s with a message on standard error and status 2', async (_, args) => {
    const { status, stdout, stderr } = await runFretline(['spectrum', ...args], folder.path);
    expect({ status, stdout }).toEqual({ status: 2, stdout: '' });
    expect(stderr).toMatch(/^fretline spectrum: .{10}/u);
  });
});
