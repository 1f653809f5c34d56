import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { assessSeats } from '#shared/fits/assess-seats.ts';
import type { PositionFit } from '#shared/fits/fit-types.ts';

const motor: PositionFit = {
  designation: '6312',
  clearanceGroup: 'C3',
  shaftClass: 'k5',
  housingClass: 'H7',
  innerLoad: 'rotating',
  outerLoad: 'stationary',
  loadLevel: 'normal',
};

describe('a whole position, worked by hand', () => {
  // 6312 = 60 × 130 × 31; k5 +2/+15, bore 0/−15; H7 0/+40, outside 0/−18; C3 23–43.
  it('gives limits and fits at rest of both seats', () => {
    const { shaftSeat, housingSeat } = assessSeats(motor);
    expect(shaftSeat).toMatchObject({
      seatLimitsUm: [2, 15],
      ringLimitsUm: [-15, 0],
      interferenceUm: { min: 2, mean: 16, max: 30 },
      recommendedClass: 'k5',
    });
    expect(housingSeat).toMatchObject({
      seatLimitsUm: [0, 40],
      ringLimitsUm: [-18, 0],
      interferenceUm: { min: -58, mean: -29, max: 0 },
      recommendedClass: 'H7',
    });
    // 16 ± √(6.5² + 7.5²) = 16 ± 9.925
    expect(shaftSeat?.probableUm?.min).toBeCloseTo(6.075, 3);
    expect(shaftSeat?.probableUm?.max).toBeCloseTo(25.925, 3);
  });

  it('gives the internal clearance mounted and running', () => {
    // Di = 1.05·(240 + 130)/5 = 77.7; factor 60/77.7; greatest effective interference 30 − 2 = 28:
    // 23 − 28·0.7722 = 1.378. Running, 10 K: 12.5e-3·10·0.2·(60 + 520) = 14.5 less.
    const clearance = assessSeats({
      ...motor,
      smoothingUm: 2,
      innerWarmerThanOuterK: 10,
    }).internalClearanceUm;
    expect(clearance?.unmounted).toEqual({ min: 23, mean: 33, max: 43 });
    expect(clearance?.mounted?.min).toBeCloseTo(1.378, 3);
    expect(clearance?.mounted?.mean).toBeCloseTo(33 - (14 * 60) / 77.7, 9);
    expect(clearance?.mounted?.max).toBe(43);
    expect(clearance?.running?.min).toBeCloseTo(1.378 - 14.5, 3);
  });

  it('takes the ring temperatures where the difference is not told', () => {
    const told = assessSeats({ ...motor, innerWarmerThanOuterK: 10 }).internalClearanceUm?.running;
    const read = assessSeats({ ...motor, temperaturesC: { innerRing: 70, outerRing: 60 } })
      .internalClearanceUm?.running;
    expect(read?.min).toBeCloseTo(told?.min ?? Number.NaN, 9);
  });

  it('shrinks the outer raceway in a tight housing too', () => {
    // P7 for 130: −68/−28; greatest interference 68; De = 0.95·(60 + 520)/5 = 110.2.
    const tight = assessSeats({ ...motor, shaftClass: 'h6', housingClass: 'P7' })
      .internalClearanceUm?.mounted;
    expect(tight?.min).toBeCloseTo(23 - (15 * 60) / 77.7 - (68 * 110.2) / 130, 9);
  });

  it('takes the measured diameters for the fit (by hand: 60.008 − 59.995 = 13 µm)', () => {
    const seat = assessSeats({
      ...motor,
      shaftMeasuredMm: 60.008,
      boreMeasuredMm: 59.995,
    }).shaftSeat;
    expect(seat?.interferenceUm?.min).toBeCloseTo(13, 9);
    expect(seat?.interferenceUm?.max).toBeCloseTo(13, 9);
  });

  it('keeps the ring’s limits where only the seat was measured', () => {
    const seat = assessSeats({ ...motor, housingMeasuredMm: 130.02 }).housingSeat;
    expect(seat?.interferenceUm).toEqual({ min: -38, mean: -29, max: -20 });
  });

  it('warns where the load needs more than the running fit holds', () => {
    // 0.08·√(60·8000/31) = 9.955
    const result = assessSeats({ ...motor, radialLoadN: 8000 });
    expect(result.shaftSeat?.neededUm).toBeCloseTo(9.955, 3);
    expect(result.cautions.join(' ')).toContain('asks for 10 µm');
  });

  it('gives no needed interference to a ring the load stands still on', () => {
    expect(
      assessSeats({ ...motor, innerLoad: 'stationary', radialLoadN: 8000 }).shaftSeat?.neededUm,
    ).toBeUndefined();
  });

  it('loosens the inner ring of a fast shaft', () => {
    const slow = assessSeats(motor).shaftSeat?.runningUm?.mean ?? 0;
    const fast = assessSeats({ ...motor, speedRpm: 12_000 }).shaftSeat?.runningUm?.mean ?? 0;
    expect(slow - fast).toBeGreaterThan(1);
    expect(slow - fast).toBeLessThan(10);
  });

  it('needs 40 K for 30 µm on 60 mm and stays below the limit', () => {
    expect(assessSeats(motor).mounting).toMatchObject({
      neededC: 60,
      heatToC: 80,
      limitC: 120,
      allowed: true,
    });
    expect(
      assessSeats({ ...motor, designation: '6312-2RS', clearanceGroup: undefined }).mounting
        ?.limitC,
    ).toBe(80);
  });
});

