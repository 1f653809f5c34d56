/** What the program can be asked on the command line; also shown where it can't make sense of it. */
export const usage = `Usage: npm run --silent fretline -- COMMAND …

screen FILE_OR_FOLDER… [options]
  Screens waveforms for mechanical looseness; one JSON object a line for each channel.
  --speed-rpm N          told speed of the machine, r/min (instead of the file's speed_rpm)
  --sample-rate-hz N     sampling rate of files without a time column, Hz
  --unit U               unit of columns whose header names none: g, m/s2, mm/s, in/s, um, mil
  --decimal-mark M       . or , in files whose commas can be read both ways
  --line-frequency-hz N  frequency of the electric supply, Hz
  --machine FILE.json    what is known of the machine

spectrum FILE [--unit U] [--sample-rate-hz N] [--window hann|none]
  Prints the amplitude spectrum (peak) of the whole record as JSON, one line for each channel.

fit [FILE]
  Assesses the fits of bearing seats: one JSON object a line in, one out.

limits "40 k5"…
  Prints the limit deviations of tolerance classes by ISO 286.

evaluate [--machines N] [--seed N] [--noise N] [--real FOLDER] [--json FILE] [--fit]
  Judges the screening on simulated machines it was not fitted on, and on real recordings in FOLDER
  (with an index.json), each figure beside its target. --fit fits the weights of the score first.

Exit status: 0 done, 1 some input could not be read or answered, 2 wrong arguments.
A screening is a hint for a qualified analyst, not a diagnosis and not a release to run.
`;

/** `help`: prints the usage. */
export function run(): Promise<number> {
  process.stdout.write(usage);
  return Promise.resolve(0);
}
