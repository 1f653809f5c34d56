import { innerLossFactor, outerLossFactor } from './clearance-loss.ts';
import type { InternalClearance, SeatFit, SpreadUm } from './fit-types.ts';
import {
  effectiveInterference,
  heatingLossUm,
  mountedClearance,
  unmountedClearance,
} from './internal-clearance.ts';
import { heatedRacewayMm, racewayDiameters } from './raceway-diameters.ts';
import type { ResolvedPosition } from './resolve-position.ts';

const nothing: SpreadUm = { min: 0, mean: 0, max: 0 };

/** How much warmer the inner ring is: told directly, or from the ring temperatures. */
export function innerWarmerK(position: ResolvedPosition): number {
  const { innerRing, outerRing } = position.temperaturesC;
  return position.input.innerWarmerThanOuterK ?? innerRing - outerRing;
}

/** Mounted clearance; a seat that is asked for (has a size) but has no fit leaves it unsaid. */
function mounted(
  position: ResolvedPosition,
  unmounted: SpreadUm,
  shaft: SeatFit | undefined,
  housing: SeatFit | undefined,
): SpreadUm | undefined {
  const { type, d, D, input } = position;
  if (type === undefined || d === undefined || D === undefined) return undefined;
  // Housing bores usually leave clearance; without a record only the shaft's share can be said.
  if (!shaft?.interferenceUm) return undefined;
  const raceway = racewayDiameters(type, d, D);
  const smoothing = input.smoothingUm ?? 0;
  return mountedClearance(unmounted, [
    {
      factor: innerLossFactor(
        d,
        raceway.innerMm,
        input.shaftBoreMm ?? 0,
        position.shaft,
        position.ring,
      ),
      effective: effectiveInterference(shaft.interferenceUm, smoothing),
    },
    {
      factor: outerLossFactor(
        D,
        raceway.outerMm,
        input.housingOutsideMm ?? Infinity,
        position.housing,
        position.ring,
      ),
      effective: housing?.interferenceUm
        ? effectiveInterference(housing.interferenceUm, smoothing)
        : nothing,
    },
  ]);
}

/**
 * Radial internal clearance of a position: unmounted (ISO 5753-1), after mounting (thick rings by
 * Lamé) and running (less what a warmer inner ring takes).
 *
 * @returns `undefined` without type, bore or clearance group, outside the tables, and for tapered
 *   bores, whose groups have other values
 */
export function positionClearance(
  position: ResolvedPosition,
  shaft: SeatFit | undefined,
  housing: SeatFit | undefined,
): InternalClearance | undefined {
  const { type, d, D, clearanceGroup } = position;
  if (type === undefined || d === undefined || clearanceGroup === undefined) return undefined;
  if (position.taperedBore) return undefined;
  const unmounted = unmountedClearance(type, d, clearanceGroup);
  if (!unmounted) return undefined;
  const after = mounted(position, unmounted, shaft, housing);
  if (!after || D === undefined) return { unmounted };
  const loss = heatingLossUm(
    position.ring.alphaPerK,
    innerWarmerK(position),
    heatedRacewayMm(type, d, D),
  );
  return {
    unmounted,
    mounted: after,
    running: { min: after.min - loss, mean: after.mean - loss, max: after.max - loss },
  };
}
