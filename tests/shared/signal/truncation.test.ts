import { describe, expect, it } from 'vitest';
import { analyseWaveform } from '#shared/signal/analyse-waveform.ts';
import { clippedSine, tones, whiteNoise } from './test-signals.ts';

const [turns, count] = [80, 8192];
const sampleRateHz = (count / turns) * 25;
const noise = whiteNoise(count, 8);

/** Truncation of a displacement record, µm, with a little noise so that no value repeats. */
const truncationOf = (displacementUm: Float64Array) =>
  analyseWaveform({
    samples: displacementUm.map((value, i) => 50 * value + 0.05 * (noise[i] ?? 0)),
    sampleRateHz,
    unit: 'µm',
    toldSpeedRpm: 1500,
  }).family?.truncation;

// A sine spends arccos(1 − 2s)/π of its turn within the share s of its range from one extreme; one
// that is held at the level c spends arccos(c)/π at it (closed form).
describe('truncation of the motion', () => {
  it('is none in a sine, which dwells as long as the closed form says', () => {
    const found = truncationOf(tones([{ frequencyHz: 25, amplitude: 1 }], sampleRateHz, count));
    expect(found?.side).toBe('none');
    expect(found?.share).toBeCloseTo(found?.expectedShare ?? NaN, 1);
  });

  it('is found at nine tenths of the peak, on the side where it is', () => {
    expect(truncationOf(clippedSine(turns, count, 0.9, 'both'))?.side).toBe('both');
    const upper = truncationOf(clippedSine(turns, count, 0.9, 'upper'));
    expect(upper).toMatchObject({ side: 'upper', instrument: false });
    expect(upper?.share).toBeGreaterThan(Math.acos(0.9) / Math.PI - 0.02);
    const lower = truncationOf(clippedSine(turns, count, 0.9, 'upper').map((value) => -value));
    expect(lower?.side).toBe('lower');
  });

  it('is not read into a family of misalignment', () => {
    for (const phase of [0, 1, 2, 3, 4, 5]) {
      const samples = tones(
        [
          { frequencyHz: 25, amplitude: 1 },
          { frequencyHz: 50, amplitude: 0.12, phase },
        ],
        sampleRateHz,
        count,
      );
      expect(truncationOf(samples)?.side, `${phase}`).toBe('none');
    }
  });
});
