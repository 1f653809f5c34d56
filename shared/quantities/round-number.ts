/**
 * Rounds to decimals as a person does on paper: by the digits the number is written with, halves
 * away from zero. `toFixed` rounds the binary value instead, and makes 1.00 of 1.005.
 *
 * @param value - any number; NaN and infinities stay what they are
 * @param decimals - whole number, 0 to 20
 * @returns the double nearest to the rounded decimal; 0 and never -0 where everything is rounded off
 * @throws {RangeError} if decimals are outside their range
 *
 * @example
 * roundToDecimals(-1.005, 2) // => -1.01
 */
export function roundToDecimals(value: number, decimals: number): number {
  checkWhole(decimals, 0, 20);
  if (!Number.isFinite(value)) return value;
  const size = shift(Math.abs(value), decimals);
  // From 2^53 on there are no fractions left to round.
  const rounded = size < 2 ** 52 ? shift(Math.round(size), -decimals) : Math.abs(value);
  return rounded === 0 ? 0 : Math.sign(value) * rounded;
}

/**
 * Rounds to significant digits, in the same way.
 *
 * @param digits - whole number, 1 to 17
 * @throws {RangeError} if digits are outside their range
 *
 * @example
 * roundToSignificant(0.012345, 3) // => 0.0123
 */
export function roundToSignificant(value: number, digits: number): number {
  checkWhole(digits, 1, 17);
  if (!Number.isFinite(value) || value === 0) return value === 0 ? 0 : value;
  const places = digits - 1 - decadeOf(value);
  return Math.sign(value) * shift(Math.round(shift(Math.abs(value), places)), -places);
}

/** @returns power of ten of the first digit of a finite number other than 0: 2 for 345, -2 for 0.012 */
export function decadeOf(value: number): number {
  // By the digits: Math.log10 is off by a rounding just below a power of ten.
  return Number(Math.abs(value).toExponential().split('e')[1]);
}

/** Moves the decimal point in the written number, so that no product is rounded on the way. */
function shift(value: number, places: number): number {
  const [digits, power] = value.toExponential().split('e');
  return Number(`${digits}e${Number(power) + places}`);
}

function checkWhole(value: number, min: number, max: number): void {
  if (!Number.isInteger(value) || value < min || value > max) {
    throw new RangeError(`Expected a whole number from ${min} to ${max}, not ${value}.`);
  }
}
