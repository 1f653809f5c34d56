import type { WaveformAnalysis } from './analyse-waveform.ts';
import { countCableJumps } from './cable-jumps.ts';
import { clippedBeforeIntegration } from './clipping-before-integration.ts';
import { countLevels } from './converter-levels.ts';
import type { QualityDefect, ScreeningInput, ScreeningLimits } from './screening-types.ts';
import { settlingDrift, skiSlopeRatio } from './slow-drift.ts';
import { stuckShare } from './stuck-samples.ts';

const samplesMin = 256;
const gapShareMax = 0.02;
const linesPerOrderMin = 6;
/** A record that has not settled drifts by more than this many of its own rms. */
const settlingFactor = 2.5;
const stuckShareMax = 0.01;
/** Eight levels are three bits: their steps alone make lines at every order. */
const levelsMin = 10;
const cableJumpsMin = 2;
const skiSlopeMax = 25;

const defect = (
  code: string,
  forcesRetake: boolean,
  message: string,
  advice: string,
): QualityDefect => ({ code, forcesRetake, message, advice });

/** Whether a record is fit to be judged; each defect says what to set at the retake. */
export function qualityDefects(
  { prepared, clipping, view, speed, speedSupported }: WaveformAnalysis,
  { sampleRateHz, toldSpeedRpm }: ScreeningInput,
  limits: ScreeningLimits,
): QualityDefect[] {
  const { speedHz } = speed;
  const told = toldSpeedRpm !== undefined && toldSpeedRpm > 0;
  const { values } = prepared;
  const found: QualityDefect[] = [];
  const count = values.length;
  if (count < samplesMin) {
    return [
      defect(
        'too-short',
        true,
        `The record has ${count} samples; ${samplesMin} are the least that can be looked at.`,
        'Record at least 4096 samples.',
      ),
    ];
  }
  const rms = Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / count);
  if (!(rms > 0)) {
    return [
      defect(
        'constant',
        true,
        'Every sample has the same value: the sensor or its cable gave no signal.',
        'Check sensor, cable and input, and measure again.',
      ),
    ];
  }
  const gapShare = prepared.gapCount / count;
  if (prepared.gapCount > 0) {
    found.push(
      defect(
        'gaps',
        gapShare > gapShareMax,
        `${prepared.gapCount} samples are missing (${(gapShare * 100).toFixed(1)} %), the longest gap is ${prepared.longestGap} samples.`,
        'Measure again; if it comes back, check cable and recorder.',
      ),
    );
  }
  if (prepared.cutShort) {
    found.push(
      defect(
        'cut-short',
        false,
        `The record is longer than what is looked at; the first ${count} samples were screened.`,
        'Nothing to do: that is enough.',
      ),
    );
  }
  if (clipping.upper || clipping.lower) {
    const side = clipping.upper && clipping.lower ? 'both sides' : 'one side';
    found.push(
      defect(
        'overload',
        true,
        `The instrument cut the record off on ${side}: ${(clipping.share * 100).toFixed(1)} % of the samples sit on one and the same extreme value.`,
        'Set a larger range, let the input settle, and measure again.',
      ),
    );
  }
  const levels = countLevels(prepared.raw, levelsMin);
  if (levels < levelsMin) {
    found.push(
      defect(
        'few-levels',
        true,
        `The record has ${levels} different values only: its steps hide the vibration.`,
        'Set a smaller range, so that the signal fills a good part of it, and measure again.',
      ),
    );
  }
  if (
    prepared.quantity !== 'acceleration' &&
    clippedBeforeIntegration(values, prepared.quantity === 'velocity' ? 1 : 2)
  ) {
    found.push(
      defect(
        'overload-before-integration',
        true,
        'The steps from sample to sample crowd at one extreme value: the instrument was overloaded before it integrated.',
        'Set a larger range, let the input settle, and measure again.',
      ),
    );
  }
  const stuck = stuckShare(prepared.raw);
  if (stuck > stuckShareMax) {
    found.push(
      defect(
        'dropouts',
        true,
        `${(stuck * 100).toFixed(1)} % of the samples stand still between jumps: the link dropped out.`,
        'Check cable and link, and measure again.',
      ),
    );
  }
  const jumps = countCableJumps(values, sampleRateHz);
  if (jumps >= cableJumpsMin) {
    found.push(
      defect(
        'cable-jumps',
        true,
        `The signal jumps ${jumps} times and creeps back: a plug or cable makes contact by turns.`,
        'Check plug and cable, and measure again.',
      ),
    );
  }
  const drift = settlingDrift(values);
  if (drift > settlingFactor) {
    found.push(
      defect(
        'settling',
        true,
        `The record drifts: its beginning lies ${drift.toFixed(1)} times the later rms away.`,
        'Wait until the sensor has settled before recording.',
      ),
    );
  }
  if (view === null) return found;
  if (speedHz === null || !speedSupported) {
    found.push(
      defect(
        'speed-unsupported',
        speedHz === null,
        speedHz === null
          ? 'No running speed is told and none can be found in the lines.'
          : told
            ? 'No line supports the told running speed.'
            : 'No running speed is told and no line gives it away: the nominal speed was taken.',
        'Measure the speed with a strobe or tachometer and tell it.',
      ),
    );
  }
  if (speedHz === null) return found;
  const slope = skiSlopeRatio(view, speedHz);
  if (slope > skiSlopeMax) {
    found.push(
      defect(
        'ski-slope',
        true,
        `Below a quarter of running speed there is ${slope.toFixed(0)} times the power of everything above: drift or low-frequency noise buries the orders.`,
        'Check the sensor mount and its temperature, let it settle, and measure again with a higher low-frequency limit.',
      ),
    );
  }
  const revolutions = (count / sampleRateHz) * speedHz;
  if (revolutions < limits.minRevolutions) {
    found.push(
      defect(
        'few-revolutions',
        true,
        `The record covers ${revolutions.toFixed(1)} revolutions; ${limits.minRevolutions} are needed.`,
        `Record at least ${((limits.minRevolutions * 2) / speedHz).toFixed(1)} s.`,
      ),
    );
  }
  const ordersInBand = view.usableHz / speedHz;
  if (ordersInBand < limits.minOrdersInBand) {
    found.push(
      defect(
        'few-orders',
        true,
        `The band ends at order ${ordersInBand.toFixed(1)}; ${limits.minOrdersInBand} orders are the least to judge by.`,
        `Set a top frequency of at least ${Math.ceil(20 * speedHz)} Hz (20 orders).`,
      ),
    );
  }
  const linesPerOrder = speedHz / view.stepHz;
  if (linesPerOrder < linesPerOrderMin && revolutions >= limits.minRevolutions) {
    found.push(
      defect(
        'few-lines',
        false,
        `There are ${linesPerOrder.toFixed(1)} lines to an order; neighbouring orders can hardly be told apart.`,
        'Record longer, or with more lines.',
      ),
    );
  }
  return found;
}
