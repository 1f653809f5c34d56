import type { ScreeningFeatures } from './features.ts';
import type { LoosenessKind, OrderLine } from './screening-types.ts';

/**
 * Which joint the signs favour: a ring rattling in a finite gap fills orders 2–10; a pedestal or
 * foot that lifts shows mostly 1×–3×, with halves near its resonance (common practice, no source).
 */
export function loosenessKind(
  features: ScreeningFeatures,
  orders: readonly OrderLine[],
): LoosenessKind {
  const power = (from: number, to: number) =>
    orders
      .filter((line) => Number.isInteger(line.order) && line.order >= from && line.order <= to)
      .reduce((sum, line) => sum + line.velocityMmPerSRms ** 2, 0);
  const low = power(1, 3);
  const high = power(4, 10);
  if (features.strongHighOrders >= 3 && high > 0.15 * low) return 'seat';
  if (high < 0.05 * low) return 'pedestal';
  return 'undetermined';
}
