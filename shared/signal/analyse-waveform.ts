import { averagedRevolution, type AveragedRevolution } from './averaged-revolution.ts';
import { bandVelocity } from './band-velocity.ts';
import { findClipping, type Clipping } from './clipping.ts';
import { familyChance } from './family-chance.ts';
import { featuresOf, type ScreeningFeatures } from './features.ts';
import { findSpeed } from './find-speed.ts';
import { harmonicRun } from './harmonic-run.ts';
import {
  averageSegments,
  orderSegments,
  segmentTurns,
  type OrderSpectrum,
} from './order-spectra.ts';
import { orderTable } from './order-table.ts';
import { phaseCorrection } from './phase-correction.ts';
import { prepareSamples, type PreparedSamples } from './prepare-samples.ts';
import type {
  HarmonicRun,
  OrderLine,
  ScreeningInput,
  SpeedReading,
  Truncation,
} from './screening-types.ts';
import { pointsPerTurn } from './shaft-angle.ts';
import { viewSpectrum, type SpectrumView } from './spectrum-view.ts';
import { trackAngle } from './track-angle.ts';
import { findTruncation } from './truncation.ts';

/** What is found before anything is judged. */
export interface WaveformAnalysis {
  prepared: PreparedSamples;
  clipping: Clipping;
  /** Null where there is nothing to transform. */
  view: SpectrumView | null;
  speed: SpeedReading;
  /** Whether lines support the speed. */
  speedSupported: boolean;
  /** Null without a speed, or with fewer turns than a segment has. */
  family: OrderFamily | null;
}

/** The orders of running speed and what is made of them. */
export interface OrderFamily {
  spectrum: OrderSpectrum;
  orders: readonly OrderLine[];
  run: HarmonicRun;
  revolution: AveragedRevolution;
  truncation: Truncation;
  features: ScreeningFeatures;
  /** Relative standard deviation of the speed inside the record, as followed. */
  wander: number;
}

const samplesMin = 16;
/** Standard error of the speed over what the phases' noise alone would give (simulated: 1.1–1.4). */
const errorOverBound = 1.4;
/** Typical speed for the first look, before the speed is known, Hz. */
const typicalSpeedHz = 25;

/**
 * Analyses one waveform up to the features, judging nothing.
 *
 * @throws {RangeError} if the sampling rate is not a positive number
 */
export function analyseWaveform(input: ScreeningInput): WaveformAnalysis {
  const { sampleRateHz, machine } = input;
  if (!(Number.isFinite(sampleRateHz) && sampleRateHz > 0)) {
    throw new RangeError('The sampling rate must be a positive number of Hz.');
  }
  const prepared = prepareSamples(input.samples, input.unit);
  const clipping = findClipping(prepared.raw);
  const { values, quantity, factor } = prepared;
  const nothing: WaveformAnalysis = {
    prepared,
    clipping,
    view: null,
    speed: { speedHz: null, source: 'none', intervalHz: null, alternatives: [] },
    speedSupported: false,
    family: null,
  };
  if (values.length < samplesMin || !values.some((value) => value !== 0)) return nothing;
  const aboutHz = (input.toldSpeedRpm ?? machine?.nominalSpeedRpm ?? typicalSpeedHz * 60) / 60;
  const view = viewSpectrum(values, sampleRateHz, quantity, aboutHz * (machine?.shaftRatio ?? 1));
  const found = findSpeed(view, input.toldSpeedRpm, input.toldSpeedTolerance, machine);
  const { supported: speedSupported, speedsTried, ...speed } = found;
  if (speed.speedHz === null) return { ...nothing, view };
  const durationS = values.length / sampleRateHz;
  const band = bandVelocity(view, durationS, speed.speedHz);
  const tracked = trackAngle(band, speed.speedHz);
  const turns = segmentTurns(tracked.velocity.length / pointsPerTurn);
  const segments = orderSegments(tracked.velocity, turns, turns / 2);
  const spectrum = averageSegments(segments);
  if (spectrum.averages === 0) return { ...nothing, view, speed, speedSupported };
  const correction = phaseCorrection(tracked.velocity, segments);
  const speedHz = tracked.speedHz * (1 + correction.shift);
  const usableOrders = view.usableHz / speedHz;
  const orders = orderTable(spectrum, speedHz, view.usableHz, machine, quantity, factor);
  const run = harmonicRun(orders, speedsTried * familyChance(spectrum, orders), speedsTried);
  const revolution = averagedRevolution(tracked.velocity, speedHz, usableOrders);
  const truncation = findTruncation(revolution, values, clipping);
  const features = featuresOf({
    spectrum,
    usableOrders,
    orders,
    run,
    truncation,
    revolution,
    machine,
  });
  const intervalHz = intervalOf(speed, speedHz, correction.error);
  return {
    prepared,
    clipping,
    view,
    speed: { ...speed, speedHz, intervalHz },
    speedSupported,
    family: { spectrum, orders, run, revolution, truncation, features, wander: tracked.wander },
  };
}

/** 95 % interval: by the phases where orders are strong enough to give it, else as found. */
function intervalOf(
  found: SpeedReading,
  speedHz: number,
  relativeError: number,
): readonly [number, number] {
  const half =
    relativeError > 0
      ? 1.96 * errorOverBound * relativeError * speedHz
      : ((found.intervalHz?.[1] ?? 0) - (found.intervalHz?.[0] ?? 0)) / 2;
  return [speedHz - half, speedHz + half];
}

/**
 * The features behind a screening's score.
 *
 * @returns null where the record has no orders to take them from
 */
export function extractFeatures(input: ScreeningInput): ScreeningFeatures | null {
  return analyseWaveform(input).family?.features ?? null;
}
