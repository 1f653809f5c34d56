import type { MeasuringPoint } from '#server/db/entities/measuring-point.entity.ts';
import type { MachineFacts } from '#shared/signal/screening-types.ts';

/** Leaves out what the register doesn't know: absent means unknown to the method. */
function known<T extends object>(facts: { [Key in keyof T]: T[Key] | null | undefined }): T {
  return Object.fromEntries(
    Object.entries(facts).filter(([, value]) => value !== null && value !== undefined),
  ) as T;
}

/**
 * What is known of the machine and position a waveform was taken at: what the register says, and
 * the line frequency of the file where it says none.
 */
export function machineFactsOf(
  point: MeasuringPoint,
  otherShaftRatios: number[],
  toldLineFrequencyHz: number | null,
): MachineFacts {
  const position = point.bearingPosition;
  const machine = position?.machine;
  return known<MachineFacts>({
    assetKind: machine?.kind,
    nominalSpeedRpm: machine?.nominalSpeedRpm,
    speedMinRpm: machine?.speedMinRpm,
    speedMaxRpm: machine?.speedMaxRpm,
    lineFrequencyHz: machine?.lineFrequencyHz ?? toldLineFrequencyHz,
    shaftRatio: position?.shaftRatio,
    otherShaftRatios,
    bladeCount: machine?.bladeCount,
    gearTeethCount: machine?.gearTeethCount,
    beltFrequencyHz: machine?.beltFrequencyHz,
    mounting: machine?.mounting,
    direction: point.direction,
  });
}