describe('what can’t be said is absent', () => {
  it('answers for one seat where only its size is given', () => {
    const result = assessSeats({ d: 60, shaftClass: 'k5' });
    expect(result.shaftSeat?.interferenceUm?.max).toBe(30);
    expect(result.housingSeat).toBeUndefined();
    expect(result.internalClearanceUm).toBeUndefined();
    expect(result.floatingTravelUm).toBeUndefined();
  });

  it('names every missing record', () => {
    const { cautions, shaftSeat } = assessSeats({ designation: '6312' });
    expect(shaftSeat?.interferenceUm).toBeUndefined();
    expect(cautions.filter((c) => c.includes('is on record'))).toHaveLength(2);
  });

  it('marks dimensions from memory', () => {
    expect(assessSeats({ designation: '6330' }).cautions.join(' ')).toContain('from memory');
  });

  it('has no seats for a plain bearing', () => {
    const result = assessSeats({ plain: true });
    expect(result.shaftSeat).toBeUndefined();
    expect(result.cautions[0]).toContain('plain bearing');
  });
});

describe('cautions', () => {
  it('warn above a thousandth of the diameter', () => {
    // s7 on 60 mm: +83; with the bore −15: 98 µm > 60.
    expect(assessSeats({ d: 60, shaftClass: 's7' }).cautions.join(' ')).toContain('thousandth');
  });

  it('warn where a floating bearing has no ring that can move', () => {
    const stuck = { ...motor, housingClass: 'N7', mustSlide: true };
    expect(assessSeats(stuck).cautions.join(' ')).toContain('must float');
    expect(assessSeats({ ...motor, mustSlide: true }).cautions.join(' ')).not.toContain(
      'must float',
    );
    // Rings that come apart take up the travel between them.
    const separable = { ...stuck, designation: 'NU312', clearanceGroup: undefined };
    expect(assessSeats(separable).cautions.join(' ')).not.toContain('must float');
  });

  it('end with the word that the drawing wins', () => {
    expect(assessSeats(motor).cautions.at(-1)).toContain('drawing wins');
  });
});

