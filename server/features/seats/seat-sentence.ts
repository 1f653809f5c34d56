import type { SeatFit, SeatName, SeatVerdict } from '#shared/fits/fit-types.ts';
import type { SeatRecord } from './seat-record.ts';

const um = (value: number) => `${Math.round(Math.abs(value) * 10) / 10} µm`;
const fitWords = (value: number) =>
  value >= 0 ? `${um(value)} of interference` : `${um(value)} of clearance`;

function verdictWords(fit: SeatFit): string {
  const by = fit.outsideLimitsUm ? ` by ${um(fit.outsideLimitsUm)}` : '';
  const asked = fit.recommendedClass ?? 'the class on record';
  const words: Readonly<Record<SeatVerdict, string>> = {
    'as recommended': `which agrees with ${asked}`,
    looser: `which is looser than ${asked}${by}`,
    tighter: `which is tighter than ${asked}${by}`,
    'not recorded': 'and nothing tells whether that is right',
  };
  return fit.verdict === undefined
    ? 'with nothing on record to compare it with'
    : words[fit.verdict];
}

/** What is on record of a seat that has no chance of clearance, for the ranking; null where nothing is. */
export function recordedWithoutChance(record: SeatRecord): string | null {
  if (record.bonding === 'bonded') return 'bonded with adhesive on purpose';
  if (record.clearanceReductionUm !== null) return null;
  return record.driveUpMm === null ? null : `driven up ${record.driveUpMm} mm on its taper`;
}

/** What the records of one seat mean, in one sentence, outside any finding. */
export function seatSentence(seat: SeatName, fit: SeatFit | undefined, record: SeatRecord): string {
  const bonded =
    record.bonding === 'bonded'
      ? ' It is bonded with adhesive on purpose: the bond holds the ring, so its clearance is no fault by itself.'
      : '';
  return `${fitSentence(seat, fit, record)}${bonded}`;
}

function fitSentence(seat: SeatName, fit: SeatFit | undefined, record: SeatRecord): string {
  const name = seat === 'shaft' ? 'The shaft seat' : 'The housing seat';
  if (fit === undefined) return `${name} can't be judged: its nominal size is not on record.`;
  if (fit.verdict === 'not recorded') {
    return (
      fit.reason ??
      `${name} has neither class nor diameter on record; get the drawing, or measure it at the next opening.`
    );
  }
  const rest = fit.interferenceUm;
  if (rest === undefined) return fit.reason ?? `${name}: ${verdictWords(fit)}.`;
  if (record.seatMeasuredMm !== null) {
    return `${name} measures ${record.seatMeasuredMm.toFixed(3)} mm, a fit with ${fitWords(rest.mean)}, ${verdictWords(fit)}.`;
  }
  const range =
    rest.min >= 0 || rest.max <= 0
      ? `${um(rest.min >= 0 ? rest.min : rest.max)} to ${fitWords(rest.min >= 0 ? rest.max : rest.min)}`
      : `${fitWords(rest.min)} to ${fitWords(rest.max)}`;
  return `${name} is ${record.toleranceClass ?? 'unknown'} by its record, ${range}, ${verdictWords(fit)}.`;
}
