import { addColouredNoise, type NoiseColour } from '#fixtures/signals/noise.ts';
import { filterInPlace, modeSection } from '#fixtures/signals/filters.ts';
import { RandomStream } from '#fixtures/signals/random-stream.ts';
import type { Unit } from '#shared/quantities/quantity.ts';
import { screenWaveform } from '#shared/signal/screen-waveform.ts';

export interface NoiseOutcome {
  colour: string;
  flagged: boolean;
  /** Chance the method states for the run it found. */
  pChance: number;
  /** Orders 1–20 of a stated chance below 1 %, and how many were looked at. */
  rareOrders: number;
  orders: number;
}

const colours: Readonly<Record<string, NoiseColour>> = {
  white: { white: 1, pink: 0, brown: 0 },
  pink: { white: 0, pink: 1, brown: 0 },
  brown: { white: 0, pink: 0, brown: 1 },
  'white and brown': { white: 0.3, pink: 0, brown: 1 },
  resonant: { white: 1, pink: 0, brown: 0 },
};
export const noiseColours = Object.keys(colours);

const unitsTried: readonly Unit[] = ['g', 'mm/s', 'µm'];

/** Screens a record of noise alone: there is no family in it, whatever is told. */
export function screenNoise(seed: number): NoiseOutcome {
  const colour = noiseColours[seed % noiseColours.length]!;
  const random = new RandomStream(['noise record', seed]);
  const sampleRateHz = random.pick([1000, 2560, 5120, 12_800, 25_600]);
  const speedHz = random.logBetween(
    Math.max(5, (24 * sampleRateHz) / 16_384),
    Math.min(120, sampleRateHz / 26),
  );
  const samples = new Float64Array(8192 * random.pick([1, 2]));
  addColouredNoise(samples, sampleRateHz, colours[colour]!, random);
  if (colour === 'resonant') {
    const hz = sampleRateHz * random.between(0.03, 0.3);
    filterInPlace(samples, modeSection(hz, random.logBetween(0.02, 0.2), sampleRateHz));
  }
  const { result } = screenWaveform({
    samples,
    sampleRateHz,
    unit: random.pick(unitsTried),
    toldSpeedRpm: speedHz * 60,
  });
  const whole = result.orders.filter(({ order }) => Number.isInteger(order) && order <= 20);
  return {
    colour,
    flagged: result.verdict === 'suspected' || result.verdict === 'likely',
    pChance: result.harmonicRun.pChance,
    rareOrders: whole.filter(({ pNoise }) => pNoise < 0.01).length,
    orders: whole.length,
  };
}

/** Rate, length and speed at which the bounds of the design are stated: 1.6 s near 25 Hz. */
const checkRateHz = 2560;
const checkSamples = 4096;

/**
 * Screens six orders in white noise, each so strong that with four averages it stands 2.4 dB over
 * the noise in the mean.
 *
 * @returns the chance the method states for the family it found
 */
export function screenWeakFamily(seed: number): number {
  const random = new RandomStream(['weak family', seed]);
  const speedHz = random.between(22, 28);
  // Four averages of half-overlapping Hann blocks take a record of 2.5 blocks.
  const block = checkSamples / 2.5;
  const noiseInLine = (1.5 * checkRateHz) / block / (checkRateHz / 2);
  // A line that brings power and noise together to 2.4 dB over the noise alone.
  const linePower = noiseInLine * (10 ** 0.24 - 1);
  const samples = family(speedHz, [1, 2, 3, 4, 5, 6], Math.sqrt(2 * linePower), random);
  const { result } = screenWaveform({
    samples,
    sampleRateHz: checkRateHz,
    unit: 'g',
    toldSpeedRpm: speedHz * 60,
    toldSpeedTolerance: 1e-3,
  });
  return result.harmonicRun.pChance;
}

export interface SpeedBoundOutcome {
  orders: number;
  /** Error of the speed over the Cramér–Rao bound. */
  errorOverBound: number;
}

/** Finds the speed of one tone, or six, at 0 dB a sample (Rife and Boorstyn 1974). */
export function screenSpeedBound(seed: number, orders: number): SpeedBoundOutcome {
  const random = new RandomStream(['speed bound', orders, seed]);
  const speedHz = random.between(22, 28);
  const list = Array.from({ length: orders }, (_, index) => index + 1);
  const samples = family(speedHz, list, Math.SQRT2, random);
  const { result } = screenWaveform({
    samples,
    sampleRateHz: checkRateHz,
    unit: 'g',
    toldSpeedRpm: speedHz * 60 * (1 + random.between(-0.02, 0.02)),
  });
  const squares = list.reduce((sum, order) => sum + order * order, 0);
  const boundRad = Math.sqrt(6 / (squares * checkSamples ** 3));
  const boundHz = (boundRad * checkRateHz) / (2 * Math.PI);
  const found = result.speed.speedHz;
  return { orders, errorOverBound: found === null ? Infinity : (found - speedHz) / boundHz };
}

/** Orders of one peak in white noise of variance 1. */
function family(
  speedHz: number,
  orders: readonly number[],
  peak: number,
  random: RandomStream,
): Float64Array {
  const samples = new Float64Array(checkSamples);
  const phases = orders.map(() => random.phase());
  for (let i = 0; i < samples.length; i++) {
    let value = random.normal();
    orders.forEach((order, index) => {
      const turns = (order * speedHz * i) / checkRateHz;
      value += peak * Math.cos(2 * Math.PI * turns + phases[index]!);
    });
    samples[i] = value;
  }
  return samples;
}
