/** Units a frequency axis may be drawn in; `orders` are multiples of the shaft speed. */
export const frequencyUnits = ['Hz', 'cycles/min', 'orders'] as const;
export type FrequencyUnit = (typeof frequencyUnits)[number];

/** Seconds in a minute: Hz to cycles/min, and revolutions per second to r/min. */
export const secondsPerMinute = 60;

/**
 * Expresses a frequency in the unit of an axis.
 *
 * @param frequencyHz - frequency, Hz; finite and >= 0
 * @param unit - unit of the axis
 * @param shaftSpeedHz - shaft speed, revolutions per second; finite and > 0 for `orders`, else unused
 * @returns the frequency in `unit`; relative error at most 2^-52
 * @throws {RangeError} if an argument is outside its range
 *
 * @example
 * toFrequencyUnit(50, 'orders', 25) // => 2
 */
export function toFrequencyUnit(
  frequencyHz: number,
  unit: FrequencyUnit,
  shaftSpeedHz: number | null,
): number {
  checkFrequency(frequencyHz);
  if (unit === 'orders') return frequencyHz / checkSpeed(shaftSpeedHz);
  return unit === 'Hz' ? frequencyHz : frequencyHz * secondsPerMinute;
}

/**
 * The way back: what stands on the axis in hertz.
 *
 * @param value - frequency in `unit`; finite and >= 0
 * @param shaftSpeedHz - as for `toFrequencyUnit`
 * @returns frequency, Hz; relative error at most 2^-52
 * @throws {RangeError} if an argument is outside its range
 */
export function fromFrequencyUnit(
  value: number,
  unit: FrequencyUnit,
  shaftSpeedHz: number | null,
): number {
  checkFrequency(value);
  if (unit === 'orders') return value * checkSpeed(shaftSpeedHz);
  return unit === 'Hz' ? value : value / secondsPerMinute;
}

function checkFrequency(value: number): void {
  if (!(value >= 0 && value < Infinity)) throw new RangeError(`No frequency: ${value}.`);
}

function checkSpeed(shaftSpeedHz: number | null): number {
  if (shaftSpeedHz === null || !(shaftSpeedHz > 0 && shaftSpeedHz < Infinity)) {
    throw new RangeError(`Orders need a shaft speed above 0, not ${shaftSpeedHz}.`);
  }
  return shaftSpeedHz;
}
