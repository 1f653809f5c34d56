import { describe, expect, it } from 'vitest';
import type { Unit } from '#shared/quantities/quantity.ts';
import { analyseWaveform } from '#shared/signal/analyse-waveform.ts';
import { clippedSine, tones, whiteNoise } from './test-signals.ts';

const [turns, count] = [80, 8192];
const sampleRateHz = (count / turns) * 25;
const noise = whiteNoise(count, 8);

/** Truncation of a displacement record, µm, with a little noise so that no value repeats. */
const truncationOf = (motion: Float64Array, unit: Unit = 'µm') =>
  analyseWaveform({
    samples: motion.map((value, i) => 50 * value + 0.05 * (noise[i] ?? 0)),
    sampleRateHz,
    unit,
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

  it('is found in velocity as well', () => {
    const upper = clippedSine(turns, count, 0.8, 'upper');
    expect(truncationOf(upper, 'mm/s')).toMatchObject({ side: 'upper', instrument: false });
    expect(truncationOf(clippedSine(turns, count, 0.8, 'both'), 'in/s')?.side).toBe('both');
  });

  // cos θ − ¼ cos 2θ is flat at its crest up to the fourth power of θ.
  it('is not read into a crest that a second order flattens', () => {
    const flat = tones(
      [
        { frequencyHz: 25, amplitude: 1, phase: Math.PI / 2 },
        { frequencyHz: 50, amplitude: -0.25, phase: Math.PI / 2 },
      ],
      sampleRateHz,
      count,
    );
    for (const unit of ['µm', 'mm/s'] as const) expect(truncationOf(flat, unit)?.side).toBe('none');
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
