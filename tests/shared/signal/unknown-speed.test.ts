import { describe, expect, it } from 'vitest';
import { screenWaveform } from '#shared/signal/screen-waveform.ts';
import { tones, whiteNoise } from './test-signals.ts';

const sampleRateHz = 2560;
const noise = whiteNoise(8192, 21);
const screened = (samples: Float64Array, machine?: { nominalSpeedRpm: number }) =>
  screenWaveform({ samples, sampleRateHz, unit: 'mm/s', machine }).result;

describe('a speed that was not told', () => {
  const speedHz = 24.63;
  const running = tones(
    [1, 2, 3].map((order) => ({
      frequencyHz: order * speedHz,
      amplitude: 2 / order,
      phase: order,
    })),
    sampleRateHz,
    8192,
  ).map((value, i) => value + 0.2 * (noise[i] ?? 0));

  it('is estimated from the family within the range of the machine', () => {
    const { speed, verdict } = screened(running, { nominalSpeedRpm: 1500 });
    expect(speed.source).toBe('estimated');
    expect(Math.abs((speed.speedHz ?? 0) / speedHz - 1)).toBeLessThan(5e-4);
    expect(verdict).not.toBe('retake');
  });

  it('is the nominal one where no line gives it away, and the screening says so', () => {
    const { speed, verdict, quality } = screened(noise, { nominalSpeedRpm: 1500 });
    expect(speed.speedHz).toBeCloseTo(25, 9);
    expect(verdict).toBe('none');
    expect(quality.map(({ message }) => message).join()).toContain('nominal speed');
  });

  it('sends a record back where neither lines nor machine tell it', () => {
    const { speed, verdict, score } = screened(noise);
    expect(speed).toMatchObject({ speedHz: null, source: 'none' });
    expect([verdict, score]).toEqual(['retake', null]);
  });

  it('is taken from the machine’s range where the told one can’t be and the lines say less for it', () => {
    const { speed, verdict } = screenWaveform({
      samples: running,
      sampleRateHz,
      unit: 'mm/s',
      toldSpeedRpm: 1750,
      machine: { nominalSpeedRpm: 1480 },
    }).result;
    expect(speed.source).toBe('estimated');
    expect(Math.abs((speed.speedHz ?? 0) / speedHz - 1)).toBeLessThan(5e-4);
    expect(speed.alternatives.map(({ reason }) => reason).join()).toContain('told speed');
    expect(verdict).not.toBe('retake');
  });
});
