import type { InternalClearance, Mounting, SeatFit } from './fit-types.ts';
import type { Recommendation } from './recommendation.ts';
import type { ResolvedPosition } from './resolve-position.ts';
import { firstCodeFromMemory } from './tables/dimension-series.ts';

/** What was worked out, before the cautions are added. */
interface Assessed {
  shaftSeat?: SeatFit;
  housingSeat?: SeatFit;
  internalClearanceUm?: InternalClearance;
  mounting?: Mounting;
}

function round(um: number): string {
  return (Math.round(um * 10) / 10).toString();
}

/** What is missing, and what was assumed instead. */
function gaps(position: ResolvedPosition, { shaftSeat, housingSeat }: Assessed): string[] {
  const { input } = position;
  const found: string[] = [];
  if (shaftSeat?.verdict === 'not recorded') {
    found.push(
      position.taperedBore
        ? 'The shaft seat is tapered and neither drive-up nor reduction of clearance is on record.'
        : 'Neither class nor diameter of the shaft seat is on record: get the drawing, or measure it at the next opening.',
    );
  }
  if (housingSeat?.verdict === 'not recorded') {
    found.push(
      'Neither class nor diameter of the housing seat is on record: get the drawing, or measure it at the next opening.',
    );
  }
  const t = input.temperaturesC;
  const known = [t?.shaft, t?.innerRing, t?.outerRing, t?.housing].filter((x) => x !== undefined);
  if (known.length === 0 && (shaftSeat?.runningUm ?? housingSeat?.runningUm)) {
    found.push('No running temperatures are on record: running figures are for 20 °C throughout.');
  } else if (known.length > 0 && known.length < 4) {
    found.push('A running temperature that is not on record is taken as 20 °C.');
  }
  const housingMatters = known.length > 0 && housingSeat?.runningUm;
  if (housingMatters && !input.housingMaterial && input.alphaPerK?.housing === undefined) {
    found.push('The housing material is not on record: steel is assumed.');
  }
  if (input.radialLoadN !== undefined && input.staticRatingN === undefined) {
    found.push(
      'The static load rating is not on record: the load is taken as not above 0.3 of it.',
    );
  }
  return found;
}

/** Numbers that rest on memory alone. */
function weakNumbers(position: ResolvedPosition, { internalClearanceUm }: Assessed): string[] {
  const { bearing, d = Infinity, D = Infinity } = position;
  const found: string[] = [];
  if (bearing && Number(bearing.basic.slice(-2)) >= firstCodeFromMemory) {
    found.push(`The dimensions of ${bearing.basic} are from memory: check d, D and B.`);
  }
  if (Math.min(d, D) <= 3) found.push('Tolerances of sizes up to 3 mm are from memory.');
  if (internalClearanceUm?.mounted && position.type !== 'ball') {
    found.push('The raceway diameters behind the mounted clearance are from memory for rollers.');
  }
  const isC5 = internalClearanceUm && position.clearanceGroup === 'C5';
  if (isC5 && (position.type === 'spherical roller' || (position.type === 'ball' && d > 100))) {
    found.push('The C5 clearance of this size is from memory.');
  }
  return found;
}

/** What the shaft seat's numbers warn of. */
function shaftWarnings(position: ResolvedPosition, seat: SeatFit | undefined): string[] {
  const found: string[] = [];
  const { d } = position;
  if (!seat || d === undefined) return found;
  // d/1000 of the diameter, in µm, is the diameter in mm.
  if (seat.interferenceUm && seat.interferenceUm.max > d) {
    found.push(
      `The interference of up to ${round(seat.interferenceUm.max)} µm passes a thousandth of the diameter: the ring may crack.`,
    );
  }
  if (seat.neededUm !== undefined && seat.runningUm && seat.runningUm.min < seat.neededUm) {
    found.push(
      `The radial load asks for ${round(seat.neededUm)} µm of interference; when running only ${round(seat.runningUm.min)} µm are sure.`,
    );
  }
  return found;
}

/** Whether a floating bearing that does not come apart has a ring that can move. */
function slidingWarnings(position: ResolvedPosition, assessed: Assessed): string[] {
  if (!position.input.mustSlide || position.bearing?.separable) return [];
  const shaft = assessed.shaftSeat?.runningUm;
  const housing = assessed.housingSeat?.runningUm;
  if (!shaft || !housing || Math.min(shaft.max, housing.max) <= 0) return [];
  return [
    'The bearing must float and its rings do not come apart: one ring must keep clearance when warm, and neither is sure to.',
  ];
}

function clearanceWarnings(clearance: InternalClearance | undefined): string[] {
  if (clearance?.mounted && clearance.mounted.min < 0) {
    return [
      'The least internal clearance after mounting is below 0: the bearing may be preloaded.',
    ];
  }
  if (clearance?.running && clearance.running.min < 0) {
    return ['The least internal clearance when running is below 0: the bearing may be preloaded.'];
  }
  return [];
}

function mountingWarnings(mounting: Mounting | undefined): string[] {
  if (!mounting || mounting.heatToC === mounting.neededC) return [];
  const found = ['Heated rings burn: wear gloves, keep hands clear, never use an open flame.'];
  if (!mounting.allowed) {
    found.push(
      `Heating to ${round(mounting.heatToC)} °C is above the limit of ${mounting.limitC} °C.`,
    );
  }
  return found;
}

function bonded(position: ResolvedPosition): string[] {
  const { shaftBonded, housingBonded } = position.input;
  if (!shaftBonded && !housingBonded) return [];
  return [
    'A bonded seat holds by its adhesive, not by its fit: no chance of running loose is given.',
  ];
}

/**
 * Everything a reader of the figures must know before acting on them, most urgent first.
 *
 * @returns sentences; the last one, wherever a class is proposed, that the drawing wins
 */
export function fitCautions(
  position: ResolvedPosition,
  assessed: Assessed,
  recommendations: readonly (Recommendation | undefined)[],
): string[] {
  const cautions = [
    ...shaftWarnings(position, assessed.shaftSeat),
    ...slidingWarnings(position, assessed),
    ...clearanceWarnings(assessed.internalClearanceUm),
    ...mountingWarnings(assessed.mounting),
    ...recommendations.flatMap((r) => r?.cautions ?? []),
    ...bonded(position),
    ...gaps(position, assessed),
    ...weakNumbers(position, assessed),
  ];
  if (recommendations.some((r) => r !== undefined)) {
    cautions.push(
      "The classes are proposals of common practice: the machine maker's drawing wins.",
    );
  }
  return cautions;
}
