import { describe, expect, it } from 'vitest';
import { countLevels } from '#shared/signal/converter-levels.ts';
import { screenWaveform } from '#shared/signal/screen-waveform.ts';
import { tones, whiteNoise } from './test-signals.ts';

const noise = whiteNoise(8192, 3);
const running = tones([{ frequencyHz: 25, amplitude: 4 }], 2048, 8192).map(
  (value, i) => value + 0.2 * (noise[i] ?? 0),
);
const screened = (step: number) =>
  screenWaveform({
    samples: running.map((value) => Math.round(value / step) * step),
    sampleRateHz: 2048,
    unit: 'mm/s',
    toldSpeedRpm: 1500,
  }).result;

describe('levels of the converter', () => {
  it('are counted up to a limit, gaps passed over', () => {
    expect(countLevels(Float64Array.of(1, 2, 2, NaN, 1, 3), 10)).toBe(3);
    expect(countLevels(noise, 10)).toBe(11);
    expect(countLevels(new Float64Array(0), 10)).toBe(0);
  });

  it('send a record back where they are few, and say which range to set', () => {
    const { verdict, quality } = screened(1.5);
    expect(verdict).toBe('retake');
    expect(quality.find(({ code }) => code === 'few-levels')?.advice).toContain('range');
  });

  it('are enough in a record of eight bits or of a low but sound resolution', () => {
    for (const step of [4.5 / 128, 0.3]) {
      expect(screened(step).quality.map(({ code }) => code)).toEqual([]);
    }
  });
});
