import { averagedRevolution } from './averaged-revolution.ts';
import { findClipping } from './clipping.ts';
import { evidenceSentences } from './evidence.ts';
import { extractFeatures } from './features.ts';
import { findSpeed } from './find-speed.ts';
import { harmonicRun } from './harmonic-run.ts';
import { lookAlikes } from './look-alikes.ts';
import { loosenessKind } from './looseness-kind.ts';
import { orderTable } from './order-table.ts';
import { overallVelocity } from './overall-velocity.ts';
import { prepareSamples, type PreparedSamples } from './prepare-samples.ts';
import { qualityDefects } from './quality.ts';
import { scoreFromFeatures } from './score.ts';
import type {
  HarmonicRun,
  Screening,
  ScreeningInput,
  ScreeningLimits,
  ScreeningResult,
  SpeedReading,
  Truncation,
  Verdict,
} from './screening-types.ts';
import { viewSpectrum, type SpectrumView } from './spectrum-view.ts';
import { findTruncation } from './truncation.ts';

export const methodVersion = '1';

export const defaultLimits: ScreeningLimits = {
  suspectedScore: 0.5,
  likelyScore: 0.8,
  minRevolutions: 8,
  minOrdersInBand: 5,
};

const noRun: HarmonicRun = {
  length: 0,
  from: 0,
  to: 0,
  pChance: 1,
  significantOfFirst10: 0,
  significantOfFirst20: 0,
  slopeDbPerOrder: null,
  halfOrderCount: 0,
  thirdOrderCount: 0,
};
const noTruncation: Truncation = {
  side: 'none',
  share: 0,
  expectedShare: 0,
  instrument: false,
  ranges: [],
};
const noSpeed: SpeedReading = { speedHz: null, source: 'none', intervalHz: null, alternatives: [] };

/** Typical speed for the first look, before the speed is known, Hz. */
const typicalSpeedHz = 25;

/**
 * Screens one waveform for mechanical looseness: quality, running speed, orders, run, truncation,
 * verdict with its evidence. See the method page for what each step does and where it fails.
 *
 * @param input - samples in the recorded unit and what is known; nothing is changed
 * @param limits - those given replace the defaults
 * @throws {RangeError} if the sampling rate is not a positive number
 */
export function screenWaveform(
  input: ScreeningInput,
  limits: Partial<ScreeningLimits> = {},
): Screening {
  const { sampleRateHz, machine } = input;
  if (!(Number.isFinite(sampleRateHz) && sampleRateHz > 0)) {
    throw new RangeError('The sampling rate must be a positive number of Hz.');
  }
  const inForce = { ...defaultLimits, ...limits };
  const prepared = prepareSamples(input.samples, input.unit);
  const clipping = findClipping(input.samples);
  const told = input.toldSpeedRpm !== undefined && input.toldSpeedRpm > 0;
  const readable = prepared.values.length >= 16 && prepared.values.some((value) => value !== 0);
  const aboutHz = (input.toldSpeedRpm ?? machine?.nominalSpeedRpm ?? typicalSpeedHz * 60) / 60;
  const view = readable
    ? viewSpectrum(
        prepared.values,
        sampleRateHz,
        prepared.quantity,
        aboutHz * (machine?.shaftRatio ?? 1),
      )
    : null;
  const found = view
    ? findSpeed(view, input.toldSpeedRpm, input.toldSpeedTolerance, machine)
    : { ...noSpeed, supported: false };
  const { supported, ...speed } = found;
  const quality = qualityDefects({
    prepared,
    clipping,
    sampleRateHz,
    view,
    speedHz: speed.speedHz,
    speedSupported: supported,
    told,
    limits: inForce,
  });
  const common = {
    speed,
    quality,
    quantity: prepared.quantity,
    overallVelocity: view ? overallVelocity(view, speed.speedHz) : null,
    revolutions:
      speed.speedHz === null ? null : (prepared.values.length / sampleRateHz) * speed.speedHz,
    methodVersion,
    limits: inForce,
  };
  const spectrum = plotSpectrum(view, prepared);
  if (view === null || speed.speedHz === null) {
    return {
      result: {
        ...common,
        verdict: 'retake',
        score: null,
        kind: null,
        orders: [],
        harmonicRun: noRun,
        truncation: noTruncation,
        evidence: [],
        lookAlikes: [],
      },
      plots: { spectrum, averagedRevolution: null },
    };
  }
  const { speedHz } = speed;
  const errorHz = ((speed.intervalHz?.[1] ?? speedHz) - (speed.intervalHz?.[0] ?? speedHz)) / 2;
  const orders = orderTable(view, speedHz, supported ? errorHz : 0, machine, prepared.factor);
  const run = harmonicRun(orders);
  const revolution = averagedRevolution(
    prepared.values,
    sampleRateHz,
    prepared.quantity,
    speedHz,
    view.usableHz,
  );
  const truncation = findTruncation(revolution.displacementUm, prepared.values, clipping);
  const features = extractFeatures(view, speedHz, orders, run, truncation, revolution);
  const retake = quality.some((defect) => defect.forcesRetake);
  const score = retake ? null : scoreFromFeatures(features);
  const verdict = verdictOf(score, inForce);
  const result: ScreeningResult = {
    ...common,
    verdict,
    score,
    kind: verdict === 'suspected' || verdict === 'likely' ? loosenessKind(features, orders) : null,
    orders,
    harmonicRun: run,
    truncation,
    evidence: evidenceSentences(features, run, truncation, speed),
    lookAlikes: lookAlikes(features, run, orders, machine),
  };
  return {
    result,
    plots: { spectrum, averagedRevolution: Float32Array.from(revolution.velocityMmPerS) },
  };
}

function verdictOf(score: number | null, limits: ScreeningLimits): Verdict {
  if (score === null) return 'retake';
  if (score >= limits.likelyScore) return 'likely';
  return score >= limits.suspectedScore ? 'suspected' : 'none';
}

/** The spectrum as it is plotted: peak values in the recorded unit. */
function plotSpectrum(view: SpectrumView | null, prepared: PreparedSamples) {
  if (view === null) return { stepHz: 1, amplitudePeak: new Float32Array(0) };
  return {
    stepHz: view.stepHz,
    amplitudePeak: Float32Array.from(view.amplitudePeak, (value) => value / prepared.factor),
  };
}
