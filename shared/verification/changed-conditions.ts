import type { VerificationReading } from './verification-reading.ts';

/**
 * A change of measuring conditions between two readings of a point. Those that `spoil` keep the
 * comparison from having the last word; the others are only named.
 */
export interface ChangedCondition {
  spoils: boolean;
  text: string;
}

/**
 * Share by which the speed may differ: forces that rise with the square of the speed change by a
 * fifth at a tenth (by judgement, no source).
 */
const speedShare = 0.1;
/** Share by which an edge of the overall velocity's band may differ before it is named. */
const bandShare = 0.05;

const rpm = (value: number) => `${Math.round(value)} r/min`;
const band = ([from, to]: readonly [number, number]) => `${Math.round(from)}–${Math.round(to)} Hz`;

const differs = (a: number, b: number, share: number) =>
  Math.abs(a - b) > share * Math.max(Math.abs(a), Math.abs(b));

/**
 * Names what was measured otherwise after the repair than before it at one point.
 *
 * @returns sentences without the point's name, empty where nothing changed
 */
export function changedConditions(
  before: VerificationReading,
  after: VerificationReading,
): ChangedCondition[] {
  const changes: ChangedCondition[] = [];
  if (before.speedRpm === null || after.speedRpm === null) {
    const when = after.speedRpm === null ? 'after' : 'before';
    changes.push({ spoils: true, text: `no running speed was found ${when} the repair` });
  } else if (differs(before.speedRpm, after.speedRpm, speedShare)) {
    changes.push({
      spoils: true,
      text: `the shaft ran at ${rpm(after.speedRpm)} instead of ${rpm(before.speedRpm)}`,
    });
  }
  if (before.quantity !== after.quantity) {
    changes.push({
      spoils: false,
      text: `${after.quantity} was recorded instead of ${before.quantity}`,
    });
  }
  const [old, now] = [before.overallBandHz, after.overallBandHz];
  if (old && now && (differs(old[0], now[0], bandShare) || differs(old[1], now[1], bandShare))) {
    changes.push({
      spoils: false,
      text: `the overall velocity covers ${band(now)} instead of ${band(old)}`,
    });
  }
  if (before.methodVersion !== after.methodVersion) {
    changes.push({
      spoils: false,
      text: `the method is version ${after.methodVersion} instead of ${before.methodVersion}, so the scores are not on one scale`,
    });
  }
  if (before.suspectedScore !== after.suspectedScore) {
    changes.push({
      spoils: false,
      text: `the limit of suspicion is ${after.suspectedScore} instead of ${before.suspectedScore}`,
    });
  }
  return changes;
}
