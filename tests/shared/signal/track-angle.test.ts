import { describe, expect, it } from 'vitest';
import { bandVelocity } from '#shared/signal/band-velocity.ts';
import { averageSegments, orderSegments } from '#shared/signal/order-spectra.ts';
import { viewSpectrum } from '#shared/signal/spectrum-view.ts';
import { trackAngle } from '#shared/signal/track-angle.ts';
import { uniform } from './test-signals.ts';

const rateHz = 5120;
const count = 16_384;
const speedHz = 24.73;
const orders = [1, 2, 5, 10, 20];

/** Velocity of 1 mm/s peak at some orders of a shaft whose speed swings by `share`. */
function wandering(share: number): Float64Array {
  const random = uniform(3);
  return Float64Array.from({ length: count }, (_, i) => {
    const timeS = i / rateHz;
    const turns =
      speedHz * timeS +
      (share * speedHz * Math.sin(2 * Math.PI * 0.7 * timeS)) / (2 * Math.PI * 0.7);
    const tones = orders.reduce((sum, k) => sum + Math.cos(2 * Math.PI * k * turns + k), 0);
    return tones + 0.02 * (random() - 0.5);
  });
}

describe('trackAngle', () => {
  it.each([0, 1e-4, 1e-3, 5e-3])(
    'keeps the twentieth order as high as the first while the speed swings by %f of itself',
    (share) => {
      const view = viewSpectrum(wandering(share), rateHz, 'velocity', speedHz);
      // A first speed that is wrong by a tenth of a line.
      const first = speedHz + 0.1 * view.stepHz;
      const tracked = trackAngle(bandVelocity(view, count / rateHz, first), first);
      const { coherentPower, linesPerOrder } = averageSegments(
        orderSegments(tracked.velocity, 32, 16),
      );
      for (const order of orders) {
        const peak = Math.sqrt(2 * (coherentPower[order * linesPerOrder] ?? 0));
        expect(Math.abs(peak - 1)).toBeLessThan(0.02);
      }
    },
  );

  it('finds the mean speed of a steady shaft to a hundredth of a line', () => {
    const view = viewSpectrum(wandering(0), rateHz, 'velocity', speedHz);
    const first = speedHz + 0.1 * view.stepHz;
    const tracked = trackAngle(bandVelocity(view, count / rateHz, first), first);
    expect(Math.abs(tracked.speedHz - speedHz)).toBeLessThan(0.01 * view.stepHz);
  });
});
