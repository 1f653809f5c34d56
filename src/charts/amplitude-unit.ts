import { convertUnit } from '#shared/quantities/convert-unit.ts';
import { convertDetector, type Detector } from '#shared/quantities/detector.ts';
import { quantityOfUnit, type Quantity, type Unit } from '#shared/quantities/quantity.ts';
import { highPassHz } from '#shared/signal/velocity-lines.ts';
import type { Spectrum } from './spectrum-data.ts';

/** How often each quantity is the derivative of displacement in time. */
const derivative: Readonly<Record<Quantity, number>> = {
  displacement: 0,
  velocity: 1,
  acceleration: 2,
};

const metricUnit: Readonly<Record<Quantity, Unit>> = {
  displacement: 'µm',
  velocity: 'mm/s',
  acceleration: 'm/s²',
};

/** Metric unit of each quantity in m, m/s, m/s². */
const inSi: Readonly<Record<Quantity, number>> = {
  displacement: 1e-6,
  velocity: 1e-3,
  acceleration: 1,
};

/** Reference values of vibration levels, ISO 1683:2015; that of displacement is cited from memory. */
const levelReferenceSi: Readonly<Record<Quantity, number>> = {
  displacement: 1e-12,
  velocity: 1e-9,
  acceleration: 1e-6,
};

export const levelReferenceWords: Readonly<Record<Quantity, string>> = {
  displacement: '1 pm',
  velocity: '1 nm/s',
  acceleration: '1 µm/s²',
};

/** Whether showing `from` in `to` integrates, which lifts noise at the lowest frequencies. */
export function integrates(from: Unit, to: Unit): boolean {
  return derivative[quantityOfUnit[to]] < derivative[quantityOfUnit[from]];
}

/**
 * Factor from an amplitude in one unit to the same vibration in another, at one frequency:
 * a = (2πf) v = (2πf)² x.
 *
 * @param frequencyHz - Hz, > 0 where the quantities differ
 */
export function lineFactor(from: Unit, to: Unit, frequencyHz: number): number {
  const [fromQuantity, toQuantity] = [quantityOfUnit[from], quantityOfUnit[to]];
  if (fromQuantity === toQuantity) return convertUnit(1, from, to);
  const omega = 2 * Math.PI * frequencyHz;
  const steps = derivative[toQuantity] - derivative[fromQuantity];
  const metric = convertUnit(1, from, metricUnit[fromQuantity]) * inSi[fromQuantity];
  const si = metric * omega ** steps;
  return convertUnit(si / inSi[toQuantity], metricUnit[toQuantity], to);
}

/**
 * A peak spectrum in another unit and stated another way. Where that integrates, lines below the
 * high-pass of 1.5 Hz are NaN: noise divided by a small frequency would tower over everything.
 */
export function spectrumInUnit(
  { stepHz, amplitude }: Spectrum,
  from: Unit,
  to: Unit,
  detector: Detector,
): Spectrum {
  const restated = convertDetector(1, 'peak', detector);
  const hidden = integrates(from, to);
  return {
    stepHz,
    amplitude: amplitude.map((value, line) => {
      const frequencyHz = line * stepHz;
      if (hidden && frequencyHz < highPassHz) return Number.NaN;
      return value * lineFactor(from, to, frequencyHz) * restated;
    }),
  };
}

/** Level of an amplitude, dB over the reference of its quantity; −∞ for zero. */
export function levelDb(amplitude: number, unit: Unit): number {
  const quantity = quantityOfUnit[unit];
  const si = convertUnit(amplitude, unit, metricUnit[quantity]) * inSi[quantity];
  return 20 * Math.log10(si / levelReferenceSi[quantity]);
}
