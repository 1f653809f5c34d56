import { parseDecimal } from '#src/lib/numbers.ts';
import type { InPlaceDraft } from './report-draft.ts';
import type { InPlaceCheckName } from '#shared/contracts/in-place-check.ts';

/** A tight joint passes the movement on; twice as much above it says that it works (common practice, no source). */
const workingRatio = 2;
/** Soft foot from which a foot is shimmed (common practice, no source). */
const softFootMm = 0.05;

const fixed = (value: number) => value.toFixed(1);

/** What a check's readings say, at once; null where they say nothing. */
export function inPlaceMeaning(check: InPlaceCheckName, told: InPlaceDraft): string | null {
  const reading = parseDecimal(told.reading);
  const above = parseDecimal(told.readingAbove);
  if (check === 'soft foot' && reading !== undefined && Number.isFinite(reading)) {
    return reading > softFootMm
      ? `More than ${softFootMm} mm: shim the foot, and tighten the bolts crosswise.`
      : `Within ${softFootMm} mm, as a foot should sit.`;
  }
  if (check !== 'movement across the joint' || !(reading! > 0) || !(above! > 0)) return null;
  const ratio = above! / reading!;
  return ratio >= workingRatio
    ? `Above the joint it moves ${fixed(ratio)} times as much as below: the joint works.`
    : `Above the joint it moves ${fixed(ratio)} times as much as below: the joint passes the movement on.`;
}
