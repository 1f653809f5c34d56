import { describe, expect, it } from 'vitest';
import { bearingByDesignation } from '#shared/fits/bearing-designation.ts';

describe('bearingByDesignation', () => {
  // ISO 15 boundary dimensions, equal in two published texts.
  it.each([
    ['6312', 'ball', 60, 130, 31],
    ['6205', 'ball', 25, 52, 15],
    ['6000', 'ball', 10, 26, 8],
    ['6203', 'ball', 17, 40, 12],
    ['6021', 'ball', 105, 160, 26],
    ['NU216', 'roller', 80, 140, 26],
    ['NU324', 'roller', 120, 260, 55],
    ['22216', 'spherical roller', 80, 140, 33],
    ['22320', 'spherical roller', 100, 215, 73],
  ])('knows %s', (designation, type, d, D, B) => {
    expect(bearingByDesignation(designation)).toMatchObject({ type, d, D, B });
  });

  it('gives bearings of one dimension series the same boundary dimensions (ISO 15)', () => {
    const { d, D, B } = bearingByDesignation('6312');
    expect(bearingByDesignation('NJ312')).toMatchObject({ d, D, B });
    expect(bearingByDesignation('7312')).toMatchObject({ d, D, B });
  });

  it('reads the supplements the trade agrees on', () => {
    expect(bearingByDesignation('6312-2Z/C3')).toMatchObject({
      capped: true,
      clearanceGroup: 'C3',
      d: 60,
    });
    expect(bearingByDesignation('nu 312')).toMatchObject({ basic: 'NU312', separable: true });
    expect(bearingByDesignation('22316 K C4')).toMatchObject({
      taperedBore: true,
      clearanceGroup: 'C4',
    });
    expect(bearingByDesignation('6312')).toMatchObject({
      capped: false,
      taperedBore: false,
      separable: false,
    });
  });

  it.each(['', '9999', '6399', '631', 'NU12', '6312X', '6312-ABC', 'ball', '22204'])(
    'refuses "%s"',
    (designation) => {
      expect(() => bearingByDesignation(designation)).toThrow(
        expect.objectContaining({ code: 'unknown_designation', field: 'designation' }),
      );
    },
  );
});
