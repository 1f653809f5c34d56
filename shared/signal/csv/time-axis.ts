import { CsvError } from './csv-error.ts';

/** Times judged together; a longer file is judged block by block, so its times need not be kept. */
const blockLength = 65_536;

/** Largest share of a step an interval may differ from the mean step. */
const stepTolerance = 0.01;

/** Print rounding is allowed for up to this share of a step; above it the times tell nothing. */
const roundingShareMax = 0.2;

export interface TimeAxisResult {
  sampleRateHz: number;
  /** Largest relative error of the rate that the rounding of the printed times leaves. */
  relativeUncertainty: number;
  startTimeS: number;
  /** Whole numbers, each one more than the last: as likely a count of the samples as seconds. */
  isRunningNumber: boolean;
}

/**
 * Checks a time column while it is read and yields its sampling rate.
 *
 * Every interval must be within 1 % of the mean step; the rounding of the printed times (half a
 * unit of the last digit at each end, as the file prints them) is allowed for on top, since six
 * decimals at 25.6 kHz alone make 1.3 %. Intervals within 1 % may still add up: no time may stand
 * further from the even grid than half a step or 1e-4 of the block's length, whichever is more.
 */
export class TimeAxis {
  private readonly times = new Float64Array(blockLength + 1);
  private readonly lines = new Int32Array(blockLength + 1);
  private used = 0;
  private count = 0;
  private first = 0;
  private last = 0;
  private step = 0;
  /** Most decimals any time was printed with, and the most digits, as the largest whole number of them. */
  private maxDecimals = 0;
  private maxMantissa = 0;

  /** @param unitS - length of the written unit, s */
  constructor(private readonly unitS: number) {}

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
    if (this.used > blockLength) this.closeBlock();
  }

  /**
   * @throws {CsvError} `time-not-rising`, `time-not-uniform` with the first line at fault
   */
  finish(): TimeAxisResult {
    this.closeBlock();
    const intervals = this.count - 1;
    const span = this.last - this.first;
    const rounding = this.halfUnit(this.first) + this.halfUnit(this.last);
    return {
      sampleRateHz: intervals / (span * this.unitS),
      relativeUncertainty: rounding / span + 1e-12,
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
    const first = times[0]!;
    const blockStep = (times[n - 1]! - first) / (n - 1);
    if (this.step === 0) this.step = this.typicalStep(n, blockStep);
    const step = this.step;
    const wander = Math.max(0.5 * step, 1e-4 * n * step);
    for (let i = 1; i < n; i += 1) {
      const halfUnits = this.halfUnit(times[i]!) + this.halfUnit(times[i - 1]!);
      const rounding = halfUnits <= 2 * roundingShareMax * step ? halfUnits : 0;
      const interval = times[i]! - times[i - 1]!;
      const even = first + i * blockStep;
      if (
        Math.abs(interval - step) > stepTolerance * step + rounding ||
        Math.abs(times[i]! - even) > wander
      ) {
        this.refuseUneven(lines[i]!, interval, step);
      }
    }
    times[0] = times[n - 1]!;
    lines[0] = lines[n - 1]!;
    this.used = 1;
  }

  /**
   * Mean step where the times are even; the median where they aren't, so that the error names the
   * line that breaks the step and not the first line of a mean that one gap has spoilt.
   */
  private typicalStep(n: number, meanStep: number): number {
    const intervals = new Float64Array(n - 1);
    for (let i = 1; i < n; i += 1) intervals[i - 1] = this.times[i]! - this.times[i - 1]!;
    intervals.sort();
    const median = intervals[(n - 1) >> 1]!;
    return Math.abs(median - meanStep) <= 0.2 * median ? meanStep : median;
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
