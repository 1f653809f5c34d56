import { describe, expect, it } from 'vitest';
import { formatDay, formatInstant } from '#src/lib/dates.ts';
import {
  formatBytes,
  formatFixed,
  formatSigned,
  formatSignificant,
  parseDecimal,
} from '#src/lib/numbers.ts';

describe('writing numbers', () => {
  it('uses a real minus sign and never writes minus nothing', () => {
    expect(formatFixed(-2.345, 2)).toBe('−2.35');
    expect(formatFixed(-0.001, 2)).toBe('0.00');
  });

  it('signs deviations on both sides of nothing', () => {
    expect([12, -3, 0, -0.2].map((um) => formatSigned(um, 0))).toEqual(['+12', '−3', '0', '0']);
  });

  it('keeps three figures over the whole range of amplitudes', () => {
    const texts = [0.00123, 0.0999, 1.006, 12.34, 123.4, 12345, 0].map((x) => formatSignificant(x));
    expect(texts).toEqual(['0.00123', '0.0999', '1.01', '12.3', '123', '12300', '0']);
    expect(formatSignificant(9.996)).toBe('10.0');
    expect(formatSignificant(-1.5e-9)).toBe('−1.50e−9');
    expect(formatSignificant(Number.NaN)).toBe('–');
  });

  it('writes file sizes in powers of a thousand', () => {
    const sizes = [999, 1000, 12_345_678, 999_999, 256 * 1024 * 1024];
    expect(sizes.map(formatBytes)).toEqual(['999 B', '1.0 kB', '12 MB', '1.0 MB', '268 MB']);
  });
});

describe('reading typed numbers', () => {
  it('takes a decimal point or comma and either minus sign', () => {
    expect(['59.985', ' 59,985 ', '−3', '-3', '.5'].map(parseDecimal)).toEqual([
      59.985, 59.985, -3, -3, 0.5,
    ]);
  });

  it('tells an empty field from text that is no number', () => {
    expect(parseDecimal('  ')).toBeUndefined();
    expect(parseDecimal('12 mm')).toBeNaN();
    expect(parseDecimal('1.234,5')).toBeNaN();
  });
});

describe('writing dates', () => {
  it('keeps a calendar day the same day', () => {
    expect(formatDay('2026-03-04')).toBe('4 Mar 2026');
  });

  it('writes an instant with its minute', () => {
    expect(formatInstant('2026-03-04T14:05:59Z')).toBe('4 Mar 2026, 14:05');
  });
});
