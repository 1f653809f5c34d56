import type { SeatName } from './fit-types.ts';

/** What the screenings of a finding say beyond "looseness"; null or absent where it was not seen. */
export interface FindingSigns {
  /** Which joint the screening favours. */
  kind?: 'seat' | 'pedestal' | 'undetermined' | null;
  /** Direction in which the harmonics are strongest. */
  strongestDirection?: 'horizontal' | 'vertical' | 'axial' | null;
  /** Whether the run is modulated by a slow creep of a ring. */
  creepModulation?: boolean | null;
  truncationSide?: 'none' | 'upper' | 'lower' | 'both' | null;
}

/** The joints a finding can come from; `elsewhere` is pedestal, foot, frame or another fault. */
export type Joint = SeatName | 'elsewhere';

/** Chance of a sign given the loose joint, with how the reason names the sign. */
interface SignChances {
  chances: Readonly<Record<Joint, number>>;
  name: string;
}

/**
 * How often a sign is seen with each loose joint. Project's assumption from the mechanics, no
 * published figures: a ring loose on the shaft turns with its contact point and creeps, so it
 * modulates slowly and meets both sides; a ring loose in its housing lies on the load side and lifts
 * off it, so it is truncated on one side and strongest across the load, mostly vertical.
 */
const kinds: Readonly<Record<'seat' | 'pedestal' | 'undetermined', SignChances>> = {
  seat: {
    chances: { shaft: 0.7, housing: 0.7, elsewhere: 0.2 },
    name: 'the screening favours a seat',
  },
  pedestal: {
    chances: { shaft: 0.1, housing: 0.1, elsewhere: 0.55 },
    name: 'the screening favours pedestal or foot',
  },
  undetermined: {
    chances: { shaft: 0.2, housing: 0.2, elsewhere: 0.25 },
    name: 'the screening cannot tell the joint',
  },
};

const directions: Readonly<Record<'horizontal' | 'vertical' | 'axial', SignChances>> = {
  horizontal: {
    chances: { shaft: 0.45, housing: 0.3, elsewhere: 0.35 },
    name: 'strongest horizontally',
  },
  vertical: { chances: { shaft: 0.4, housing: 0.6, elsewhere: 0.5 }, name: 'strongest vertically' },
  axial: { chances: { shaft: 0.15, housing: 0.1, elsewhere: 0.15 }, name: 'strongest axially' },
};

const creep: SignChances = {
  chances: { shaft: 0.45, housing: 0.2, elsewhere: 0.03 },
  name: 'the run is modulated by a slow creep',
};
const noCreep: SignChances = {
  chances: { shaft: 0.55, housing: 0.8, elsewhere: 0.97 },
  name: 'no slow creep was seen',
};

const oneSided: SignChances = {
  chances: { shaft: 0.2, housing: 0.45, elsewhere: 0.35 },
  name: 'the waveform is truncated on one side',
};
const truncations: Readonly<Record<'none' | 'upper' | 'lower' | 'both', SignChances>> = {
  none: { chances: { shaft: 0.45, housing: 0.35, elsewhere: 0.5 }, name: 'no truncation was seen' },
  upper: oneSided,
  lower: oneSided,
  both: {
    chances: { shaft: 0.35, housing: 0.2, elsewhere: 0.15 },
    name: 'the waveform is truncated on both sides',
  },
};

function present(signs: FindingSigns): SignChances[] {
  const list: SignChances[] = [];
  if (signs.kind) list.push(kinds[signs.kind]);
  if (signs.strongestDirection) list.push(directions[signs.strongestDirection]);
  if (signs.creepModulation != null) list.push(signs.creepModulation ? creep : noCreep);
  if (signs.truncationSide) list.push(truncations[signs.truncationSide]);
  return list;
}

/** Likelihood of all signs given each joint; the signs are taken as independent given the joint. */
export function signLikelihoods(signs: FindingSigns): Readonly<Record<Joint, number>> {
  const result = { shaft: 1, housing: 1, elsewhere: 1 };
  for (const { chances } of present(signs)) {
    result.shaft *= chances.shaft;
    result.housing *= chances.housing;
    result.elsewhere *= chances.elsewhere;
  }
  return result;
}

/** How much a sign must tell one joint from the other seat to be named in a reason. */
const tellingRatio = 1.3;

/**
 * The signs that speak for or against a seat, compared with the other joints, in words.
 *
 * @returns names of the signs; both lists may be empty
 */
export function tellingSigns(
  seat: SeatName,
  signs: FindingSigns,
): { for: string[]; against: string[] } {
  const found = { for: [] as string[], against: [] as string[] };
  for (const { chances, name } of present(signs)) {
    const others = seat === 'shaft' ? chances.housing : chances.shaft;
    const ratio = chances[seat] / Math.sqrt(others * chances.elsewhere);
    if (ratio > tellingRatio) found.for.push(name);
    else if (ratio < 1 / tellingRatio) found.against.push(name);
  }
  return found;
}
