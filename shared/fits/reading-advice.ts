import type { SeatMark } from './condition-words.ts';
import type { LimitsUm, SeatName } from './fit-types.ts';
import { toleranceGradeUm } from './tolerance-grade.ts';

export const seatActions = [
  'leave',
  'anti-fretting paste',
  'measure again',
  'rework to size',
  'restore the seat',
  'replace the part',
  'get the limits',
] as const;
export type SeatAction = (typeof seatActions)[number];

/** What to do after the readings, with the reason in a sentence or two. */
export interface ReadingAdvice {
  action: SeatAction;
  text: string;
}

const howToRestore =
  'Restore it: sleeve, metal deposit and regrind, or a new part; a retaining compound only where the machine maker allows it. Anti-fretting paste is no cure for a seat worn past its limits.';

function byCondition(condition: SeatMark | undefined): ReadingAdvice | undefined {
  if (condition === 'cracked') {
    return {
      action: 'replace the part',
      text: 'A cracked part goes out of service whatever its size.',
    };
  }
  if (condition === 'plastic deformation') {
    return {
      action: 'restore the seat',
      text: `The surface is deformed and no longer carries the ring all round, whatever the mean diameter says. ${howToRestore}`,
    };
  }
  return undefined;
}

function withinLimits(condition: SeatMark | undefined): ReadingAdvice {
  if (condition === undefined || condition === 'sound') {
    return { action: 'leave', text: 'The seat is within its limits: leave it as it is.' };
  }
  return {
    action: 'anti-fretting paste',
    text: `The seat is within its limits but shows ${condition}: clean it, and damp small movement with anti-fretting paste; measure again at the next opening.`,
  };
}

/**
 * What the readings of a seat mean for the work.
 *
 * Form: the diameters of a seat should not vary by more than IT5, i.e. twice the cylindricity of
 * IT5/2 usual for bearings of class Normal (one source).
 *
 * @param reading.meanDeviationUm - mean measured deviation from the nominal size
 * @param reading.limitsUm - limit deviations of the class to keep; absent where none is known
 * @param reading.expandedUncertaintyUm - about 95 %; a mean closer than this to a limit is doubtful
 */
export function adviseOnReadings(reading: {
  seat: SeatName;
  nominalMm: number;
  meanDeviationUm: number;
  limitsUm?: LimitsUm;
  expandedUncertaintyUm?: number;
  taperUm?: number;
  outOfRoundnessUm?: number;
  condition?: SeatMark;
}): ReadingAdvice {
  const bad = byCondition(reading.condition);
  if (bad) return bad;
  if (!reading.limitsUm) {
    return {
      action: 'get the limits',
      text: 'No class is on record and none can be recommended: get the drawing before deciding.',
    };
  }
  const formUm = Math.max(Math.abs(reading.taperUm ?? 0), reading.outOfRoundnessUm ?? 0);
  const formLimitUm = toleranceGradeUm(reading.nominalMm, 5);
  const [lower, upper] = reading.limitsUm;
  const below = lower - reading.meanDeviationUm;
  const above = reading.meanDeviationUm - upper;
  const [loose, tight] = reading.seat === 'shaft' ? [below, above] : [above, below];
  const doubt = reading.expandedUncertaintyUm ?? 0;
  const past = Math.max(loose, tight);
  if (past > 0 && past <= doubt) {
    return {
      action: 'measure again',
      text: `The mean is ${past.toFixed(1)} µm past a limit, less than its uncertainty of ±${doubt.toFixed(1)} µm: measure again with a better instrument or more readings.`,
    };
  }
  if (loose > 0) {
    return {
      action: 'restore the seat',
      text: `The seat is ${loose.toFixed(1)} µm past its limit on the loose side. ${howToRestore}`,
    };
  }
  if (tight > 0) {
    return {
      action: 'rework to size',
      text: `The seat is ${tight.toFixed(1)} µm past its limit on the tight side: rework it to its class, or the bearing loses internal clearance.`,
    };
  }
  if (formUm > formLimitUm) {
    return {
      action: 'restore the seat',
      text: `The mean is right, but the diameter varies by ${formUm.toFixed(1)} µm over the seat, more than the ${formLimitUm} µm (IT5) that a bearing seat may: it carries the ring on part of its surface only. ${howToRestore}`,
    };
  }
  return withinLimits(reading.condition);
}
