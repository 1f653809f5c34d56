import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { assessSeats } from '#shared/fits/assess-seats.ts';
import { floatingTravelUm } from '#shared/fits/floating-travel.ts';
import { neededInterferenceUm } from '#shared/fits/needed-interference.ts';
import { ringGrowthUm } from '#shared/fits/ring-growth.ts';
import { expansionUm, runningFit } from '#shared/fits/running-fit.ts';

describe('thermal expansion', () => {
  it('loosens a hot ring on a cooler shaft (by hand: 60·(11.5·40 − 12.5·60)/1000 = −17.4 µm)', () => {
    const change = expansionUm(
      60,
      { alphaPerK: 11.5e-6, temperatureC: 60 },
      { alphaPerK: 12.5e-6, temperatureC: 80 },
    );
    expect(change).toBeCloseTo(-17.4, 9);
  });

  it('opens an aluminium housing (by hand: 130·(12.5·50 − 21·50)/1000 = −55.25 µm)', () => {
    const seat = assessSeats({
      D: 130,
      housingClass: 'H7',
      housingMaterial: 'aluminium',
      temperaturesC: { outerRing: 70, housing: 70 },
    }).housingSeat;
    // At rest −58 … 0.
    expect(seat?.runningUm?.min).toBeCloseTo(-113.25, 9);
    expect(seat?.runningUm?.max).toBeCloseTo(-55.25, 9);
  });

  it('does nothing at 20 °C, and nothing when both parts are alike', () => {
    expect(
      expansionUm(
        60,
        { alphaPerK: 12e-6, temperatureC: 20 },
        { alphaPerK: 21e-6, temperatureC: 20 },
      ),
    ).toBe(0);
    expect(
      expansionUm(
        60,
        { alphaPerK: 12e-6, temperatureC: 90 },
        { alphaPerK: 12e-6, temperatureC: 90 },
      ),
    ).toBe(0);
  });

  it('tightens with a warmer inner part and loosens with a warmer outer part, at any size', () => {
    const t = fc.double({ min: -50, max: 200, noNaN: true });
    fc.assert(
      fc.property(
        fc.double({ min: 3, max: 500, noNaN: true }),
        t,
        t,
        fc.double({ min: 0.1, max: 50, noNaN: true }),
        (d, a, b, more) => {
          const at = (inner: number, outer: number) =>
            expansionUm(
              d,
              { alphaPerK: 12e-6, temperatureC: inner },
              { alphaPerK: 12e-6, temperatureC: outer },
            );
          expect(at(a + more, b)).toBeGreaterThan(at(a, b));
          expect(at(a, b + more)).toBeLessThan(at(a, b));
        },
      ),
    );
  });
});

describe('running fit', () => {
  it('takes smoothing and ring growth off and adds the expansion', () => {
    const fit = runningFit(
      { min: 2, mean: 16, max: 30 },
      { smoothingUm: 2, expansionUm: -5, ringGrowthUm: 1 },
    );
    expect(fit).toEqual({ min: -6, mean: 8, max: 22 });
  });

  it('equals the fit at rest where nothing is told', () => {
    const seat = assessSeats({ d: 60, shaftClass: 'k5' }).shaftSeat;
    expect(seat?.runningUm).toEqual(seat?.interferenceUm);
  });
});

describe('ring growth of fast shafts', () => {
  const steel = { modulusGpa: 208, poisson: 0.3 };

  it('tends to the thin rotating ring, Δd = ρω²d³/4E, on a shaft that does not grow', () => {
    // Thin ring of 100 mm at 10 000 r/min: 7850·1047.2²·0.1³/(4·208e9) = 10.35 µm; the solid shaft
    // grows by (1 − ν)/4 of ρω²d³/4E·… = 1.81 µm (Timoshenko and Goodier, rotating disks).
    const omega = (10_000 * 2 * Math.PI) / 60;
    const thinRing = ((7850 * omega ** 2 * 0.1 ** 3) / (4 * 208e9)) * 1e6;
    const growth = ringGrowthUm(100, 100.001, 10_000, steel);
    expect(growth).toBeCloseTo(thinRing * (1 - (1 - 0.3) / 4), 2);
  });

  it('is nothing at rest and grows with the square of the speed', () => {
    expect(ringGrowthUm(60, 78, 0, steel)).toBe(0);
    expect(ringGrowthUm(60, 78, 6000, steel)).toBeCloseTo(4 * ringGrowthUm(60, 78, 3000, steel), 9);
  });
});

describe('interference needed under radial load', () => {
  it('follows the light form up to 0.3 C0r (by hand: 0.08·√(50·4000/20) = 8 µm)', () => {
    expect(
      neededInterferenceUm({ d: 50, B: 20, radialLoadN: 4000, staticRatingN: 20_000 }),
    ).toBeCloseTo(8, 9);
    expect(
      neededInterferenceUm({ d: 50, B: 20, radialLoadN: 6000, staticRatingN: 20_000 }),
    ).toBeCloseTo(0.08 * Math.sqrt(15_000), 9);
  });

  it('follows the heavy form above it (by hand: 0.02·10 000/20 = 10 µm)', () => {
    expect(
      neededInterferenceUm({ d: 50, B: 20, radialLoadN: 10_000, staticRatingN: 20_000 }),
    ).toBeCloseTo(10, 9);
  });

  it('adds smoothing and the warmer ring (by hand: 8 + 2 + 0.0015·50·20 = 11.5 µm)', () => {
    const needed = neededInterferenceUm({
      d: 50,
      B: 20,
      radialLoadN: 4000,
      smoothingUm: 2,
      warmerThanSurroundingsK: 20,
    });
    expect(needed).toBeCloseTo(11.5, 9);
  });
});

describe('floating travel', () => {
  it('is the difference of two growths (by hand: 500 mm · (12·50 − 10·20) = 200 µm)', () => {
    expect(
      floatingTravelUm(
        500,
        { alphaPerK: 12e-6, temperatureC: 70 },
        { alphaPerK: 10e-6, temperatureC: 40 },
      ),
    ).toBeCloseTo(200, 9);
  });
});
