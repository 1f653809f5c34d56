import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { seededRandom } from '#fixtures/fits/seeded-random.ts';
import { assessSeats } from '#shared/fits/assess-seats.ts';
import { looseChance } from '#shared/fits/loose-chance.ts';
import { normalBelow } from '#shared/fits/normal-distribution.ts';

describe('normal distribution', () => {
  // Abramowitz and Stegun, table 26.1.
  it.each([
    [0, 0.5],
    [1, 0.841344746068543],
    [-1, 0.158655253931457],
    [1.96, 0.97500210485178],
    [3, 0.99865010196837],
    [-4, 3.16712418331199e-5],
    [5, 0.999999713348428],
  ])('gives P(z < %d) = %d', (z, p) => {
    expect(Math.abs(normalBelow(z) / p - 1)).toBeLessThan(1e-11);
  });
});

describe('chance of running loose', () => {
  it('agrees with drawing the fit and the wear by lot', () => {
    const random = seededRandom(7);
    for (const [meanUm, sigmaUm, wear, threshold] of [
      [16, 4, 10, 0],
      [5, 3, 20, -7],
      [-29, 8, 6, -58],
    ] as const) {
      let loose = 0;
      const draws = 100_000;
      for (let n = 0; n < draws; n += 1) {
        const fit = meanUm + sigmaUm * random.normal() + wear * Math.log(1 - random.uniform());
        if (fit < threshold) loose += 1;
      }
      // Four standard deviations of a share at most.
      expect(
        Math.abs(looseChance({ meanUm, sigmaUm }, wear, threshold) - loose / draws),
      ).toBeLessThan(0.0064);
    }
  });

  it('stays a chance and grows with wear and clearance', () => {
    const um = fc.double({ min: 0.1, max: 100, noNaN: true });
    fc.assert(
      fc.property(
        fc.double({ min: -100, max: 100, noNaN: true }),
        um,
        um,
        um,
        (meanUm, sigmaUm, wear, more) => {
          const p = looseChance({ meanUm, sigmaUm }, wear, 0);
          expect(p).toBeGreaterThanOrEqual(0);
          expect(p).toBeLessThanOrEqual(1);
          expect(looseChance({ meanUm: meanUm - more, sigmaUm }, wear, 0)).toBeGreaterThanOrEqual(
            p - 1e-9,
          );
          expect(looseChance({ meanUm, sigmaUm }, wear + more, 0)).toBeGreaterThanOrEqual(p - 1e-9);
        },
      ),
    );
  });

  it('is certain without any spread', () => {
    expect(looseChance({ meanUm: 1, sigmaUm: 0 }, 0, 0)).toBe(0);
    expect(looseChance({ meanUm: -1, sigmaUm: 0 }, 0, 0)).toBe(1);
    expect(looseChance({ meanUm: 10, sigmaUm: 0 }, 10, 0)).toBeCloseTo(Math.exp(-1), 12);
  });
});

describe('chance that a recorded seat runs loose', () => {
  const turning = {
    designation: '6312',
    innerLoad: 'rotating',
    outerLoad: 'stationary',
    loadLevel: 'normal',
  } as const;
  const shaft = (more: object) =>
    assessSeats({ ...turning, shaftClass: 'k5', ...more }).shaftSeat?.chanceOfClearance ?? -1;

  it('does not take the clearance a stationary ring has by design for a fault', () => {
    const seat = assessSeats({ ...turning, housingClass: 'H7' }).housingSeat;
    expect(seat?.interferenceUm?.mean).toBe(-29);
    expect(seat?.chanceOfClearance).toBeLessThan(0.01);
  });

  it('takes a looser class on the drawing of a stationary ring for a choice', () => {
    expect(
      assessSeats({ ...turning, housingClass: 'G7' }).housingSeat?.chanceOfClearance,
    ).toBeLessThan(0.01);
  });

  it('is high for a shaft measured well below the bore, low for one measured in its limits', () => {
    expect(shaft({ shaftMeasuredMm: 59.97, boreMeasuredMm: 59.995 })).toBeGreaterThan(0.99);
    expect(shaft({ shaftMeasuredMm: 60.01, boreMeasuredMm: 59.995 })).toBeLessThan(0.01);
  });

  it('rises with years in service, with marks seen and with earlier findings', () => {
    const young = shaft({ shaftHistory: { yearsInService: 1 } });
    expect(shaft({ shaftHistory: { yearsInService: 20 } })).toBeGreaterThan(young);
    expect(
      shaft({ shaftHistory: { yearsInService: 1, condition: 'creep marks' } }),
    ).toBeGreaterThan(young);
    expect(shaft({ shaftHistory: { yearsInService: 1, earlierFindings: 2 } })).toBeGreaterThan(
      young,
    );
  });

  it('counts marks seen at once on a seat that was not measured, not on one that was', () => {
    const marks = { shaftHistory: { condition: 'creep marks' } };
    const measured = { shaftMeasuredMm: 60.01, boreMeasuredMm: 59.995 };
    expect(shaft(marks)).toBeGreaterThan(shaft({}) + 0.2);
    expect(shaft({ ...measured, ...marks })).toBe(shaft(measured));
  });

  it('is absent where nothing is recorded and where the seat is bonded on purpose', () => {
    expect(assessSeats(turning).shaftSeat?.chanceOfClearance).toBeUndefined();
    const bonded = assessSeats({ ...turning, shaftClass: 'h6', shaftBonded: true });
    expect(bonded.shaftSeat?.chanceOfClearance).toBeUndefined();
    expect(bonded.cautions.join(' ')).toContain('bonded');
  });
});
