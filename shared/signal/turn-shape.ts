/** Skewness and excess kurtosis of a turn; a sine has 0 and −1.5. Both 0 for a constant. */
export function momentsOf(values: Float64Array): { skewness: number; kurtosis: number } {
  const count = Math.max(1, values.length);
  let mean = 0;
  for (const value of values) mean += value / count;
  let [second, third, fourth] = [0, 0, 0];
  for (const value of values) {
    const away = value - mean;
    const square = away * away;
    second += square / count;
    third += (square * away) / count;
    fourth += (square * square) / count;
  }
  if (!(second > 1e-300)) return { skewness: 0, kurtosis: 0 };
  return { skewness: third / second ** 1.5, kurtosis: fourth / (second * second) - 3 };
}
