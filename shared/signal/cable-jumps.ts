import { medianInPlace } from './noise-floor.ts';

/** A jump of so many robust standard deviations from one sample to the next … */
const jumpSigmas = 10;
/** … of which each of the samples after it keeps so much, and no more. */
const keptShare = 0.2;
const keptMost = 1.15;
const keptSamplesMin = 8;
const keptS = 0.003;
const medianOf = 4096;
/** Normal distribution: median of the size over the standard deviation. */
const medianOverSigma = 0.6745;

/**
 * Counts jumps that come from one sample to the next and stay, as a plug that makes contact by turns
 * gives them. A blow to the casing jumps as well but rings back at once.
 *
 * @param values - prepared samples, without mean
 */
export function countCableJumps(values: Float64Array, sampleRateHz: number): number {
  const keptSamples = Math.max(keptSamplesMin, Math.round(keptS * sampleRateHz));
  // Some thousand of them tell the median well enough.
  const stride = Math.max(1, Math.floor(values.length / medianOf));
  const sizes = new Float64Array(Math.ceil(values.length / stride));
  for (let i = 0; i < sizes.length; i += 1) sizes[i] = Math.abs(values[i * stride] ?? 0);
  const sigma = medianInPlace(sizes, sizes.length) / medianOverSigma;
  if (!(sigma > 0)) return 0;
  let jumps = 0;
  for (let i = 1; i + keptSamples < values.length; i += 1) {
    const before = values[i - 1] ?? 0;
    const jump = (values[i] ?? 0) - before;
    // From the quiet only: the swing of a ringing blow is as large.
    if (Math.abs(jump) < jumpSigmas * sigma || Math.abs(before) > 0.3 * Math.abs(jump)) continue;
    let keeps = true;
    for (let j = 1; j < keptSamples && keeps; j += 1) {
      const left = ((values[i + j] ?? 0) - before) / jump;
      keeps = left > keptShare && left < keptMost;
    }
    if (keeps) {
      jumps += 1;
      i += keptSamples;
    }
  }
  return jumps;
}
