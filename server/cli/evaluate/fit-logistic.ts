/** A logistic model: log-odds are the base and the weighed terms together. */
export interface LogisticFit {
  base: number;
  weights: number[];
}

export interface FitCase {
  terms: readonly number[];
  loose: boolean;
  /** How much the case counts. */
  weight: number;
}

export interface FitOptions {
  /** Strength of the quadratic penalty on weights of terms scaled to their standard deviation. */
  penalty: number;
  /** Sign each weight may have: +1, -1, or 0 for either. What speaks for looseness must not speak against it. */
  signs: readonly (-1 | 0 | 1)[];
}

const roundsMax = 60;

/**
 * Fits by iteratively reweighted least squares (Newton's method) with a ridge penalty; terms whose
 * weight comes out with the wrong sign are left out, worst first, and the fit is repeated.
 */
export function fitLogistic(cases: readonly FitCase[], options: FitOptions): LogisticFit {
  const count = cases[0]?.terms.length ?? 0;
  const scale = standardDeviations(cases, count);
  let active = Array.from({ length: count }, (_, j) => j).filter((j) => scale[j]! > 0);
  for (;;) {
    const solution = newton(cases, active, scale, options.penalty);
    let worst: number | null = null;
    let worstSize = 0;
    active.forEach((j, place) => {
      const wrong = -(options.signs[j] ?? 0) * solution[place + 1]!;
      if (wrong > worstSize) [worst, worstSize] = [j, wrong];
    });
    if (worst === null) {
      const weights = new Array<number>(count).fill(0);
      active.forEach((j, place) => (weights[j] = solution[place + 1]! / scale[j]!));
      return { base: solution[0]!, weights };
    }
    active = active.filter((j) => j !== worst);
  }
}

export function logOdds(fit: LogisticFit, terms: readonly number[]): number {
  return terms.reduce((sum, term, j) => sum + term * (fit.weights[j] ?? 0), fit.base);
}

export const logistic = (x: number) => 1 / (1 + Math.exp(-x));

function standardDeviations(cases: readonly FitCase[], count: number): number[] {
  return Array.from({ length: count }, (_, j) => {
    const mean = cases.reduce((sum, { terms }) => sum + terms[j]!, 0) / cases.length;
    const square = cases.reduce((sum, { terms }) => sum + (terms[j]! - mean) ** 2, 0);
    return Math.sqrt(square / cases.length);
  });
}

function newton(
  cases: readonly FitCase[],
  active: readonly number[],
  scale: readonly number[],
  penalty: number,
): Float64Array {
  const size = active.length + 1;
  const beta = new Float64Array(size);
  const x = new Float64Array(size);
  for (let round = 0; round < roundsMax; round++) {
    const hessian = Array.from({ length: size }, () => new Float64Array(size));
    const gradient = new Float64Array(size);
    for (const { terms, loose, weight } of cases) {
      x[0] = 1;
      active.forEach((j, place) => (x[place + 1] = terms[j]! / scale[j]!));
      let odds = 0;
      for (let j = 0; j < size; j++) odds += x[j]! * beta[j]!;
      const p = logistic(odds);
      const curve = Math.max(1e-9, weight * p * (1 - p));
      const miss = weight * ((loose ? 1 : 0) - p);
      for (let j = 0; j < size; j++) {
        gradient[j]! += miss * x[j]!;
        for (let k = 0; k <= j; k++) hessian[j]![k]! += curve * x[j]! * x[k]!;
      }
    }
    for (let j = 0; j < size; j++) {
      for (let k = 0; k < j; k++) hessian[k]![j] = hessian[j]![k]!;
      // The base is not penalised: it carries the mix of the set.
      const ridge = j === 0 ? 1e-6 : penalty;
      hessian[j]![j]! += ridge;
      gradient[j]! -= ridge * beta[j]!;
    }
    const step = solve(hessian, gradient);
    const longest = Math.max(...step.map(Math.abs));
    const damp = Math.min(1, 4 / longest);
    for (let j = 0; j < size; j++) beta[j]! += damp * step[j]!;
    if (longest < 1e-8) break;
  }
  return beta;
}

/** Gaussian elimination with row exchange; both arguments are used up. */
function solve(matrix: Float64Array[], right: Float64Array): Float64Array {
  const size = right.length;
  for (let column = 0; column < size; column++) {
    let pivot = column;
    for (let row = column + 1; row < size; row++) {
      if (Math.abs(matrix[row]![column]!) > Math.abs(matrix[pivot]![column]!)) pivot = row;
    }
    [matrix[column], matrix[pivot]] = [matrix[pivot]!, matrix[column]!];
    [right[column], right[pivot]] = [right[pivot]!, right[column]!];
    for (let row = column + 1; row < size; row++) {
      const factor = matrix[row]![column]! / matrix[column]![column]!;
      for (let k = column; k < size; k++) matrix[row]![k]! -= factor * matrix[column]![k]!;
      right[row]! -= factor * right[column]!;
    }
  }
  for (let row = size - 1; row >= 0; row--) {
    for (let k = row + 1; k < size; k++) right[row]! -= matrix[row]![k]! * right[k]!;
    right[row]! /= matrix[row]![row]!;
  }
  return right;
}
