import type { BearingType, LoadLevel } from './fit-types.ts';
import { oneTighter, typeName, type Recommendation, type ShaftDemand } from './recommendation.ts';

/** Shaft diameters up to and including the limit (mm) take the class. */
type Steps = readonly (readonly [upToMm: number, toleranceClass: string])[];

/** Sizes end at 500 mm, so `above` in the table reads up to 500. */
const end = 500;

/** Inner ring rotating or indeterminate: common practice, makers differ by a step. */
const ballLight: Steps = [
  [18, 'h5'],
  [100, 'j6'],
  [200, 'k6'],
];
const ballNormal: Steps = [
  [18, 'j5'],
  [100, 'k5'],
  [140, 'm5'],
  [200, 'm6'],
  [280, 'n6'],
];
const rollerLight: Steps = [
  [40, 'j6'],
  [140, 'k6'],
  [200, 'm6'],
];
const rollerNormal: Steps = [
  [40, 'k5'],
  [100, 'm5'],
  [140, 'm6'],
  [200, 'n6'],
  [400, 'p6'],
];
const rollerHeavy: Steps = [
  [140, 'n6'],
  [200, 'p6'],
  [end, 'r6'],
];
const sphericalNormal: Steps = [
  [40, 'k5'],
  [65, 'm5'],
  [100, 'm6'],
  [140, 'n6'],
  [280, 'p6'],
  [500, 'r6'],
];
const sphericalHeavy: Steps = [
  [100, 'n6'],
  [140, 'p6'],
  [end, 'r6'],
];
/** Heavy rows begin at this diameter; smaller shafts take the normal row. */
const heavyFromMm = 50;
/** "Large" for a sliding inner ring: f6 instead of g6 above this (project's choice, no source). */
const slidingLargeMm = 250;

function stepsFor(type: BearingType, level: LoadLevel, d: number): Steps {
  if (type === 'ball') return level === 'light' ? ballLight : ballNormal;
  if (level === 'heavy' && d >= heavyFromMm) {
    return type === 'roller' ? rollerHeavy : sphericalHeavy;
  }
  // The table has no light row for spherical rollers; they take that of the other rollers.
  if (level === 'light') return rollerLight;
  return type === 'roller' ? rollerNormal : sphericalNormal;
}

function stationary(demand: ShaftDemand): Recommendation {
  if (demand.mustSlide) {
    const large = demand.d > slidingLargeMm;
    return {
      toleranceClass: large ? 'f6' : 'g6',
      reason: `The load stands still on the inner ring, which must slide on the shaft${large ? ' and is large' : ''}: a loose class.`,
      cautions: [],
    };
  }
  return {
    toleranceClass: 'h6',
    reason: 'The load stands still on the inner ring, which need not slide: h6.',
    cautions: [],
  };
}

function turning(demand: ShaftDemand): Recommendation | undefined {
  const level = demand.level ?? 'normal';
  const row = stepsFor(demand.type, level, demand.d).find(([upTo]) => demand.d <= upTo);
  if (!row) return undefined;
  const assumed = demand.level === undefined ? ' (load level not recorded, normal assumed)' : '';
  const isHeavyRow = level === 'heavy' && demand.type !== 'ball' && demand.d >= heavyFromMm;
  return {
    toleranceClass: row[1],
    reason: `The load ${demand.load === 'rotating' ? 'rotates relative to' : 'on'} the inner ring${demand.load === 'rotating' ? '' : ' is indeterminate'}; ${typeName(demand.type)}, ${level} load${assumed}, shaft ${demand.d} mm (row up to ${row[0]} mm): ${row[1]}.`,
    cautions:
      isHeavyRow && !demand.clearanceAboveNormal
        ? [`${row[1]} on the shaft asks for an internal clearance above CN.`]
        : [],
  };
}

/**
 * Shaft class the load asks for: the decision table of common practice for a solid steel shaft and
 * bearings of class Normal or 6, and the step for hollow shafts. A proposal: the machine maker's
 * drawing wins.
 *
 * @returns class, reason and cautions; `undefined` where the table ends (e.g. light load above
 *   200 mm)
 *
 * @example
 * // ball, rotating, normal load, 60 mm → k5
 */
export function recommendShaftClass(demand: ShaftDemand): Recommendation | undefined {
  const basic = demand.load === 'stationary' ? stationary(demand) : turning(demand);
  const isHollow = demand.shaftBoreMm !== undefined && demand.shaftBoreMm > demand.d / 2;
  if (!basic || !isHollow || (demand.load === 'stationary' && demand.mustSlide)) return basic;
  const tighter = oneTighter(basic.toleranceClass);
  return {
    ...basic,
    toleranceClass: tighter,
    reason: `${basic.reason} The shaft is hollow (bore above half its diameter), which asks for a tighter class: ${tighter}.`,
  };
}
