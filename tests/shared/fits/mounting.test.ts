import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { mountingOf } from '#shared/fits/mounting.ts';

const ring = {
  d: 60,
  alphaPerK: 12.5e-6,
  greatestInterferenceUm: 30,
  slideOnClearanceUm: 30,
  capped: false,
};

describe('mounting temperature', () => {
  it('is the shaft’s plus what the ring must grow (by hand: 20 + 60/(12.5e-3·60) = 100 °C)', () => {
    expect(mountingOf({ ...ring, handlingMarginK: 10 })).toMatchObject({
      neededC: 100,
      heatToC: 110,
      limitC: 120,
      allowed: true,
    });
  });

  it('counts exactly the limit as allowed', () => {
    expect(mountingOf({ ...ring, handlingMarginK: 20 }).allowed).toBe(true);
    expect(mountingOf({ ...ring, handlingMarginK: 20.1 }).allowed).toBe(false);
  });

  it('cools the shaft by what the limit leaves short (by hand: 110 wanted, 80 allowed, 30 K)', () => {
    const mounting = mountingOf({ ...ring, capped: true, handlingMarginK: 10 });
    expect(mounting).toMatchObject({ limitC: 80, allowed: false });
    expect(mounting.shaftCooledToC).toBeCloseTo(-10, 9);
    expect(mounting.advice).toContain('80 °C');
  });

  it('needs no heat where the ring slides on cold', () => {
    const mounting = mountingOf({ ...ring, greatestInterferenceUm: -5, slideOnClearanceUm: 0 });
    expect(mounting).toMatchObject({ neededC: 20, heatToC: 20, allowed: true });
    expect(mounting.advice).toContain('No heating');
  });

  it('puts induction first and never offers a flame', () => {
    const { advice } = mountingOf(ring);
    expect(advice.indexOf('induction')).toBeLessThan(advice.indexOf('oven'));
    expect(advice).toContain('Never heat with an open flame');
  });

  it('rises with interference and falls with size', () => {
    const um = fc.double({ min: 1, max: 200, noNaN: true });
    fc.assert(
      fc.property(um, um, fc.double({ min: 10, max: 400, noNaN: true }), (a, b, d) => {
        const at = (greatestInterferenceUm: number, size: number) =>
          mountingOf({ ...ring, d: size, greatestInterferenceUm }).neededC;
        expect(at(a + b, d)).toBeGreaterThan(at(a, d));
        expect(at(a, d + 10)).toBeLessThan(at(a, d));
      }),
    );
  });
});
