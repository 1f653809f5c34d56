import { describe, expect, it } from 'vitest';
import { bandVelocity } from '#shared/signal/band-velocity.ts';
import { viewSpectrum } from '#shared/signal/spectrum-view.ts';
import { velocityLines, velocityRmsFactor } from '#shared/signal/velocity-lines.ts';
import { tones } from './test-signals.ts';

// Harmonic motion: a = (2πf) v = (2πf)² x.
describe('velocity of a tone', () => {
  const frequencyHz = 50;
  const omega = 2 * Math.PI * frequencyHz;
  const velocityPeak = 4; // mm/s
  const asRecorded = {
    acceleration: (velocityPeak * omega) / 1000, // m/s²
    velocity: velocityPeak,
    displacement: (velocityPeak / omega) * 1000, // µm
  };

  it('is the same from acceleration, velocity and displacement', () => {
    for (const quantity of ['acceleration', 'velocity', 'displacement'] as const) {
      const spectrum = new Float64Array(200);
      spectrum[50] = asRecorded[quantity];
      const lines = velocityLines(spectrum, 1, quantity);
      expect(lines[50]).toBeCloseTo(velocityPeak / Math.SQRT2, 12);
      const back = (asRecorded[quantity] * velocityRmsFactor(quantity, frequencyHz)) ** 2;
      expect(back).toBeCloseTo(velocityPeak ** 2 / 2, 10);
    }
  });

  it('passes nothing below the high-pass', () => {
    expect(velocityRmsFactor('acceleration', 1.4)).toBe(0);
    expect(velocityRmsFactor('acceleration', 1.6)).toBeGreaterThan(0);
  });

  it('comes back in time with its phase, from any quantity', () => {
    // v = sin ωt; a = ω cos ωt; x = −cos ωt / ω.
    const phases = { acceleration: Math.PI / 2, velocity: 0, displacement: -Math.PI / 2 };
    for (const quantity of ['acceleration', 'velocity', 'displacement'] as const) {
      const samples = tones(
        [{ frequencyHz, amplitude: asRecorded[quantity], phase: phases[quantity] }],
        2000,
        2000,
      );
      const band = bandVelocity(viewSpectrum(samples, 2000, quantity, 25), 1, 25);
      const wanted = tones(
        [{ frequencyHz, amplitude: velocityPeak }],
        band.rateHz,
        band.mmPerS.length,
      );
      wanted.forEach((value, i) => expect(band.mmPerS[i]).toBeCloseTo(value, 6));
    }
  });
});
