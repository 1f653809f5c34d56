import { describe, expect, it } from 'vitest';
import { readWaveformCsv } from '#shared/signal/csv/read-waveform-csv.ts';
import { faultOf, rowsOf } from './csv-texts.ts';

const count = 16_384;
const fileOf = (time: (i: number) => string, rows = count) => rowsOf(rows, (i) => `${time(i)},1.5`);
const rateOf = (text: string) => readWaveformCsv(text).sampleRateHz;

/** Even in (-1, 1), the same in every run. */
function jitter(i: number): number {
  const x = Math.sin(i * 12.9898) * 43758.5453;
  return 2 * (x - Math.floor(x)) - 1;
}

describe('the sampling rate of a time column', () => {
  it.each([
    [
      'six decimals at 25.6 kHz, whose rounding alone is more than 1 % of a step',
      (i: number) => (i / 25600).toFixed(6),
      25600,
    ],
    ['five decimals at 12.8 kHz', (i: number) => (i / 12800).toFixed(5), 12800],
    [
      'six significant digits, as a spreadsheet prints them',
      (i: number) => String(Number((i / 25600).toPrecision(6))),
      25600,
    ],
    ['powers of ten with seven digits', (i: number) => (i / 51200).toExponential(6), 51200],
    ['all digits', (i: number) => String(i / 48000), 48000],
    ['a start far from zero', (i: number) => (1000 + i / 10240).toFixed(7), 10240],
    [
      'seconds since 1970, to the microsecond',
      (i: number) => (1_773_480_600 + i / 2048).toFixed(6),
      2048,
    ],
    ['a start before zero', (i: number) => ((i - 8000) / 65536).toFixed(9), 65536],
  ])('is found exactly from %s', (_, time, rate) => {
    expect(rateOf(fileOf(time))).toBe(rate);
  });

  it('is found to 1e-7 where it is no whole number', () => {
    const rate = 48_828.125;
    const found = rateOf(fileOf((i) => (i / rate).toFixed(6)))!;
    expect(Math.abs(found / rate - 1)).toBeLessThan(1e-7);
  });

  it('is the mean one where the clock jitters by less than 1 % of a step', () => {
    const found = rateOf(fileOf((i) => ((i + 0.004 * jitter(i)) / 5000).toFixed(10)))!;
    expect(Math.abs(found / 5000 - 1)).toBeLessThan(1e-6);
  });

  it('is read from steps that vary by less than 1 % and add up', () => {
    let time = 0;
    const found = rateOf(
      fileOf((i) => {
        const text = time.toFixed(10);
        time += (1 + 0.008 * jitter(i)) / 5000;
        return text;
      }),
    )!;
    expect(Math.abs(found / 5000 - 1)).toBeLessThan(1e-3);
  });

  it.each([
    ['jitters by 3 % of a step', (i: number) => ((i + 0.03 * jitter(i)) / 5000).toFixed(10)],
    [
      'jitters by a third of a step, as five decimals can just show',
      (i: number) => ((i + 0.3 * jitter(i)) / 12800).toFixed(5),
    ],
    [
      'drifts by 3 % from end to end',
      (i: number) => ((i * (1 + (0.015 * i) / count)) / 5000).toFixed(10),
    ],
    [
      'changes its step half way',
      (i: number) => (Math.min(i, 8000) / 5000 + Math.max(0, i - 8000) / 4800).toFixed(9),
    ],
  ])('is refused where the clock %s', (_, time) => {
    expect(faultOf(fileOf(time))).toMatchObject({ code: 'time-not-uniform' });
  });

  it('is refused for one time 2 % off, also where that is two units of the last digit', () => {
    const text = fileOf((i) => (i / 10_000 + (i === 9000 ? 2e-6 : 0)).toFixed(6));
    expect(faultOf(text)).toMatchObject({ code: 'time-not-uniform', line: 9001 });
  });

  it('is refused with advice where the times are too coarse to tell it', () => {
    const fault = faultOf(fileOf((i) => (i / 25600).toFixed(4)));
    expect(fault).toMatchObject({ code: 'time-not-rising', line: 2 });
    expect(fault.message).toContain('more decimals');
  });

  it('is found across blocks of a long file as within one', () => {
    const text = fileOf((i) => (i / 25600).toFixed(6), 200_000);
    expect(rateOf(text)).toBe(25600);
  });
});
