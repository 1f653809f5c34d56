/** Positions of the highest local maxima, highest first. */
export function highestLines(amplitude: ArrayLike<number>, count: number): number[] {
  const peaks: number[] = [];
  for (let line = 1; line < amplitude.length; line += 1) {
    const value = amplitude[line] ?? 0;
    if (value > (amplitude[line - 1] ?? 0) && value >= (amplitude[line + 1] ?? 0)) peaks.push(line);
  }
  return peaks.sort((a, b) => (amplitude[b] ?? 0) - (amplitude[a] ?? 0)).slice(0, count);
}
