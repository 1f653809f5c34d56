import type { WaveformAnalysis } from './analyse-waveform.ts';
import type { QualityDefect, ScreeningInput, ScreeningLimits } from './screening-types.ts';

const samplesMin = 256;
const gapShareMax = 0.02;
const linesPerOrderMin = 6;
/** A record that has not settled drifts by more than this many of its own rms. */
const settlingFactor = 2.5;

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
  const drift = settling(values, rms);
  if (drift !== null) found.push(drift);
  if (view === null) return found;
  if (speedHz === null || (told && !speedSupported)) {
    found.push(
      defect(
        'speed-unsupported',
        speedHz === null,
        speedHz === null
          ? 'No running speed is told and none can be found in the lines.'
          : 'No line supports the told running speed.',
        'Measure the speed with a strobe or tachometer and tell it.',
      ),
    );
  }
  if (speedHz === null) return found;
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

/** A ramp at the beginning: the sensor's supply or an integrator had not settled. */
function settling(values: Float64Array, rms: number): QualityDefect | null {
  const eighth = Math.floor(values.length / 8);
  const mean = (from: number, to: number) => {
    let sum = 0;
    for (let i = from; i < to; i += 1) sum += values[i] ?? 0;
    return sum / (to - from);
  };
  const half = values.length >> 1;
  const late = mean(half, values.length);
  const drift = Math.abs(mean(0, eighth) - late);
  let lateRms = 0;
  for (let i = half; i < values.length; i += 1) lateRms += ((values[i] ?? 0) - late) ** 2;
  lateRms = Math.sqrt(lateRms / half);
  if (drift < settlingFactor * Math.max(lateRms, 0.02 * rms)) return null;
  return defect(
    'settling',
    true,
    `The record drifts: its beginning lies ${(drift / Math.max(lateRms, 1e-12)).toFixed(1)} times the later rms away.`,
    'Wait until the sensor has settled before recording.',
  );
}
