import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { innerLossFactor, outerLossFactor } from '#shared/fits/clearance-loss.ts';

const steel = { modulusGpa: 208, poisson: 0.3 };
const stainless = { modulusGpa: 197, poisson: 0.3 };
const iron = { modulusGpa: 100, poisson: 0.26 };
const aluminium = { modulusGpa: 71, poisson: 0.33 };
const ratio = fc.double({ min: 0.5, max: 0.95, noNaN: true });

describe('raceway growth of the inner ring (Lamé)', () => {
  it('is d/Di on a solid shaft of the same steel', () => {
    expect(innerLossFactor(60, 75, 0, steel, steel)).toBeCloseTo(0.8, 12);
  });

  it('follows the closed form on a hollow shaft', () => {
    fc.assert(
      fc.property(ratio, fc.double({ min: 0, max: 0.9, noNaN: true }), (k, hollow) => {
        const d = 60;
        const closed = (k * (1 - hollow ** 2)) / (1 - k ** 2 * hollow ** 2);
        expect(innerLossFactor(d, d / k, hollow * d, steel, steel)).toBeCloseTo(closed, 10);
      }),
    );
  });

  it('passes the whole interference on where the ring is very thin', () => {
    expect(innerLossFactor(60, 60.0001, 0, steel, steel)).toBeCloseTo(1, 4);
  });

  it('passes nothing on where the shaft is a thin tube', () => {
    expect(innerLossFactor(60, 75, 59.999, steel, steel)).toBeLessThan(0.001);
  });

  it('agrees with pressure and displacement worked out step by step (thick cylinders, textbook)', () => {
    // p = δ·E·(Do² − d²)/(2·d·Do²) for one steel; outer growth 2·p·d²·Do/(E·(Do² − d²)).
    const p = (0.03 * 208e3 * (75 ** 2 - 60 ** 2)) / (2 * 60 * 75 ** 2);
    const growth = (2 * p * 60 ** 2 * 75) / (208e3 * (75 ** 2 - 60 ** 2));
    expect(innerLossFactor(60, 75, 0, steel, steel) * 0.03).toBeCloseTo(growth, 12);
  });

  it('is a little less on a softer shaft', () => {
    const soft = innerLossFactor(60, 75, 0, stainless, steel);
    expect(soft).toBeLessThan(0.8);
    expect(soft).toBeGreaterThan(0.77);
  });
});

describe('raceway shrinkage of the outer ring (Lamé)', () => {
  it('is De/D in a very thick steel housing', () => {
    expect(outerLossFactor(100, 80, Infinity, steel, steel)).toBeCloseTo(0.8, 12);
  });

  it('follows the closed form in a housing with a wall', () => {
    fc.assert(
      fc.property(ratio, ratio, (h, wall) => {
        const closed = (h * (1 - wall ** 2)) / (1 - h ** 2 * wall ** 2);
        expect(outerLossFactor(100, 100 * h, 100 / wall, steel, steel)).toBeCloseTo(closed, 10);
      }),
    );
  });

  it('falls from steel over iron to aluminium', () => {
    const [s, i, a] = [steel, iron, aluminium].map((m) => outerLossFactor(100, 85, 150, m, steel));
    expect(s).toBeGreaterThan(i ?? 1);
    expect(i).toBeGreaterThan(a ?? 1);
  });
});
