import { describe, expect, it } from 'vitest';
import { peakNear, viewSpectrum } from '#shared/signal/spectrum-view.ts';
import { tones } from './test-signals.ts';

const sampleRateHz = 2048;
const viewOf = (samples: Float64Array) => viewSpectrum(samples, sampleRateHz, 'velocity', 25);

describe('peakNear', () => {
  // The tone itself is the reference.
  it('reads tones between lines to 0.1 % in height and a thousandth of a line in place', () => {
    for (const count of [2000, 4096, 4097]) {
      for (let part = 0; part < 1; part += 0.0625) {
        const frequencyHz = ((200 + part) * sampleRateHz) / count;
        const samples = tones(
          [{ frequencyHz, amplitude: 2.5, phase: 1 + part }],
          sampleRateHz,
          count,
        );
        const peak = peakNear(viewOf(samples), frequencyHz, 2);
        expect(Math.abs((peak?.amplitudePeak ?? 0) / 2.5 - 1)).toBeLessThan(1e-3);
        const missLines = (((peak?.frequencyHz ?? 0) - frequencyHz) * count) / sampleRateHz;
        expect(Math.abs(missLines)).toBeLessThan(1e-3);
      }
    }
  });

  it('reads an exact line to a millionth', () => {
    const samples = tones([{ frequencyHz: 100, amplitude: 1, phase: 0.4 }], sampleRateHz, 4096);
    const peak = peakNear(viewOf(samples), 100, 2);
    expect(Math.abs((peak?.amplitudePeak ?? 0) - 1)).toBeLessThan(1e-6);
    expect(Math.abs((peak?.frequencyHz ?? 0) - 100)).toBeLessThan(1e-6);
  });

  it('finds nothing beyond the spectrum', () => {
    const view = viewOf(tones([{ frequencyHz: 100, amplitude: 1 }], sampleRateHz, 4096));
    expect(peakNear(view, 5000, 2)).toBeNull();
  });
});
