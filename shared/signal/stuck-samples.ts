const runMin = 8;
/** A held value is left by a jump; a coarse converter's plateau by a step or two. */
const jumpSteps = 3;
const jumpOverUsual = 0.5;

/**
 * Share of the samples that stand still where the link dropped out: runs of one and the same value
 * that end (or begin) with a jump. The extremes are left to the clipping check.
 *
 * @param samples - as recorded; non-finite ones are passed over
 * @returns 0–1
 */
export function stuckShare(samples: Float64Array): number {
  let [low, high, least, sum, count] = [Infinity, -Infinity, Infinity, 0, 0];
  for (let i = 0; i < samples.length; i += 1) {
    const value = samples[i] as number;
    // No comparison with what is not a number holds.
    if (!(value < Infinity && value > -Infinity)) continue;
    if (value < low) low = value;
    if (value > high) high = value;
    const step = i > 0 ? Math.abs(value - (samples[i - 1] as number)) : 0;
    if (!(step > 0 && step < Infinity)) continue;
    if (step < least) least = step;
    sum += step;
    count += 1;
  }
  if (count === 0) return 0;
  const jump = Math.max(jumpSteps * least, (jumpOverUsual * sum) / count);
  let stuck = 0;
  let from = 0;
  for (let i = 1; i <= samples.length; i += 1) {
    const held = samples[from] ?? 0;
    if (i < samples.length && samples[i] === held) continue;
    const before = Math.abs((samples[from - 1] ?? held) - held);
    const after = Math.abs((samples[i] ?? held) - held);
    if (i - from >= runMin && held > low && held < high && Math.max(before, after) > jump) {
      stuck += i - from;
    }
    from = i;
  }
  return stuck / samples.length;
}
