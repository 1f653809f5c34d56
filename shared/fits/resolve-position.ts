import { bearingByDesignation, type BearingDesignation } from './bearing-designation.ts';
import { checkPositionNumbers } from './check-position.ts';
import { FitInputError } from './fit-input-error.ts';
import type { BearingType, ClearanceGroup, LoadLevel, PositionFit } from './fit-types.ts';
import { loadLevelOf } from './load-level.ts';
import { referenceC } from './running-fit.ts';
import { housingMaterial, ringSteel, shaftMaterial, type Material } from './tables/materials.ts';

/** A position with the designation looked up and every default filled in. */
export interface ResolvedPosition {
  input: PositionFit;
  bearing?: BearingDesignation;
  type?: BearingType;
  d?: number;
  D?: number;
  B?: number;
  clearanceGroup?: ClearanceGroup;
  level?: LoadLevel;
  capped: boolean;
  taperedBore: boolean;
  temperaturesC: { shaft: number; innerRing: number; outerRing: number; housing: number };
  shaft: Material;
  ring: Material;
  housing: Material;
}

/** A size given next to the designation must be the designation's. */
function agreed(
  given: number | undefined,
  table: number | undefined,
  field: string,
): number | undefined {
  if (given !== undefined && table !== undefined && Math.abs(given - table) > 0.001) {
    throw new FitInputError(
      'contradiction',
      field,
      `${field} = ${given} mm contradicts the designation, which gives ${table} mm.`,
    );
  }
  return given ?? table;
}

function same<T>(given: T | undefined, table: T | undefined, field: string): T | undefined {
  if (given !== undefined && table !== undefined && given !== table) {
    throw new FitInputError(
      'contradiction',
      field,
      `${field} "${String(given)}" contradicts the designation, which says "${String(table)}".`,
    );
  }
  return given ?? table;
}

function checkSizes(position: PositionFit, d: number | undefined, D: number | undefined): void {
  if (d === undefined && D === undefined) {
    throw new FitInputError(
      'size_missing',
      'designation',
      'A size is needed: the designation, or d and D for the seats asked for.',
    );
  }
  if (d !== undefined && D !== undefined && D <= d) {
    throw new FitInputError(
      'diameters_swapped',
      'D',
      `The outside diameter D (${D} mm) must be greater than the bore d (${d} mm).`,
    );
  }
  if (
    d === undefined &&
    (position.shaftClass !== undefined || position.shaftMeasuredMm !== undefined)
  ) {
    throw new FitInputError('size_missing', 'd', 'The shaft seat needs the bore d.');
  }
  if (
    D === undefined &&
    (position.housingClass !== undefined || position.housingMeasuredMm !== undefined)
  ) {
    throw new FitInputError('size_missing', 'D', 'The housing seat needs the outside diameter D.');
  }
  if (d !== undefined && position.shaftBoreMm !== undefined && position.shaftBoreMm >= d) {
    throw new FitInputError(
      'out_of_range',
      'shaftBoreMm',
      `The bore of the shaft must be below d = ${d} mm.`,
    );
  }
  if (
    D !== undefined &&
    position.housingOutsideMm !== undefined &&
    position.housingOutsideMm <= D
  ) {
    throw new FitInputError(
      'out_of_range',
      'housingOutsideMm',
      `The housing must be larger than D = ${D} mm.`,
    );
  }
}

/**
 * Looks up the designation, checks everything that must agree and fills in the defaults: temperatures
 * 20 °C, steel shaft and housing, bearing steel rings.
 *
 * @throws {FitInputError} naming the field
 */
export function resolvePosition(position: PositionFit): ResolvedPosition {
  checkPositionNumbers(position);
  const bearing =
    position.designation === undefined ? undefined : bearingByDesignation(position.designation);
  const d = agreed(position.d, bearing?.d, 'd');
  const D = agreed(position.D, bearing?.D, 'D');
  checkSizes(position, d, D);
  const given = position.temperaturesC ?? {};
  const alpha = position.alphaPerK ?? {};
  const shaft = shaftMaterial[position.shaftMaterial ?? 'steel'];
  const housing = housingMaterial[position.housingMaterial ?? 'steel'];
  return {
    input: position,
    bearing,
    type: same(position.bearingType, bearing?.type, 'bearingType'),
    d,
    D,
    B: agreed(position.B, bearing?.B, 'B'),
    clearanceGroup: same(position.clearanceGroup, bearing?.clearanceGroup, 'clearanceGroup'),
    level:
      position.loadLevel ??
      (position.pOverC === undefined ? undefined : loadLevelOf(position.pOverC)),
    capped: (position.capped ?? false) || (bearing?.capped ?? false),
    taperedBore: position.shaftTapered !== undefined || (bearing?.taperedBore ?? false),
    temperaturesC: {
      shaft: given.shaft ?? referenceC,
      innerRing: given.innerRing ?? referenceC,
      outerRing: given.outerRing ?? referenceC,
      housing: given.housing ?? referenceC,
    },
    shaft: { ...shaft, alphaPerK: alpha.shaft ?? shaft.alphaPerK },
    ring: { ...ringSteel, alphaPerK: alpha.ring ?? ringSteel.alphaPerK },
    housing: { ...housing, alphaPerK: alpha.housing ?? housing.alphaPerK },
  };
}
