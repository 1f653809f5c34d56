import { findColumn } from './find-column.ts';
import { FitInputError } from './fit-input-error.ts';
import { gradesUm, gradeUpToMm } from './tables/tolerance-grades.ts';

/** Column of a size in the tables of ISO 286-1; throws `size_out_of_range` outside 0–500 mm. */
export function sizeColumn(sizeMm: number, field = 'size'): number {
  const column = sizeMm > 0 ? findColumn(sizeMm, gradeUpToMm) : undefined;
  if (column === undefined) {
    throw new FitInputError(
      'size_out_of_range',
      field,
      `${sizeMm} mm is outside the tables, which cover nominal sizes above 0 up to 500 mm.`,
    );
  }
  return column;
}

/**
 * Standard tolerance of a grade, ISO 286-1:2010 Table 1.
 *
 * @param sizeMm - nominal size, mm; above 0 up to 500
 * @param grade - 1 … 14 for IT1 … IT14
 * @returns width of the tolerance, µm
 * @throws {FitInputError} `size_out_of_range`, `out_of_range` (grade)
 *
 * @example
 * toleranceGradeUm(80, 7) // => 30
 */
export function toleranceGradeUm(sizeMm: number, grade: number, field = 'size'): number {
  const column = sizeColumn(sizeMm, field);
  const width = gradesUm[grade - 1]?.[column];
  if (width === undefined) {
    throw new FitInputError('out_of_range', 'grade', `IT${grade} is not one of IT1 to IT14.`);
  }
  return width;
}
