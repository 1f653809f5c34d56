import { FitInputError } from './fit-input-error.ts';
import type { SeatName } from './fit-types.ts';

/** A tolerance class such as k5 or H7, taken apart. */
export interface ToleranceClass {
  /** Shafts are written small, holes (housing bores) in capitals. */
  seat: SeatName;
  /** Letter or letters as written: d … s, js, D … R, JS. */
  letter: string;
  /** Grade: 7 for IT7. */
  grade: number;
}

const shaftLetters = ['d', 'e', 'f', 'g', 'h', 'j', 'js', 'k', 'm', 'n', 'p', 'r', 's'];
const holeLetters = ['D', 'E', 'F', 'G', 'H', 'J', 'JS', 'K', 'M', 'N', 'P', 'R'];

/** The grades a letter exists for: ISO 286-1:2010 Tables 2–5. */
function gradesOf(letter: string): readonly [number, number] {
  if (letter === 'j') return [5, 7];
  if (letter === 'J') return [6, 8];
  if (letter === 'K') return [3, 8];
  if (['M', 'N', 'P', 'R'].includes(letter)) return [3, 14];
  return [1, 14];
}

/**
 * Takes a tolerance class apart: letter (fundamental deviation) and grade.
 *
 * @param text - e.g. `k5`, `H7`, `JS6`; blanks around and between are ignored
 * @param field - name of the input, for the error
 * @throws {FitInputError} `unknown_class` for a letter bearing seats do not use (outside d … s,
 *   D … R) or a grade the letter does not exist for (j: 5–7, J: 6–8, K: 3–8; else IT1–IT14)
 *
 * @example
 * parseToleranceClass('JS6') // => { seat: 'housing', letter: 'JS', grade: 6 }
 */
export function parseToleranceClass(text: string, field = 'class'): ToleranceClass {
  const match = /^([A-Za-z]{1,2})(\d{1,2})$/.exec(text.replace(/\s/g, ''));
  const letter = match?.[1] ?? '';
  const grade = Number(match?.[2]);
  const isShaft = shaftLetters.includes(letter);
  if (!isShaft && !holeLetters.includes(letter)) {
    throw new FitInputError(
      'unknown_class',
      field,
      `"${text}" is no tolerance class of a bearing seat; expected a letter d … s (shaft) or D … R (housing) and a grade, such as k5 or H7.`,
    );
  }
  const [from, to] = gradesOf(letter);
  if (grade < from || grade > to) {
    throw new FitInputError(
      'unknown_class',
      field,
      `"${text}" does not exist; ${letter} has the grades ${from} to ${to}.`,
    );
  }
  return { seat: isShaft ? 'shaft' : 'housing', letter, grade };
}