describe('tapered seats', () => {
  const sleeve: PositionFit = { designation: '22216K', housingClass: 'H7' };

  it('are not judged by interferences, and say so where nothing is recorded', () => {
    const seat = assessSeats(sleeve).shaftSeat;
    expect(seat?.verdict).toBe('not recorded');
    expect(seat?.interferenceUm).toBeUndefined();
    expect(seat?.reason).toContain('drive-up');
  });

  // A bearing maker's published mounting card, 65–80 mm: 35–40 µm, 1:12 drive-up 0.55–0.65 mm.
  it.each([
    [37, 'as recommended', 0],
    [20, 'looser', 15],
    [50, 'tighter', 10],
  ] as const)(
    'judge a clearance reduction of %d µm: %s',
    (clearanceReductionUm, verdict, amount) => {
      const seat = assessSeats({
        ...sleeve,
        shaftTapered: { taper: '1:12', clearanceReductionUm },
      }).shaftSeat;
      expect(seat).toMatchObject({ verdict, outsideLimitsUm: amount });
    },
  );

  it('judge the drive-up where the reduction was not recorded', () => {
    expect(
      assessSeats({ ...sleeve, shaftTapered: { taper: '1:12', driveUpMm: 0.3 } }).shaftSeat
        ?.verdict,
    ).toBe('looser');
    expect(
      assessSeats({ ...sleeve, shaftTapered: { taper: '1:12', driveUpMm: 0.6 } }).shaftSeat
        ?.verdict,
    ).toBe('as recommended');
  });
});

describe('bad input', () => {
  it.each<[PositionFit, string, string]>([
    [{}, 'size_missing', 'designation'],
    [{ d: 60, D: 50 }, 'diameters_swapped', 'D'],
    [{ d: 600 }, 'size_out_of_range', 'd'],
    [{ D: -1 }, 'size_out_of_range', 'D'],
    [{ d: Number.NaN }, 'not_finite', 'd'],
    [{ designation: 'xyz' }, 'unknown_designation', 'designation'],
    [{ designation: '6312', d: 50 }, 'contradiction', 'd'],
    [{ designation: '6312', D: 120 }, 'contradiction', 'D'],
    [{ designation: '6312', bearingType: 'roller' }, 'contradiction', 'bearingType'],
    [{ designation: '6312/C3', clearanceGroup: 'C4' }, 'contradiction', 'clearanceGroup'],
    [{ d: 60, shaftClass: 'z9' }, 'unknown_class', 'shaftClass'],
    [{ d: 60, shaftClass: 'H7' }, 'unknown_class', 'shaftClass'],
    [{ D: 60, housingClass: 'k6' }, 'unknown_class', 'housingClass'],
    [{ d: 60, housingClass: 'H7' }, 'size_missing', 'D'],
    [{ D: 60, shaftClass: 'k5' }, 'size_missing', 'd'],
    [{ d: 60, shaftMeasuredMm: 2.3625 }, 'measured_in_inches', 'shaftMeasuredMm'],
    [{ D: 130, housingMeasuredMm: 130_010 }, 'factor_1000', 'housingMeasuredMm'],
    [
      { d: 60, temperaturesC: { innerRing: -274 } },
      'below_absolute_zero',
      'temperaturesC.innerRing',
    ],
    [{ d: 60, radialLoadN: -1 }, 'negative', 'radialLoadN'],
    [{ d: 60, staticRatingN: 0 }, 'out_of_range', 'staticRatingN'],
    [{ d: 60, pOverC: Infinity }, 'not_finite', 'pOverC'],
    [{ d: 60, alphaPerK: { shaft: 12 } }, 'out_of_range', 'alphaPerK.shaft'],
    [{ d: 60, shaftBoreMm: 60 }, 'out_of_range', 'shaftBoreMm'],
    [{ d: 60, smoothingUm: -2 }, 'negative', 'smoothingUm'],
    [{ d: 60, shaftHistory: { yearsInService: -1 } }, 'negative', 'shaftHistory.yearsInService'],
  ])('%j is refused as %s at %s', (input, code, field) => {
    expect(() => assessSeats(input)).toThrow(expect.objectContaining({ code, field }));
  });
});

describe('running fit over temperature', () => {
  it('loosens the shaft seat steadily as the inner ring warms up', () => {
    const c = fc.double({ min: -40, max: 150, noNaN: true });
    fc.assert(
      fc.property(c, fc.double({ min: 0.1, max: 50, noNaN: true }), (t, more) => {
        const at = (innerRing: number) =>
          assessSeats({ ...motor, temperaturesC: { innerRing } }).shaftSeat?.runningUm?.mean ??
          Number.NaN;
        expect(at(t + more)).toBeLessThan(at(t));
      }),
    );
  });
});
