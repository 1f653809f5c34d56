import { CsvError } from './csv-error.ts';

/** Times judged together; a longer file is judged block by block, so its times need not be kept. */
const blockLengthMax = 65_536;
const blockLengthMin = 4096;

/** Largest share of a step an interval may differ from the mean step. */
const stepTolerance = 0.01;

/** Print rounding is allowed for up to this share of a step; above it the times tell nothing. */
const roundingShareMax = 0.2;

export interface TimeAxisResult {
  sampleRateHz: number;
  /** Largest relative error of the rate that the rounding of the printed times allows. */
  relativeUncertainty: number;
  /** Relative error to expect (six standard deviations), the roundings being independent. */
  likelyUncertainty: number;
  startTimeS: number;
  /** Whole numbers, each one more than the last: as likely a count of the samples as seconds. */
  isRunningNumber: boolean;
}

/**
 * Checks a time column while it is read and yields its sampling rate.
 *
 * Every interval must be within 1 % of the mean step; the rounding of the printed times (half a
 * unit of the last digit at each end, as the file prints them) is allowed for on top where the step
 * is no whole count of that digit, since six decimals at 25.6 kHz alone make 1.3 %. Intervals within 1 % may still add up: no time may stand
 * further from the even grid than half a step or 1e-4 of the block's length, whichever is more.
 *
 * The rate is that of the straight line through all times (least squares): the roundings of 16,384
 * times average out to some 1e-8, while those of the two end times alone leave 1e-6.
 */
export class TimeAxis {
  private readonly times: Float64Array;
  private readonly lines: Int32Array;
  private used = 0;
  private count = 0;
  private first = 0;
  private last = 0;
  private step = 0;
  /** Most decimals any time was printed with, and the most digits, as the largest whole number of them. */
  private maxDecimals = 0;
  private maxMantissa = 0;
  /** Sums over the rows of the deviation from an even grid, and of row number times deviation. */
  private deviationSum = 0;
  private momentSum = 0;

  /**
   * @param unitS - length of the written unit, s
   * @param expectedCount - times to expect, as far as known
   */
  constructor(
    private readonly unitS: number,
    expectedCount: number,
  ) {
    const length = Math.min(blockLengthMax, Math.max(blockLengthMin, expectedCount));
    this.times = new Float64Array(length + 1);
    this.lines = new Int32Array(length + 1);
  }

  /**
   * @param decimals - digits behind the mark less the written exponent
   * @param mantissa - all digits of the time as one whole number
   */
  push(time: number, line: number, decimals: number, mantissa: number): void {
    if (decimals > this.maxDecimals) this.maxDecimals = decimals;
    if (mantissa > this.maxMantissa) this.maxMantissa = mantissa;
    if (this.count === 0) this.first = time;
    this.last = time;
    this.count += 1;
    this.times[this.used] = time;
    this.lines[this.used] = line;
    this.used += 1;
    if (this.used === this.times.length) this.closeBlock();
  }

  /**
   * @throws {CsvError} `time-not-rising`, `time-not-uniform` with the first line at fault
   */
  finish(): TimeAxisResult {
    this.closeBlock();
    const { count } = this;
    const intervals = count - 1;
    const span = this.last - this.first;
    const rounding = this.halfUnit(this.first) + this.halfUnit(this.last);
    const spread = (count * (count * count - 1)) / 12;
    const step = this.step + (this.momentSum - (intervals / 2) * this.deviationSum) / spread;
    return {
      sampleRateHz: 1 / (step * this.unitS),
      relativeUncertainty: rounding / span + 1e-12,
      // A rounding spreads evenly over ± half a unit: standard deviation half a unit over √3.
      likelyUncertainty: (6 * rounding) / 2 / Math.sqrt(3 * spread) / step + 1e-12,
      startTimeS: this.first * this.unitS,
      isRunningNumber: Number.isInteger(this.first) && span === intervals,
    };
  }

