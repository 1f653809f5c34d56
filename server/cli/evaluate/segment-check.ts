import { drawLookAlike, drawLooseCondition } from '#fixtures/signals/draw-condition.ts';
import { drawMachine } from '#fixtures/signals/draw-machine.ts';
import { drawRecording } from '#fixtures/signals/draw-recording.ts';
import { machineFacts } from '#fixtures/signals/machine-facts.ts';
import { RandomStream } from '#fixtures/signals/random-stream.ts';
import { severities, simulatedLoosenessKinds } from '#fixtures/signals/signal-types.ts';
import { simulateWaveform } from '#fixtures/signals/simulate-waveform.ts';
import { screenWaveform } from '#shared/signal/screen-waveform.ts';

const segments = 4;
const segmentSamples = 16_384;

/**
 * Screens four stretches of one long record, as if measured one after the other.
 *
 * @returns the largest difference of their scores; null where a stretch was sent back
 */
export function segmentSpread(seed: number): number | null {
  const random = new RandomStream(['segments', seed]);
  const machine = drawMachine(random.bits() >>> 0, {
    nominalSpeedRpm: random.logBetween(700, 3600),
  });
  const condition =
    seed % 2 === 0
      ? drawLooseCondition(
          machine,
          simulatedLoosenessKinds[(seed / 2) % simulatedLoosenessKinds.length]!,
          random.pick(severities),
          random,
        )
      : drawLookAlike(machine, 'sound', random);
  const recording = drawRecording(machine, random, {
    sampleRateHz: random.pick([2560, 5120, 10_240]),
    sampleCount: segments * segmentSamples,
    unit: random.pick(['g', 'mm/s']),
  });
  const { samples, unit, sampleRateHz, toldSpeedRpm, fullScale } = simulateWaveform(
    machine,
    condition,
    recording,
    1,
  );
  const scores: number[] = [];
  for (let segment = 0; segment < segments; segment++) {
    const { result } = screenWaveform({
      samples: samples.slice(segment * segmentSamples, (segment + 1) * segmentSamples),
      sampleRateHz,
      unit,
      fullScale,
      toldSpeedRpm: toldSpeedRpm ?? undefined,
      machine: machineFacts(machine),
    });
    if (result.score === null) return null;
    scores.push(result.score);
  }
  return Math.max(...scores) - Math.min(...scores);
}
