/** A waveform in the CSV convention: a sine at running speed with its double, exactly repeatable. */
export function aWaveformCsv(
  options: {
    comments?: Record<string, string | number>;
    header?: string | null;
    rows?: number;
    sampleRateHz?: number;
    speedHz?: number;
    amplitude?: number;
  } = {},
): string {
  const { comments = {}, header = 'acceleration [g]', rows = 4096 } = options;
  const { sampleRateHz = 2560, speedHz = 24.6, amplitude = 0.2 } = options;
  const all = { sample_rate_hz: sampleRateHz, speed_rpm: 1476, ...comments };
  const lines = Object.entries(all).map(([key, value]) => `# ${key}: ${value}`);
  if (header !== null) lines.push(header);
  for (let i = 0; i < rows; i += 1) {
    const turn = (2 * Math.PI * speedHz * i) / sampleRateHz;
    lines.push((amplitude * (Math.sin(turn) + 0.3 * Math.sin(2 * turn))).toFixed(6));
  }
  return `${lines.join('\n')}\n`;
}
