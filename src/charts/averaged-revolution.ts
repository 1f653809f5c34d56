/**
 * The pure once-per-turn part of an averaged turn: its sine of the same amplitude, phase and mean.
 *
 * @param turn - one revolution in equal steps
 */
export function firstOrderSine(turn: ArrayLike<number>): Float64Array {
  const count = turn.length;
  let mean = 0;
  let cosine = 0;
  let sine = 0;
  for (let i = 0; i < count; i += 1) {
    const value = turn[i] ?? 0;
    const angle = (2 * Math.PI * i) / count;
    mean += value;
    cosine += value * Math.cos(angle);
    sine += value * Math.sin(angle);
  }
  return Float64Array.from({ length: count }, (_, i) => {
    const angle = (2 * Math.PI * i) / count;
    return mean / count + (2 / count) * (cosine * Math.cos(angle) + sine * Math.sin(angle));
  });
}
