import { describe, expect, it } from 'vitest';
import { assessSeats } from '#shared/fits/assess-seats.ts';
import { seatVerdict } from '#shared/fits/seat-verdict.ts';

const turning = {
  designation: '6312',
  innerLoad: 'rotating',
  outerLoad: 'stationary',
  loadLevel: 'normal',
} as const;

describe('verdict on a seat', () => {
  it('is not recorded where neither class nor diameter is known', () => {
    expect(assessSeats(turning).shaftSeat?.verdict).toBe('not recorded');
  });

  it('is absent where a class is known but nothing to compare it with', () => {
    expect(seatVerdict({ recorded: [2, 15] })).toEqual({});
  });

  it.each([
    ['k5', 'as recommended', 0],
    ['h6', 'looser', 21],
    ['m6', 'tighter', 15],
    ['k6', 'tighter', 6],
  ] as const)(
    'calls a shaft in %s where k5 is asked for %s, by %d µm',
    (shaftClass, verdict, amount) => {
      // By hand, d = 60: k5 +2/+15; h6 −19/0; m6 +11/+30; k6 +2/+21.
      expect(assessSeats({ ...turning, shaftClass }).shaftSeat).toMatchObject({
        verdict,
        outsideLimitsUm: amount,
      });
    },
  );

  it.each([
    ['H7', 'as recommended', 0],
    ['G7', 'looser', 14],
    ['J7', 'tighter', 14],
  ] as const)(
    'calls a housing in %s where H7 is asked for %s, by %d µm',
    (housingClass, verdict, amount) => {
      // By hand, D = 130: H7 0/+40; G7 +14/+54; J7 −14/+26.
      expect(assessSeats({ ...turning, housingClass }).housingSeat).toMatchObject({
        verdict,
        outsideLimitsUm: amount,
      });
    },
  );

  it('measures a worn shaft against its limits (by hand: 59.985 is 17 µm below +2)', () => {
    const seat = assessSeats({ ...turning, shaftClass: 'k5', shaftMeasuredMm: 59.985 }).shaftSeat;
    expect(seat).toMatchObject({ verdict: 'looser', outsideLimitsUm: 17 });
  });

  it('measures a worn housing against its limits (by hand: 130.060 is 20 µm above +40)', () => {
    const seat = assessSeats({
      ...turning,
      housingClass: 'H7',
      housingMeasuredMm: 130.06,
    }).housingSeat;
    expect(seat).toMatchObject({ verdict: 'looser', outsideLimitsUm: 20 });
  });

  it('holds a size exactly on a limit for right', () => {
    const seat = assessSeats({ ...turning, shaftClass: 'k5', shaftMeasuredMm: 60.015 }).shaftSeat;
    expect(seat).toMatchObject({ verdict: 'as recommended', outsideLimitsUm: 0 });
  });

  it('takes the recommended limits where no class is on record', () => {
    const seat = assessSeats({ ...turning, shaftMeasuredMm: 60.02 }).shaftSeat;
    expect(seat).toMatchObject({ verdict: 'tighter', outsideLimitsUm: 5 });
  });
});
