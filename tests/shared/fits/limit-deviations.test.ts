import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { publishedLimits } from '#fixtures/fits/limit-deviations.ts';
import { fitAtRest } from '#shared/fits/fit-at-rest.ts';
import { limitDeviationsUm } from '#shared/fits/limit-deviations.ts';
import { toleranceGradeUm } from '#shared/fits/tolerance-grade.ts';

const anySize = fc.double({ min: 3.01, max: 500, noNaN: true });

describe('limit deviations against published tables', () => {
  for (const { source, rows } of publishedLimits) {
    it.each(rows.map((row) => [...row]))(
      `gives %d %s from ${source}`,
      (size, cls, lower, upper) => {
        expect(limitDeviationsUm(Number(size), String(cls))).toEqual([lower, upper]);
      },
    );
  }

  it('has at least 60 of them that are not from memory', () => {
    const seen = publishedLimits.filter((p) => p.source !== 'from memory').flatMap((p) => p.rows);
    expect(seen.length).toBeGreaterThanOrEqual(60);
  });
});

describe('limit deviations', () => {
  it('reads a size at the end of a range with that range', () => {
    expect(limitDeviationsUm(50, 'h6')).toEqual([-16, 0]);
    expect(limitDeviationsUm(50.001, 'h6')).toEqual([-19, 0]);
  });

  it('gives plain zeros for h and H', () => {
    expect(Object.is(limitDeviationsUm(40, 'H7')[0], 0)).toBe(true);
    expect(Object.is(limitDeviationsUm(40, 'h7')[1], 0)).toBe(true);
  });

  it.each([0, -40, 500.1, 600, Number.NaN, Infinity])('refuses the size %d', (size) => {
    expect(() => limitDeviationsUm(size, 'k5')).toThrow(
      expect.objectContaining({ code: 'size_out_of_range', field: 'size' }),
    );
  });

  it('is as wide as its grade for every size and class', () => {
    const classes = [
      'd9',
      'f6',
      'g5',
      'j6',
      'k5',
      'k8',
      'm6',
      'n7',
      'r6',
      's7',
      'F7',
      'J7',
      'K6',
      'M7',
      'N9',
      'P7',
      'R8',
      'JS6',
    ];
    fc.assert(
      fc.property(anySize, fc.constantFrom(...classes), (size, cls) => {
        const [lower, upper] = limitDeviationsUm(size, cls);
        expect(upper - lower).toBe(toleranceGradeUm(size, Number(/\d+$/.exec(cls)?.[0])));
      }),
    );
  });

  it('grows tighter from j over k, m, n, p to r and s (common practice, no source)', () => {
    const order = ['g', 'h', 'j', 'k', 'm', 'n', 'p', 'r', 's'];
    fc.assert(
      fc.property(anySize, (size) => {
        const lower = order.map((letter) => limitDeviationsUm(size, `${letter}6`)[0]);
        expect(lower).toEqual([...lower].sort((a, b) => a - b));
        expect(new Set(lower).size).toBe(order.length);
      }),
    );
  });

  it('mirrors shafts d … h in holes D … H, and p, r in P, R from IT8 (ISO 286-1, general rule)', () => {
    const mirrored = fc.constantFrom('d9', 'e8', 'f7', 'g6', 'h7', 'p8', 'r9');
    fc.assert(
      fc.property(anySize, mirrored, (size, cls) => {
        const [lower, upper] = limitDeviationsUm(size, cls);
        expect(limitDeviationsUm(size, cls.toUpperCase())).toEqual([0 - upper, 0 - lower]);
      }),
    );
  });

  it('gives H7/p6 and P7/h6 the same fit, which is what the Δ of the fine holes is for', () => {
    fc.assert(
      fc.property(anySize, fc.constantFrom('k', 'm', 'n', 'p', 'r'), (size, letter) => {
        const holeBasis = fitAtRest(
          limitDeviationsUm(size, `${letter}6`),
          limitDeviationsUm(size, 'H7'),
        );
        const shaftBasis = fitAtRest(
          limitDeviationsUm(size, 'h6'),
          limitDeviationsUm(size, `${letter.toUpperCase()}7`),
        );
        expect(shaftBasis).toEqual(holeBasis);
      }),
    );
  });
});
