import { describe, expect, it } from 'vitest';
import { analyseWaveform } from '#shared/signal/analyse-waveform.ts';
import { whiteNoise } from './test-signals.ts';

const sampleRateHz = 2560;
const samplesUsed = 4096;

function chanceOf(samples: Float64Array, toldSpeedRpm: number): number {
  const family = analyseWaveform({
    samples,
    sampleRateHz,
    unit: 'mm/s',
    toldSpeedRpm,
    toldSpeedTolerance: 1e-3,
  }).family;
  return family?.run.pChance ?? 1;
}

describe('chance of a family by luck', () => {
  it('is stated below one in a hundred for no more than that share of noise records', () => {
    const records = 300;
    let rare = 0;
    for (let seed = 1; seed <= records; seed += 1) {
      if (chanceOf(whiteNoise(samplesUsed, 131 * seed), 1400 + (seed % 300)) < 0.01) rare += 1;
    }
    // Binomial with 300 × 0.01: more than 8 come once in 250 such tests.
    expect(rare).toBeLessThanOrEqual(8);
  });

  // 2.4 dB is where a single such test of four averages finds half (line-chances.test.ts); at 3 dB the
  // method, which tries more than one size and estimates its floors, must.
  it('finds six orders together where none stands out alone', () => {
    let found = 0;
    const records = 60;
    for (let seed = 1; seed <= records; seed += 1) {
      const speedHz = 22 + 6 * ((seed * 0.618) % 1);
      const samples = whiteNoise(samplesUsed, 977 * seed);
      const noiseInLine = (1.5 * 2) / (samplesUsed / 2.5);
      const amplitude = Math.sqrt(2 * noiseInLine * (10 ** 0.3 - 1));
      for (let order = 1; order <= 6; order += 1) {
        for (let i = 0; i < samples.length; i += 1) {
          const turns = (order * speedHz * i) / sampleRateHz;
          samples[i] = (samples[i] ?? 0) + amplitude * Math.cos(2 * Math.PI * turns + seed * order);
        }
      }
      if (chanceOf(samples, speedHz * 60) < 1e-3) found += 1;
    }
    expect(found / records).toBeGreaterThan(0.5);
  });

  it('does not take one strong line for a family', () => {
    const samples = whiteNoise(samplesUsed, 4);
    const clean = samples.slice();
    for (let i = 0; i < samples.length; i += 1) {
      samples[i] = (samples[i] ?? 0) + 5 * Math.cos((2 * Math.PI * 4 * 25 * i) / sampleRateHz);
    }
    expect(chanceOf(clean, 1500)).toBeGreaterThan(0.01);
    expect(chanceOf(samples, 1500)).toBeGreaterThan(1e-3);
  });
});
