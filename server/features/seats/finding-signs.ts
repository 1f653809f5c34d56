import type { Screening } from '#server/db/entities/screening.entity.ts';
import type { Direction } from '#shared/contracts/measuring-point.ts';
import type { FindingSigns } from '#shared/fits/seat-signs.ts';

/** Orders of the run that carries looseness; 1× belongs to unbalance as well. */
const runOrders = { from: 2, to: 10 } as const;

/** Velocity of orders 2 to 10 together, mm/s rms. */
export function runLevelMmPerS(screening: Screening): number {
  const squares = screening.result.orders
    .filter(({ order }) => Number.isInteger(order))
    .filter(({ order }) => order >= runOrders.from && order <= runOrders.to)
    .map(({ velocityMmPerSRms }) => velocityMmPerSRms ** 2);
  return Math.sqrt(squares.reduce((sum, square) => sum + square, 0));
}

/** The direction in which the run is strongest; null where fewer than two directions were seen. */
function strongestDirection(screenings: readonly Screening[]): Direction | null {
  const levels = new Map<Direction, number>();
  for (const screening of screenings) {
    const direction = screening.waveform?.measuringPoint?.direction;
    if (direction === undefined) continue;
    levels.set(direction, Math.max(levels.get(direction) ?? 0, runLevelMmPerS(screening)));
  }
  if (levels.size < 2) return null;
  return [...levels].reduce((best, next) => (next[1] > best[1] ? next : best))[0];
}

/** What the screenings of a finding tell of the joint: the clearest of them speaks for the kind. */
export function findingSignsOf(screenings: readonly Screening[]): FindingSigns {
  const judged = screenings.filter((screening) => screening.score !== null);
  const clearest = judged.reduce<Screening | null>(
    (best, next) => (best === null || (next.score ?? 0) >= (best.score ?? 0) ? next : best),
    null,
  );
  if (clearest === null) return {};
  const { kind, truncation } = clearest.result;
  return {
    kind,
    strongestDirection: strongestDirection(judged),
    // A record that the instrument flattened says nothing of the machine.
    truncationSide: truncation.instrument ? null : truncation.side,
  };
}
