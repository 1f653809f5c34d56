import { describe, expect, it } from 'vitest';
import { RandomStream } from '#fixtures/signals/random-stream.ts';
import { fitLogistic, logistic, logOdds, type FitCase } from '#server/cli/evaluate/fit-logistic.ts';

function drawCases(count: number, weights: readonly number[], base: number): FitCase[] {
  const random = new RandomStream(['logistic', count]);
  return Array.from({ length: count }, () => {
    const terms = weights.map(() => random.normal());
    const p = logistic(terms.reduce((sum, term, j) => sum + term * weights[j]!, base));
    return { terms, loose: random.chance(p), weight: 1 };
  });
}

describe('fitLogistic', () => {
  it('finds the model the cases were drawn from', () => {
    const cases = drawCases(20_000, [1.5, -0.8, 0], -1);
    const fit = fitLogistic(cases, { penalty: 1e-3, signs: [0, 0, 0] });
    // Standard errors of a logistic fit over 20,000 cases are about 0.03 here.
    expect(fit.base).toBeCloseTo(-1, 0.9);
    expect(fit.weights[0]).toBeCloseTo(1.5, 0.9);
    expect(fit.weights[1]).toBeCloseTo(-0.8, 0.9);
    expect(Math.abs(fit.weights[2]!)).toBeLessThan(0.1);
  });

  it('means its scores: of the cases scored near 0.8, 80 % are loose', () => {
    const fit = fitLogistic(drawCases(20_000, [2], 0), { penalty: 1e-3, signs: [0] });
    const near = drawCases(30_000, [2], 0).filter(
      ({ terms }) => Math.abs(logistic(logOdds(fit, terms)) - 0.8) < 0.05,
    );
    expect(near.filter(({ loose }) => loose).length / near.length).toBeCloseTo(0.8, 1.2);
  });

  it('leaves out a term that would speak the wrong way', () => {
    const cases = drawCases(5000, [1, -1], 0);
    const { weights } = fitLogistic(cases, { penalty: 1e-3, signs: [1, 1] });
    expect(weights[1]).toBe(0);
    expect(weights[0]).toBeGreaterThan(0.5);
  });

  it('stays finite where a term separates the cases wholly', () => {
    const cases = [-2, -1, 1, 2].map((term) => ({ terms: [term], loose: term > 0, weight: 1 }));
    const { base, weights } = fitLogistic(cases, { penalty: 1, signs: [0] });
    expect([base, ...weights].every(Number.isFinite)).toBe(true);
    expect(weights[0]).toBeGreaterThan(0);
  });
});
