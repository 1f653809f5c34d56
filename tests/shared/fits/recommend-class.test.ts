import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { limitDeviationsUm } from '#shared/fits/limit-deviations.ts';
import { loadLevelOf } from '#shared/fits/load-level.ts';
import { recommendHousingClass } from '#shared/fits/recommend-housing-class.ts';
import { recommendShaftClass } from '#shared/fits/recommend-shaft-class.ts';
import type { HousingDemand, ShaftDemand } from '#shared/fits/recommendation.ts';

const shaft = (demand: Partial<ShaftDemand>): ShaftDemand => ({
  d: 60,
  type: 'ball',
  load: 'rotating',
  level: 'normal',
  mustSlide: false,
  clearanceAboveNormal: false,
  ...demand,
});
const housing = (demand: Partial<HousingDemand>): HousingDemand => ({
  D: 130,
  type: 'ball',
  load: 'stationary',
  level: 'normal',
  mustSlide: false,
  split: false,
  heatThroughShaft: false,
  thinHousing: false,
  lightAlloy: false,
  highAccuracy: false,
  quietElectricMachine: false,
  ...demand,
});

/** Decision table of common practice, no single source; makers differ by a step. */
describe('shaft class', () => {
  it.each([
    ['ball', 'light', 18, 'h5'],
    ['ball', 'light', 18.1, 'j6'],
    ['ball', 'light', 100, 'j6'],
    ['ball', 'light', 200, 'k6'],
    ['ball', 'normal', 10, 'j5'],
    ['ball', 'normal', 60, 'k5'],
    ['ball', 'normal', 100, 'k5'],
    ['ball', 'normal', 140, 'm5'],
    ['ball', 'normal', 200, 'm6'],
    ['ball', 'normal', 280, 'n6'],
    ['ball', 'heavy', 60, 'k5'],
    ['roller', 'light', 40, 'j6'],
    ['roller', 'light', 140, 'k6'],
    ['roller', 'light', 200, 'm6'],
    ['roller', 'normal', 40, 'k5'],
    ['roller', 'normal', 100, 'm5'],
    ['roller', 'normal', 140, 'm6'],
    ['roller', 'normal', 200, 'n6'],
    ['roller', 'normal', 400, 'p6'],
    ['roller', 'heavy', 45, 'm5'],
    ['roller', 'heavy', 50, 'n6'],
    ['roller', 'heavy', 140, 'n6'],
    ['roller', 'heavy', 200, 'p6'],
    ['roller', 'heavy', 260, 'r6'],
    ['spherical roller', 'light', 60, 'm5'],
    ['spherical roller', 'normal', 40, 'k5'],
    ['spherical roller', 'normal', 65, 'm5'],
    ['spherical roller', 'normal', 100, 'm6'],
    ['spherical roller', 'normal', 140, 'n6'],
    ['spherical roller', 'normal', 280, 'p6'],
    ['spherical roller', 'normal', 500, 'r6'],
    ['spherical roller', 'heavy', 100, 'n6'],
    ['spherical roller', 'heavy', 140, 'p6'],
    ['spherical roller', 'heavy', 180, 'r6'],
  ] as const)('%s bearing, %s load, %d mm: %s', (type, level, d, expected) => {
    expect(recommendShaftClass(shaft({ type, level, d }))?.toleranceClass).toBe(expected);
    expect(
      recommendShaftClass(shaft({ type, level, d, load: 'indeterminate' }))?.toleranceClass,
    ).toBe(expected);
  });

  it('says nothing where the table ends', () => {
    expect(recommendShaftClass(shaft({ level: 'light', d: 210 }))).toBeUndefined();
    expect(recommendShaftClass(shaft({ d: 300 }))).toBeUndefined();
  });

  it('is loose under a stationary load, looser where the ring must slide', () => {
    expect(recommendShaftClass(shaft({ load: 'stationary' }))?.toleranceClass).toBe('h6');
    expect(
      recommendShaftClass(shaft({ load: 'stationary', mustSlide: true }))?.toleranceClass,
    ).toBe('g6');
    expect(
      recommendShaftClass(shaft({ load: 'stationary', mustSlide: true, d: 300 }))?.toleranceClass,
    ).toBe('f6');
  });

  it('is a step tighter on a hollow shaft, from half the diameter on', () => {
    expect(recommendShaftClass(shaft({ shaftBoreMm: 30 }))?.toleranceClass).toBe('k5');
    const hollow = recommendShaftClass(shaft({ shaftBoreMm: 31 }));
    expect(hollow?.toleranceClass).toBe('m5');
    expect(hollow?.reason).toContain('hollow');
  });

  it('asks for a clearance above CN with the heavy classes, and not where it is there', () => {
    expect(recommendShaftClass(shaft({ type: 'roller', level: 'heavy' }))?.cautions).toHaveLength(
      1,
    );
    expect(
      recommendShaftClass(shaft({ type: 'roller', level: 'heavy', clearanceAboveNormal: true }))
        ?.cautions,
    ).toEqual([]);
  });

  it('says when it had to assume the load level', () => {
    expect(recommendShaftClass(shaft({ level: undefined }))?.reason).toContain('normal assumed');
  });

  it('never loosens with a heavier load or from balls to rollers (common practice, no source)', () => {
    const least = (demand: Partial<ShaftDemand>, d: number) => {
      const found = recommendShaftClass(shaft({ ...demand, d }));
      return found && limitDeviationsUm(d, found.toleranceClass)[0];
    };
    fc.assert(
      fc.property(fc.double({ min: 5, max: 200, noNaN: true }), (d) => {
        const row = (['light', 'normal', 'heavy'] as const).map(
          (level) => least({ type: 'roller', level }, d) ?? 0,
        );
        expect(row).toEqual([...row].sort((a, b) => a - b));
        expect(least({ type: 'roller' }, d)).toBeGreaterThanOrEqual(
          least({ type: 'ball' }, d) ?? Infinity,
        );
      }),
    );
  });

  it('never gives a larger shaft a looser letter (common practice, no source)', () => {
    const size = fc.double({ min: 5, max: 280, noNaN: true });
    const letters = 'hjkmnpr';
    fc.assert(
      fc.property(
        size,
        size,
        fc.constantFrom('ball', 'roller', 'spherical roller' as const),
        (a, b, type) => {
          const rank = (d: number) =>
            letters.indexOf(
              recommendShaftClass(shaft({ d, type }))?.toleranceClass.charAt(0) ?? '?',
            );
          expect(rank(Math.max(a, b))).toBeGreaterThanOrEqual(rank(Math.min(a, b)));
        },
      ),
    );
  });
});

