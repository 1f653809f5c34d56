import type { LimitsUm, SeatVerdict } from './fit-types.ts';

/** How far a seat lies from a range of fits, µm: short of it (looser) and beyond it (tighter). */
interface Outside {
  looserUm: number;
  tighterUm: number;
}

function outside(fit: LimitsUm, wanted: LimitsUm): Outside {
  return {
    looserUm: Math.max(0, wanted[0] - fit[0]),
    tighterUm: Math.max(0, fit[1] - wanted[1]),
  };
}

/** Guards against the last bits of a millimetre value, e.g. (60.015 − 60)·1000. */
const toleranceUm = 1e-6;

/**
 * Verdict on a seat. All ranges are what the seat contributes to the fit, tighter upwards: shaft
 * deviations as they are, housing deviations turned over.
 *
 * - Measured: looser or tighter where the measured seat lies outside the recommended class's limits
 *   (the recorded class's where nothing can be recommended); the amount is by how much it lies
 *   outside its own class's limits (the recommended one's where no class is recorded).
 * - Not measured: the recorded class against the recommended one; it is "as recommended" where it
 *   lies wholly inside, otherwise the larger overhang decides.
 *
 * @returns verdict and amount ≥ 0 in µm; absent where there is nothing to compare with
 */
export function seatVerdict(seat: {
  recorded?: LimitsUm;
  recommended?: LimitsUm;
  measuredUm?: number;
}): { verdict?: SeatVerdict; outsideLimitsUm?: number } {
  const { recorded, recommended, measuredUm } = seat;
  if (recorded === undefined && measuredUm === undefined) return { verdict: 'not recorded' };
  // A class on a drawing says nothing of itself while nothing is known of the load.
  if (measuredUm === undefined && recommended === undefined) return {};
  const wanted = recommended ?? recorded;
  const fit: LimitsUm | undefined = measuredUm === undefined ? recorded : [measuredUm, measuredUm];
  if (!wanted || !fit) return { verdict: 'not recorded' };
  const off = outside(fit, wanted);
  let verdict: SeatVerdict = 'as recommended';
  if (Math.max(off.looserUm, off.tighterUm) > toleranceUm) {
    verdict = off.looserUm >= off.tighterUm ? 'looser' : 'tighter';
  }
  const own = measuredUm === undefined ? off : outside(fit, recorded ?? wanted);
  const amount = Math.max(own.looserUm, own.tighterUm);
  return { verdict, outsideLimitsUm: amount > toleranceUm ? amount : 0 };
}
