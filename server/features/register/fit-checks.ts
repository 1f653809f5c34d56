import type { FitChecks } from './position.service.ts';

/** A seat's measured diameter further than this from its nominal size is a slip of the pen. */
const plausibleShare = 0.02;
const mmPerInch = 25.4;

function diameterFault(measuredMm: number, nominalMm: number): string | null {
  const near = (value: number) => Math.abs(value / nominalMm - 1) <= plausibleShare;
  if (near(measuredMm)) return null;
  const expected = `The nominal size is ${nominalMm} mm.`;
  if (near(measuredMm * mmPerInch)) return `${measuredMm} looks like inches. ${expected}`;
  for (const factor of [10, 100, 1000]) {
    if (near(measuredMm * factor) || near(measuredMm / factor)) {
      return `${measuredMm} mm looks a factor ${factor} off. ${expected}`;
    }
  }
  return `${measuredMm} mm is not a size this seat can have. ${expected}`;
}

/** Checks of fit data that the register makes before anything is written. */
export const fitChecks: FitChecks = {
  positionFaults: () => [],
  recordFaults: (position, record) => {
    const nominalMm = record.seat === 'shaft' ? position.boreMm : position.outsideMm;
    if (nominalMm === null) return [];
    return (['seatMeasuredMm', 'ringMeasuredMm'] as const).flatMap((path) => {
      const measured = record[path];
      const message = measured === null ? null : diameterFault(measured, nominalMm);
      return message === null ? [] : [{ path, message }];
    });
  },
};
