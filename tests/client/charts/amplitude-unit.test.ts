import { describe, expect, it } from 'vitest';
import { units, type Unit } from '#shared/quantities/quantity.ts';
import { integrates, levelDb, lineFactor, spectrumInUnit } from '#src/charts/amplitude-unit.ts';

/** x = 10 µm at 50 Hz by a = (2πf)² x and v = 2πf x, worked out by hand. */
const frequencyHz = 50;
const omega = 2 * Math.PI * frequencyHz;
const sameVibration: Readonly<Record<Unit, number>> = {
  µm: 10,
  mil: 10 / 25.4,
  'mm/s': 10e-6 * omega * 1000,
  'in/s': (10e-6 * omega) / 0.0254,
  'm/s²': 10e-6 * omega ** 2,
  g: (10e-6 * omega ** 2) / 9.80665,
};

const spectrumOf = (...values: number[]) => ({ stepHz: 1, amplitude: Float32Array.from(values) });

describe('one vibration in six units', () => {
  it('follows a = (2πf)² x between any two of them', () => {
    for (const from of units) {
      for (const to of units) {
        const got = sameVibration[from] * lineFactor(from, to, frequencyHz);
        expect(got / sameVibration[to]).toBeCloseTo(1, 12);
      }
    }
  });

  it('integrates only towards displacement', () => {
    expect(integrates('g', 'mm/s')).toBe(true);
    expect(integrates('mm/s', 'mil')).toBe(true);
    expect(integrates('g', 'm/s²')).toBe(false);
    expect(integrates('µm', 'g')).toBe(false);
  });
});

describe('a spectrum in another unit', () => {
  it('shows nothing below 1.5 Hz where it is integrated', () => {
    const { amplitude } = spectrumInUnit(spectrumOf(1, 1, 1, 1), 'm/s²', 'mm/s', 'peak');
    expect([...amplitude.subarray(0, 2)]).toEqual([Number.NaN, Number.NaN]);
    expect(amplitude[2]).toBeCloseTo(1000 / (4 * Math.PI), 4);
  });

  it('keeps every line where it is not', () => {
    expect([...spectrumInUnit(spectrumOf(1, 2), 'mm/s', 'mm/s', 'peak').amplitude]).toEqual([1, 2]);
    expect([...spectrumInUnit(spectrumOf(0, 0), 'µm', 'mm/s', 'peak').amplitude]).toEqual([0, 0]);
  });

  it('is stated as rms, peak or peak-to-peak of a sine', () => {
    const as = (detector: 'rms' | 'peak' | 'peak-to-peak') =>
      spectrumInUnit(spectrumOf(0, 0, 3), 'g', 'g', detector).amplitude[2];
    expect(as('rms')).toBeCloseTo(3 / Math.SQRT2, 6);
    expect(as('peak')).toBe(3);
    expect(as('peak-to-peak')).toBe(6);
  });
});

describe('a level', () => {
  it('stands over 1 µm/s² and 1 nm/s (ISO 1683) and 1 pm (ISO 1683, from memory)', () => {
    expect(levelDb(1, 'm/s²')).toBeCloseTo(120, 9);
    expect(levelDb(1, 'mm/s')).toBeCloseTo(120, 9);
    expect(levelDb(1, 'µm')).toBeCloseTo(120, 9);
    expect(levelDb(1, 'g')).toBeCloseTo(120 + 20 * Math.log10(9.80665), 9);
    expect(levelDb(0, 'g')).toBe(-Infinity);
  });
});
