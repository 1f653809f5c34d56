import { describe, expect, it } from 'vitest';
import { publishedFits } from '#fixtures/fits/worked-fits.ts';
import { assessSeats } from '#shared/fits/assess-seats.ts';
import { fitAtRest, probableRange } from '#shared/fits/fit-at-rest.ts';

describe('fit at rest', () => {
  it.each(
    publishedFits.map((f) => [f.seat, f.sizeMm, f.toleranceClass, f.minUm, f.maxUm] as const),
  )(
    'gives the published fit of a %s seat of %d mm in %s',
    (seat, size, toleranceClass, min, max) => {
      const result =
        seat === 'shaft'
          ? assessSeats({ d: size, shaftClass: toleranceClass }).shaftSeat
          : assessSeats({ D: size, housingClass: toleranceClass }).housingSeat;
      expect(result?.interferenceUm).toEqual({ min, mean: (min + max) / 2, max });
    },
  );

  it('gives the textbook fit of 50 H8/f7: clearance 25 to 89 µm (encyclopaedia example)', () => {
    expect(fitAtRest([-50, -25], [0, 39])).toEqual({ min: -89, mean: -57, max: -25 });
  });

  it('gives the handbook interference of 50 H7/s6: 18 to 59 µm (machine-design textbook example)', () => {
    expect(fitAtRest([43, 59], [0, 25])).toEqual({ min: 18, mean: 38.5, max: 59 });
  });
});

describe('probable range', () => {
  it('is the mean ± the root of the squared half tolerances (by hand: 3, 4 → 5)', () => {
    expect(probableRange([0, 6], [-8, 0])).toEqual({ min: 2, max: 12 });
  });

  it('lies inside the extreme fits and shrinks to a point without tolerances', () => {
    expect(probableRange([5, 5], [-3, -3])).toEqual({ min: 8, max: 8 });
  });
});
