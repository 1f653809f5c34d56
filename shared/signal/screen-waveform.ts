import { analyseWaveform } from './analyse-waveform.ts';
import { changeSince } from './change-since.ts';
import { evidenceSentences } from './evidence.ts';
import { lookAlikes } from './look-alikes.ts';
import { loosenessKind } from './looseness-kind.ts';
import { overallVelocity } from './overall-velocity.ts';
import type { PreparedSamples } from './prepare-samples.ts';
import { qualityDefects } from './quality.ts';
import { scoreFromFeatures } from './score.ts';
import type {
  HarmonicRun,
  Screening,
  ScreeningInput,
  ScreeningLimits,
  ScreeningResult,
  Truncation,
  Verdict,
} from './screening-types.ts';
import type { SpectrumView } from './spectrum-view.ts';

export const methodVersion = '3';

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
  const inForce = { ...defaultLimits, ...limits };
  const analysis = analyseWaveform(input);
  const { prepared, view, speed, family } = analysis;
  const quality = qualityDefects(analysis, input, inForce);
  const common = {
    speed,
    quality,
    quantity: prepared.quantity,
    overallVelocity: view ? overallVelocity(view, speed.speedHz) : null,
    revolutions:
      speed.speedHz === null ? null : (prepared.values.length / input.sampleRateHz) * speed.speedHz,
    methodVersion,
    limits: inForce,
  };
  const spectrum = plotSpectrum(view, prepared);
  if (family === null) {
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
  const { orders, run, truncation, features, revolution } = family;
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
    evidence: [
      ...evidenceSentences(features, run, truncation, speed),
      ...(score === null
        ? []
        : changeSince({ score, runMmPerS: features.runMmPerS }, input.earlier)),
    ],
    lookAlikes: lookAlikes(features, run, orders, input.machine),
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
  const amplitudePeak = new Float32Array(view.amplitudePeak.length);
  for (let k = 0; k < amplitudePeak.length; k += 1) {
    amplitudePeak[k] = (view.amplitudePeak[k] ?? 0) / prepared.factor;
  }
  return { stepHz: view.stepHz, amplitudePeak };
}
