import type { CommentLines } from './comment-lines.ts';
import { CsvError } from './csv-error.ts';
import { maxSampleRateHz } from './csv-limits.ts';
import type { TimeAxisResult } from './time-axis.ts';
import type { SampleRateSource } from './waveform-csv.ts';

/** A rate told and one read from the times may differ by this share: nominal against measured. */
const agreement = 1e-3;

/** Slowest rate believed of a time column whose unit isn't named: below it, it isn't in seconds. */
const slowestUnnamedHz = 10;

/**
 * Settles the sampling rate: the time column's where there is one, else as told, else the comment
 * line's.
 *
 * The rate of printed times is uncertain by their rounding. A told or noted rate the times can't
 * refute is taken exactly as written, and so is a whole number of hertz within their likely error;
 * otherwise the times decide. A told or noted rate more than 0.1 % off is a contradiction.
 *
 * @param axis - what the time column says; null without one
 * @param unitNamed - whether the header or the mapping names the unit of the times
 */
export function settleSampleRate(
  axis: TimeAxisResult | null,
  unitNamed: boolean,
  toldHz: number | undefined,
  comments: CommentLines,
  notedHz: number | undefined,
): { sampleRateHz: number | null; sampleRateSource: SampleRateSource | null } {
  const claimedHz = toldHz ?? notedHz;
  const claimedBy = toldHz !== undefined ? 'told' : 'comment';
  if (axis === null) {
    return claimedHz === undefined
      ? { sampleRateHz: null, sampleRateSource: null }
      : { sampleRateHz: claimedHz, sampleRateSource: claimedBy };
  }

  const byTimesHz = axis.sampleRateHz;
  const uncertainty = Math.max(axis.relativeUncertainty, 1e-9);
  if (!(byTimesHz <= maxSampleRateHz) || (!unitNamed && byTimesHz < slowestUnnamedHz)) {
    throw new CsvError(
      'implausible-rate',
      null,
      `By the time column the sampling rate is ${Number(byTimesHz.toPrecision(6))} Hz; expected ` +
        `${slowestUnnamedHz} to ${maxSampleRateHz} Hz. Name the unit of the time in the header, ` +
        'e.g. "time [ms]", or map the column as ignored and tell the sampling rate.',
    );
  }
  if (claimedHz !== undefined) {
    const difference = Math.abs(claimedHz - byTimesHz) / byTimesHz;
    if (difference > Math.max(agreement, uncertainty)) {
      throw new CsvError(
        'contradictory-rate',
        toldHz === undefined ? comments.lineOf('sample_rate_hz') : null,
        `The sampling rate is ${claimedHz} Hz ${claimedBy === 'told' ? 'as told' : 'here'} and ` +
          `${Number(byTimesHz.toPrecision(6))} Hz by the time column; expected them to agree. ` +
          'Correct the one that is wrong, or map the time column as ignored.',
      );
    }
    if (difference <= uncertainty) return { sampleRateHz: claimedHz, sampleRateSource: 'time' };
  }
  const whole = Math.round(byTimesHz);
  const likely = Math.max(1e-9, Math.min(uncertainty, axis.likelyUncertainty));
  const isWhole = whole > 0 && Math.abs(whole - byTimesHz) <= likely * byTimesHz;
  return { sampleRateHz: isWhole ? whole : byTimesHz, sampleRateSource: 'time' };
}
