import { averagedRevolution } from '#shared/signal/averaged-revolution.ts';
import { findClipping } from '#shared/signal/clipping.ts';
import { extractFeatures, type ScreeningFeatures } from '#shared/signal/features.ts';
import { findSpeed } from '#shared/signal/find-speed.ts';
import { harmonicRun } from '#shared/signal/harmonic-run.ts';
import { orderTable } from '#shared/signal/order-table.ts';
import { prepareSamples } from '#shared/signal/prepare-samples.ts';
import type { ScreeningInput } from '#shared/signal/screening-types.ts';
import { viewSpectrum } from '#shared/signal/spectrum-view.ts';
import { findTruncation } from '#shared/signal/truncation.ts';

export type FeatureValues = ScreeningFeatures;

/** The features behind a screening's score, by the same steps. */
export function caseFeatures(input: ScreeningInput): FeatureValues | null {
  const { sampleRateHz, machine } = input;
  const prepared = prepareSamples(input.samples, input.unit);
  const aboutHz = (input.toldSpeedRpm ?? machine?.nominalSpeedRpm ?? 1500) / 60;
  const view = viewSpectrum(prepared.values, sampleRateHz, prepared.quantity, aboutHz);
  const speed = findSpeed(view, input.toldSpeedRpm, input.toldSpeedTolerance, machine);
  const { speedHz, intervalHz, supported } = speed;
  if (speedHz === null) return null;
  const errorHz = supported && intervalHz ? (intervalHz[1] - intervalHz[0]) / 2 : 0;
  const orders = orderTable(view, speedHz, errorHz, machine, prepared.factor);
  const run = harmonicRun(orders);
  const revolution = averagedRevolution(
    prepared.values,
    sampleRateHz,
    prepared.quantity,
    speedHz,
    view.usableHz,
  );
  const clipping = findClipping(input.samples);
  const truncation = findTruncation(revolution.displacementUm, prepared.values, clipping);
  return extractFeatures(view, speedHz, orders, run, truncation, revolution);
}
