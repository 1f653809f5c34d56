import { describe, expect, it } from 'vitest';
import { gradesUm, gradeUpToMm } from '#shared/fits/tables/tolerance-grades.ts';
import { toleranceGradeUm } from '#shared/fits/tolerance-grade.ts';

/** ISO 286-1: i = 0.45·∛D + 0.001·D, D the geometric mean of the range; IT5 … IT10 as multiples. */
const multiples: Readonly<Record<number, number>> = { 5: 7, 6: 10, 7: 16, 8: 25, 9: 40, 10: 64 };

describe('tolerance grades', () => {
  it.each(Object.entries(multiples).map(([g, m]) => [Number(g), m] as const))(
    'IT%i follows the formula of ISO 286-1 within its rounding',
    (grade, multiple) => {
      for (let column = 1; column < gradeUpToMm.length; column += 1) {
        const mean = Math.sqrt((gradeUpToMm[column - 1] ?? 0) * (gradeUpToMm[column] ?? 0));
        const formula = multiple * (0.45 * Math.cbrt(mean) + 0.001 * mean);
        const table = gradesUm[grade - 1]?.[column] ?? 0;
        // Rounded to 1 µm to 100, to 5 up to 200, to 10 above; the odd cell misses by 1 µm more.
        const step = formula > 200 ? 10 : formula > 100 ? 5 : 1;
        expect(Math.abs(table - formula)).toBeLessThanOrEqual(step / 2 + 1);
      }
    },
  );

  it('gives published values of IT1 to IT9 (table of h1 … h9, a tool maker’s catalogue)', () => {
    expect([1, 2, 3, 4, 5, 6, 7, 8, 9].map((g) => toleranceGradeUm(3, g))).toEqual([
      0.8, 1.2, 2, 3, 4, 6, 10, 14, 25,
    ]);
    expect([1, 2, 3, 4, 5, 6, 7, 8, 9].map((g) => toleranceGradeUm(100, g))).toEqual([
      2.5, 4, 6, 10, 15, 22, 35, 54, 87,
    ]);
    expect([1, 2, 3, 4, 5, 6, 7, 8, 9].map((g) => toleranceGradeUm(450, g))).toEqual([
      8, 10, 15, 20, 27, 40, 63, 97, 155,
    ]);
  });

  it('makes IT12 to IT14 ten times the grade five lower', () => {
    for (const size of [5, 40, 100, 300]) {
      for (const grade of [12, 13, 14]) {
        expect(toleranceGradeUm(size, grade)).toBe(10 * toleranceGradeUm(size, grade - 5));
      }
    }
  });

  it('refuses a grade that is not in the table', () => {
    expect(() => toleranceGradeUm(40, 0)).toThrow(
      expect.objectContaining({ code: 'out_of_range' }),
    );
    expect(() => toleranceGradeUm(40, 15)).toThrow(
      expect.objectContaining({ code: 'out_of_range' }),
    );
  });
});
