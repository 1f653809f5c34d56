import { describe, expect, it } from 'vitest';
import { readPositionFit } from '#shared/fits/read-position-fit.ts';

describe('readPositionFit', () => {
  it('takes every key of the command line', () => {
    const input = {
      designation: '6312',
      d: 60,
      D: 130,
      B: 31,
      bearingClass: 'Normal',
      bearingType: 'ball',
      clearanceGroup: 'C3',
      capped: false,
      shaftClass: 'k5',
      housingClass: 'H7',
      shaftMeasuredMm: 60,
      boreMeasuredMm: 60,
      outsideMeasuredMm: 130,
      housingMeasuredMm: 130,
      temperaturesC: { shaft: 60, innerRing: 70, outerRing: 60, housing: 50 },
      innerWarmerThanOuterK: 10,
      shaftMaterial: 'steel',
      shaftBoreMm: 0,
      housingMaterial: 'cast iron',
      alphaPerK: { shaft: 12e-6, ring: 12e-6, housing: 10e-6 },
      innerLoad: 'rotating',
      outerLoad: 'stationary',
      loadLevel: 'normal',
      pOverC: 0.1,
      splitHousing: false,
      heatThroughShaft: false,
      mustSlide: false,
      radialLoadN: 1000,
      staticRatingN: 50_000,
      warmerThanSurroundingsK: 10,
      smoothingUm: 2,
      slideOnClearanceUm: 30,
      handlingMarginK: 20,
      spanMm: 500,
    };
    expect(readPositionFit(input)).toEqual(input);
  });

  it('takes null for not known', () => {
    expect(readPositionFit({ d: 60, D: null })).toEqual({ d: 60 });
  });

  it.each([
    [[1], 'not_an_object', ''],
    ['60', 'not_an_object', ''],
    [null, 'not_an_object', ''],
    [{ diameter: 60 }, 'unknown_key', 'diameter'],
    [{ speedRpm: 60 }, 'unknown_key', 'speedRpm'],
    [{ toString: 1 }, 'unknown_key', 'toString'],
    [{ temperaturesC: { shat: 1 } }, 'unknown_key', 'temperaturesC.shat'],
    [{ temperaturesC: 60 }, 'wrong_type', 'temperaturesC'],
    [{ d: '60' }, 'wrong_type', 'd'],
    [{ capped: 1 }, 'wrong_type', 'capped'],
    [{ shaftClass: 5 }, 'wrong_type', 'shaftClass'],
    [{ alphaPerK: { ring: 'x' } }, 'wrong_type', 'alphaPerK.ring'],
    [{ clearanceGroup: 'C6' }, 'unknown_clearance_group', 'clearanceGroup'],
    [{ clearanceGroup: -3 }, 'unknown_clearance_group', 'clearanceGroup'],
    [{ innerLoad: 'spinning' }, 'unknown_value', 'innerLoad'],
    [{ bearingClass: '4' }, 'unknown_value', 'bearingClass'],
  ])('refuses %j as %s at "%s"', (input, code, field) => {
    expect(() => readPositionFit(input)).toThrow(expect.objectContaining({ code, field }));
  });
});