describe('housing class', () => {
  it.each([
    [{}, 'H7'],
    [{ level: 'heavy' }, 'H7'],
    [{ level: 'light' }, 'H8'],
    [{ split: true }, 'H8'],
    [{ heatThroughShaft: true }, 'G7'],
    [{ heatThroughShaft: true, D: 450 }, 'F7'],
    [{ quietElectricMachine: true }, 'H6'],
    [{ highAccuracy: true }, 'JS6'],
    [{ highAccuracy: true, type: 'roller' }, 'K6'],
    [{ load: 'rotating', level: 'light' }, 'M7'],
    [{ load: 'rotating' }, 'N7'],
    [{ load: 'rotating', level: 'heavy' }, 'P7'],
    [{ load: 'rotating', thinHousing: true }, 'P7'],
    [{ load: 'indeterminate', level: 'light' }, 'J7'],
    [{ load: 'indeterminate' }, 'K7'],
    [{ load: 'indeterminate', level: 'heavy' }, 'M7'],
    [{ load: 'indeterminate', mustSlide: true }, 'J7'],
    [{ lightAlloy: true }, 'J7'],
    [{ lightAlloy: true, level: 'light' }, 'H7'],
    [{ lightAlloy: true, mustSlide: true }, 'H7'],
    [{ load: 'rotating', lightAlloy: true }, 'P7'],
  ] as const)('%j: %s', (demand, expected) => {
    const found = recommendHousingClass(housing(demand));
    expect(found.toleranceClass).toBe(expected);
    expect(found.reason).toContain(expected);
  });

  it('gives a split housing nothing tighter than K7 and says so', () => {
    const found = recommendHousingClass(housing({ load: 'rotating', split: true }));
    expect(found.toleranceClass).toBe('K7');
    expect(found.cautions[0]).toContain('one-piece');
  });
});

describe('load level', () => {
  it('is light to 0.06 C, normal to 0.12 C and heavy above', () => {
    expect([0, 0.06, 0.061, 0.12, 0.121].map(loadLevelOf)).toEqual([
      'light',
      'light',
      'normal',
      'normal',
      'heavy',
    ]);
  });
});
