import { describe, expect, it } from 'vitest';
import { boreLimitsUm, outsideLimitsUm } from '#shared/fits/bearing-tolerances.ts';

/** Columns of the mean deviations in a bearing maker's published tables of resultant fits (Normal). */
describe('ISO 492 mean deviations', () => {
  it.each([
    [3, -8],
    [10, -8],
    [18, -8],
    [25, -10],
    [50, -12],
    [60, -15],
    [120, -20],
    [150, -25],
    [250, -30],
    [300, -35],
  ])('bore %d mm, class Normal: %d µm', (d, lower) => {
    expect(boreLimitsUm(d, 'Normal')).toEqual([lower, 0]);
  });

  it.each([
    [10, -8],
    [18, -8],
    [30, -9],
    [50, -11],
    [80, -13],
    [120, -15],
    [150, -18],
    [151, -25],
    [180, -25],
    [250, -30],
    [315, -35],
    [400, -40],
    [500, -45],
  ])('outside diameter %d mm, class Normal: %d µm', (D, lower) => {
    expect(outsideLimitsUm(D, 'Normal')).toEqual([lower, 0]);
  });

  it('narrows from Normal over 6 to 5 (ISO 492:2014, two published tables)', () => {
    expect([boreLimitsUm(60, '6'), boreLimitsUm(60, '5')]).toEqual([
      [-12, 0],
      [-9, 0],
    ]);
    expect([outsideLimitsUm(130, '6'), outsideLimitsUm(130, '5')]).toEqual([
      [-15, 0],
      [-11, 0],
    ]);
  });

  it('says nothing where a class is not tabulated', () => {
    expect(boreLimitsUm(450, '5')).toBeUndefined();
    expect(boreLimitsUm(2, 'Normal')).toBeUndefined();
    expect(outsideLimitsUm(5, 'Normal')).toBeUndefined();
  });
});