  /** Judges the times gathered and keeps the last one as the start of the next block. */
  private closeBlock(): void {
    const n = this.used;
    if (n < 2) return;
    const { times, lines } = this;
    for (let i = 1; i < n; i += 1) {
      if (!(times[i]! > times[i - 1]!)) this.refuseStanding(i);
    }
    const meanStep = (times[n - 1]! - times[0]!) / (n - 1);
    if (this.step === 0) this.step = meanStep;
    if (this.firstUneven(n, this.step) > 0) {
      const step = this.typicalStep(n);
      const at = this.firstUneven(n, step);
      const fault = at > 0 ? at : this.firstUneven(n, this.step);
      this.refuseUneven(
        lines[fault]!,
        times[fault]! - times[fault - 1]!,
        at > 0 ? step : this.step,
      );
    }
    this.addToLine(n);
    times[0] = times[n - 1]!;
    lines[0] = lines[n - 1]!;
    this.used = 1;
  }

  /** Adds the block to the sums of the line through all times; its first time is in them already. */
  private addToLine(n: number): void {
    const rowOfFirst = this.count - n;
    for (let i = 1; i < n; i += 1) {
      const row = rowOfFirst + i;
      const deviation = this.times[i]! - this.first - row * this.step;
      this.deviationSum += deviation;
      this.momentSum += row * deviation;
    }
  }

  /** @returns index of the first time that breaks the step; 0 where none does */
  private firstUneven(n: number, step: number): number {
    const { times } = this;
    const first = times[0]!;
    const blockStep = (times[n - 1]! - first) / (n - 1);
    const wander = Math.max(0.5, 1e-4 * n) * step;
    const tolerance = stepTolerance * step;
    const rounded = this.isRounded(n, blockStep);
    for (let i = 1; i < n; i += 1) {
      const time = times[i]!;
      const off = Math.abs(time - times[i - 1]! - step);
      if (off > tolerance) {
        if (!rounded) return i;
        const rounding = this.halfUnit(time) + this.halfUnit(times[i - 1]!);
        const allowed = rounding <= 2 * roundingShareMax * step ? rounding : 0;
        if (off > tolerance + allowed) return i;
      }
      if (Math.abs(time - first - i * blockStep) > wander) return i;
    }
    return 0;
  }

  /** Steps of a whole count of the last printed digit need no rounding, and get no allowance for it. */
  private isRounded(n: number, blockStep: number): boolean {
    const largest = Math.max(Math.abs(this.times[0]!), Math.abs(this.times[n - 1]!));
    const digits = blockStep / (2 * this.halfUnit(largest));
    return Math.abs(digits - Math.round(digits)) > 2 / n;
  }

  /**
   * Median step, for the error: it names the line that breaks the step and not the first line of a
   * mean that one gap has spoilt.
   */
  private typicalStep(n: number): number {
    const intervals = new Float64Array(n - 1);
    for (let i = 1; i < n; i += 1) intervals[i - 1] = this.times[i]! - this.times[i - 1]!;
    intervals.sort();
    return intervals[(n - 1) >> 1]!;
  }

  /** Half a unit of the last printed digit at a time, plus the rounding of a double. */
  private halfUnit(time: number): number {
    const size = Math.abs(time);
    const digits = Math.floor(Math.log10(Math.max(1, this.maxMantissa))) + 1;
    const byDecimals = 0.5 * 10 ** -this.maxDecimals;
    const bySignificant = size === 0 ? 0 : 0.5 * 10 ** (Math.floor(Math.log10(size)) + 1 - digits);
    return Math.max(byDecimals, bySignificant) + size * Number.EPSILON;
  }

  private refuseStanding(i: number): never {
    const [before, now] = [this.times[i - 1]!, this.times[i]!];
    const advice =
      now === before
        ? 'If the times are rounded, export more decimals, or map the column as ignored and tell ' +
          'the sampling rate.'
        : 'Export one recording a file, in the order it was recorded.';
    throw new CsvError(
      'time-not-rising',
      this.lines[i]!,
      `The time is ${now} behind ${before} on the row before; expected times that rise. ${advice}`,
    );
  }

  private refuseUneven(line: number, interval: number, step: number): never {
    const show = (value: number) => Number(value.toPrecision(6));
    throw new CsvError(
      'time-not-uniform',
      line,
      `The time rises by ${show(interval)} to this row where the file's step is ${show(step)}; ` +
        'expected even steps within 1 %. Export the recording unbroken, or map the column as ' +
        'ignored and tell the sampling rate.',
    );
  }
}
