import type {
  LookAlikeName,
  RecordFault,
  Severity,
  SimulatedLoosenessKind,
} from '#fixtures/signals/signal-types.ts';
import type { LabelledWaveform } from '#fixtures/signals/labelled-set.ts';
import { screenWaveform } from '#shared/signal/screen-waveform.ts';
import type { SpeedSource, Verdict } from '#shared/signal/screening-types.ts';
import { extractFeatures } from '#shared/signal/analyse-waveform.ts';
import type { FeatureValues } from './case-features.ts';

/** What the method said of one labelled waveform, beside the truth. */
export interface CaseOutcome {
  machineId: string;
  looseness: SimulatedLoosenessKind | null;
  severity: Severity | null;
  lookAlike: LookAlikeName;
  /** Null for a machine that is not loose, or a broken record. */
  physicsLeavesSign: boolean | null;
  risenOrders: number | null;
  visibleOrders: number | null;
  fault: RecordFault | null;
  expectsRetake: boolean;
  verdict: Verdict;
  score: number | null;
  speedSource: SpeedSource;
  /** Found over true speed, minus one; null where none was found. */
  speedError: number | null;
  toldError: number | null;
  /** Only where asked for, and where the record is fit to be judged. */
  features: FeatureValues | null;
  screeningMs: number;
}

export function screenCase(
  { waveform, facts, recording }: LabelledWaveform,
  withFeatures: boolean,
): CaseOutcome {
  const { label, samples, sampleRateHz, unit, fullScale, toldSpeedRpm, speedHz } = waveform;
  const input = {
    samples,
    sampleRateHz,
    // A wrong unit is a mistake of whoever wrote the file: the samples are right, their name is not.
    unit: label.fault === 'wrong unit' ? (unit === 'g' ? ('mm/s' as const) : ('g' as const)) : unit,
    fullScale,
    toldSpeedRpm: toldSpeedRpm ?? undefined,
    machine: facts,
  };
  const started = performance.now();
  const { result } = screenWaveform(input);
  const screeningMs = performance.now() - started;
  return {
    machineId: label.machineId,
    looseness: label.looseness,
    severity: label.severity,
    lookAlike: label.lookAlike,
    physicsLeavesSign: label.physicsLeavesSign,
    risenOrders: label.risenOrders,
    visibleOrders: label.visibleOrders,
    fault: label.fault,
    expectsRetake: label.expectsRetake,
    verdict: result.verdict,
    score: result.score,
    speedSource: result.speed.source,
    speedError: result.speed.speedHz === null ? null : result.speed.speedHz / speedHz - 1,
    toldError: recording.toldSpeedError,
    features: withFeatures && result.score !== null ? extractFeatures(input) : null,
    screeningMs,
  };
}
