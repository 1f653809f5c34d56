import type { SeatFit, SeatHistory, SeatVerdict, TaperedSeat } from './fit-types.ts';
import { looseChance } from './loose-chance.ts';
import { meanWearUm } from './seat-wear.ts';
import { taperedMounting } from './tables/tapered-mounting.ts';

/** Standard uncertainty of a clearance felt with a gauge, µm (assumption, no source). */
const gaugeUncertaintyUm = 5;

function judged(value: number, range: readonly [number, number]): SeatVerdict {
  if (value < range[0]) return 'looser';
  return value > range[1] ? 'tighter' : 'as recommended';
}

/**
 * A tapered seat (directly or on an adapter or withdrawal sleeve; the shaft under a sleeve is
 * commonly h9): judged by the reduction of internal clearance or the drive-up recorded when it was
 * mounted, never by interferences of a cylindrical fit. Ranges for spherical roller bearings, one
 * source.
 *
 * @param d - bore, mm
 * @returns verdict with a reason; `not recorded` where neither figure is on record
 */
export function taperedSeat(
  d: number,
  seat: TaperedSeat | undefined,
  history?: SeatHistory,
): SeatFit {
  const row = taperedMounting.find((r) => d > r.above && d <= r.upTo);
  const reduction = seat?.clearanceReductionUm;
  const driveUp = seat?.driveUpMm;
  if (!row || !seat || (reduction === undefined && driveUp === undefined)) {
    const wanted = row
      ? ` Usual for ${d} mm: clearance reduction ${row.reductionUm[0]}–${row.reductionUm[1]} µm.`
      : '';
    return {
      verdict: 'not recorded',
      reason: `A tapered seat is judged by drive-up or reduction of internal clearance, and neither is recorded.${wanted}`,
    };
  }
  if (reduction !== undefined) {
    const [least, most] = row.reductionUm;
    const wear = meanWearUm(history, 'rotating', false);
    return {
      verdict: judged(reduction, row.reductionUm),
      outsideLimitsUm: Math.max(0, least - reduction, reduction - most),
      reason: `Tapered seat: clearance reduced by ${reduction} µm when mounted; usual for ${d} mm is ${least}–${most} µm.`,
      chanceOfClearance: looseChance({ meanUm: reduction, sigmaUm: gaugeUncertaintyUm }, wear, 0),
    };
  }
  const range = row.driveUpMm[seat.taper];
  if (driveUp === undefined || !range) {
    return {
      verdict: 'not recorded',
      reason: `Tapered seat ${seat.taper}: no drive-up is tabulated for ${d} mm; record the reduction of internal clearance.`,
    };
  }
  return {
    verdict: judged(driveUp, range),
    reason: `Tapered seat ${seat.taper}: driven up ${driveUp} mm; usual for ${d} mm is ${range[0]}–${range[1]} mm.`,
  };
}
