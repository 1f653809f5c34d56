import { describe, expect, it } from 'vitest';
import { clippedBeforeIntegration } from '#shared/signal/clipping-before-integration.ts';
import { findClipping } from '#shared/signal/clipping.ts';
import { differentiate } from '#shared/signal/differentiate.ts';
import { realFft, realFromLines } from '#shared/signal/fft.ts';
import { tones, whiteNoise } from './test-signals.ts';

const rateHz = 5120;
const count = 8192;
const noise = whiteNoise(count, 11);
const machine = tones(
  [1, 2, 3, 4].map((order) => ({
    frequencyHz: 24.7 * order,
    amplitude: 1 / order,
    phase: order * order,
  })),
  rateHz,
  count,
).map((value, i) => value + 0.02 * (noise[i] ?? 0));
const cutOff = (values: Float64Array, share: number, lower = true) => {
  const limit = share * values.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  return values.map((value) => Math.min(limit, lower ? Math.max(-limit, value) : value));
};

/** Integration line by line, as analysers do it: divided by jω from 2 Hz up. */
function integrateByLines(values: Float64Array): Float64Array {
  const lines = realFft(values);
  for (let k = 0; 2 * k + 1 < lines.length; k += 1) {
    const omega = (2 * Math.PI * k * rateHz) / count;
    const [re, im] = [lines[2 * k] ?? 0, lines[2 * k + 1] ?? 0];
    const keep = omega >= 4 * Math.PI ? 1 / omega / count : 0;
    lines[2 * k] = keep * im;
    lines[2 * k + 1] = -keep * re;
  }
  return realFromLines(lines, count);
}

/** Integration by trapezoids, and a straight line taken out. */
function integrateByTrapezoids(values: Float64Array): Float64Array {
  let sum = 0;
  const out = values.map((value, i) => (sum += (value + (values[i - 1] ?? value)) / 2 / rateHz));
  const slope = (out[count - 1] ?? 0) / count;
  return out.map((value, i) => value - slope * i);
}

describe('differentiate', () => {
  it('gives a sine its cosine: d/dt sin ωt = ω cos ωt, closed form', () => {
    const omega = (2 * Math.PI * 37) / count;
    const sine = Float64Array.from({ length: count }, (_, i) => Math.sin(omega * i));
    const derivative = differentiate(sine, 'spectral');
    for (const i of [700, 2048, 5001]) {
      expect(Math.abs((derivative[i] ?? 0) - omega * Math.cos(omega * i))).toBeLessThan(
        2e-3 * omega,
      );
    }
  });

  it('undoes a sum of trapezoids', () => {
    const undone = differentiate(integrateByTrapezoids(machine), 'trapezoidal');
    const slope = (undone[4000] ?? 0) - (machine[4000] ?? 0) / rateHz;
    for (const i of [500, 3000, 7000]) {
      const miss = (undone[i] ?? 0) - slope - (machine[i] ?? 0) / rateHz;
      expect(Math.abs(miss)).toBeLessThan(0.01 / rateHz);
    }
  });
});

describe('an overload before integration', () => {
  it.each([
    ['lines', integrateByLines],
    ['trapezoids', integrateByTrapezoids],
  ] as const)('is found in velocity integrated by %s, and not where there was none', (_, by) => {
    expect(clippedBeforeIntegration(by(cutOff(machine, 0.6)))).toBe(true);
    expect(clippedBeforeIntegration(by(cutOff(machine, 0.6, false)))).toBe(true);
    expect(clippedBeforeIntegration(by(machine))).toBe(false);
  });

  it('is not seen in a sine sampled in step with it', () => {
    const inStep = tones([{ frequencyHz: rateHz / 32, amplitude: 1 }], rateHz, count);
    expect(clippedBeforeIntegration(inStep)).toBe(false);
    expect(findClipping(inStep)).toMatchObject({ upper: false, lower: false });
  });
});

describe('an overload of the input', () => {
  it('is found on a slow crest, where the band below the rail is full as well', () => {
    const slow = tones([{ frequencyHz: 3.1, amplitude: 1 }], rateHz, count);
    expect(findClipping(cutOff(slow, 0.995))).toMatchObject({ upper: true, lower: true });
    expect(findClipping(slow)).toMatchObject({ upper: false, lower: false });
  });
});
