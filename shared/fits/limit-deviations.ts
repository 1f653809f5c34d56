import { findColumn } from './find-column.ts';
import type { LimitsUm } from './fit-types.ts';
import {
  deltaUm,
  fineLowerDeviationUm,
  fineUpToMm,
  jHoleUpperUm,
  jShaftLowerUm,
  lowerDeviationUm,
  upperDeviationUm,
} from './tables/fundamental-deviations.ts';
import { parseToleranceClass } from './tolerance-class.ts';
import { sizeColumn, toleranceGradeUm } from './tolerance-grade.ts';

function at(row: readonly number[] | undefined, column: number): number {
  const value = row?.[column];
  if (value === undefined) throw new RangeError('A table of ISO 286-1 has no such column.');
  return value;
}

/** Upper deviation es of shafts d … h. */
function shaftUpperUm(letter: string, column: number): number | undefined {
  const rows: Readonly<Record<string, readonly number[]>> = upperDeviationUm;
  return rows[letter] && at(rows[letter], column);
}

/** Lower deviation ei of shafts j … s. */
function shaftLowerUm(letter: string, grade: number, sizeMm: number, column: number): number {
  if (letter === 'j') return at(jShaftLowerUm[grade], column);
  if (letter === 'k' && (grade < 4 || grade > 7)) return 0;
  if (letter === 'r' || letter === 's') {
    return at(fineLowerDeviationUm[letter], findColumn(sizeMm, fineUpToMm) ?? -1);
  }
  const rows: Readonly<Record<string, readonly number[]>> = lowerDeviationUm;
  return at(rows[letter], column);
}

/** Upper deviation ES of holes J … R: the shaft's turned over, with Δ for the fine grades. */
function holeUpperUm(letter: string, grade: number, sizeMm: number, column: number): number {
  if (letter === 'J') return at(jHoleUpperUm[grade], column);
  // ISO 286-1 Table 4: N9 and coarser end at the nominal size (at −4 µm up to 3 mm).
  if (letter === 'N' && grade > 8) return column === 0 ? -4 : 0;
  // ISO 286-1 Table 4, note: M6 above 250 up to 315 mm is −9, not −11.
  if (letter === 'M' && grade === 6 && sizeMm > 250 && sizeMm <= 315) return -9;
  const withDelta = grade <= (letter === 'K' || letter === 'M' || letter === 'N' ? 8 : 7);
  const delta = withDelta ? at(deltaUm[grade], column) : 0;
  // The hole K mirrors the k of grades 4–7 whatever its own grade.
  const lower = shaftLowerUm(letter.toLowerCase(), letter === 'K' ? 7 : grade, sizeMm, column);
  return -lower + delta;
}

/**
 * Limit deviations of a tolerance class, ISO 286-1:2010 (finished values as in ISO 286-2): from the
 * standard's tables of grades and fundamental deviations, with the intermediate steps of r and s and
 * the rule of Δ for the holes K, M, N to IT8 and P, R to IT7. js and JS are ± IT/2, halves kept.
 *
 * @param sizeMm - nominal size, mm; above 0 up to 500
 * @param toleranceClass - e.g. `k5`, `H7`, `JS6`
 * @returns [lower, upper] deviation from the nominal size, µm; exact
 * @throws {FitInputError} `unknown_class`, `size_out_of_range`
 *
 * @example
 * limitDeviationsUm(40, 'k5') // => [2, 13]
 */
export function limitDeviationsUm(
  sizeMm: number,
  toleranceClass: string,
  fields: { size: string; class: string } = { size: 'size', class: 'class' },
): LimitsUm {
  const { seat, letter, grade } = parseToleranceClass(toleranceClass, fields.class);
  const column = sizeColumn(sizeMm, fields.size);
  const width = toleranceGradeUm(sizeMm, grade, fields.size);
  if (letter.toLowerCase() === 'js') return [-width / 2, width / 2];
  const upper = shaftUpperUm(letter.toLowerCase(), column);
  if (upper !== undefined) {
    // 0 − x, not −x: h and H must give 0, never −0.
    return seat === 'shaft' ? [upper - width, upper] : [0 - upper, 0 - upper + width];
  }
  if (seat === 'shaft') {
    const lower = shaftLowerUm(letter, grade, sizeMm, column);
    return [lower, lower + width];
  }
  const holeUpper = holeUpperUm(letter, grade, sizeMm, column);
  return [holeUpper - width, holeUpper + 0];
}
