import { FitInputError } from './fit-input-error.ts';
import type { BearingType, ClearanceGroup } from './fit-types.ts';
import { dimensionSeries } from './tables/dimension-series.ts';

/** What a basic designation and the common supplements after it tell. */
export interface BearingDesignation {
  /** Type and bore code without supplements, e.g. NU312. */
  basic: string;
  type: BearingType;
  d: number;
  D: number;
  B: number;
  /** From a supplement C2 … C5. */
  clearanceGroup?: ClearanceGroup;
  /** From a supplement for shields or seals on both sides. */
  capped: boolean;
  /** From the supplement K: tapered bore. */
  taperedBore: boolean;
  /** Rings that come apart: cylindrical roller bearings with one ring without flanges. */
  separable: boolean;
}

/** Leading part of the designation → bearing type and ISO 15 dimension series. */
const families: Readonly<Record<string, readonly [BearingType, string]>> = {
  '60': ['ball', '10'],
  '62': ['ball', '02'],
  '63': ['ball', '03'],
  '72': ['ball', '02'],
  '73': ['ball', '03'],
  '12': ['ball', '02'],
  '13': ['ball', '03'],
  '22': ['ball', '22'],
  '23': ['ball', '23'],
  '222': ['spherical roller', '22'],
  '223': ['spherical roller', '23'],
  N2: ['roller', '02'],
  N3: ['roller', '03'],
  N10: ['roller', '10'],
  N22: ['roller', '22'],
  N23: ['roller', '23'],
};

const cylindrical = /^(NU|NJ|NUP|N)(10|22|23|2|3)(\d\d)$/;
const numbered = /^(222|223|60|62|63|72|73|12|13|22|23)(\d\d)$/;
const supplement = /^(C2|CN|C3|C4|C5|2RS|RS|2Z|ZZ|Z|K|N|NR|E)$/;

function unknown(text: string, field: string, why: string): FitInputError {
  return new FitInputError('unknown_designation', field, `"${text}" ${why}`);
}

function boreMm(code: string): number {
  const small: Readonly<Record<string, number>> = { '00': 10, '01': 12, '02': 15, '03': 17 };
  return small[code] ?? Number(code) * 5;
}

/**
 * Boundary dimensions of a rolling bearing from its basic designation, ISO 15 (sizes as in the
 * checked-in dimension series 10, 02, 03, 22, 23). Supplements after the basic designation are read
 * where the trade agrees on them (C2 … C5, 2Z, 2RS, K); others are refused, since guessing at a
 * maker's own supplements could hide a different bearing.
 *
 * @param text - e.g. `6312`, `NU 312`, `6312-2Z/C3`
 * @returns type, bore, outside diameter and width, mm
 * @throws {FitInputError} `unknown_designation`
 *
 * @example
 * bearingByDesignation('6312').D // => 130
 */
export function bearingByDesignation(text: string, field = 'designation'): BearingDesignation {
  const tidy = text
    .trim()
    .toUpperCase()
    .replace(/^(NUP|NU|NJ|N)\s+/, '$1');
  const [head = '', ...rest] = tidy.split(/[\s\-/]+/).filter((part) => part !== '');
  // A single K or Z may follow the number without a separator.
  const glued = /^((?:NUP|NU|NJ|N)?\d+)(K|E|Z|ZZ|2Z|2RS)?$/.exec(head);
  const basic = glued?.[1] ?? head;
  const supplements = [...(glued?.[2] ? [glued[2]] : []), ...rest];
  const roller = cylindrical.exec(basic);
  const match = roller ?? numbered.exec(basic);
  const family = families[roller ? `N${roller[2] ?? ''}` : (match?.[1] ?? '')];
  const code = (roller ? roller[3] : match?.[2]) ?? '';
  const size = family && dimensionSeries[family[1]]?.[code];
  if (!family || !size) {
    throw unknown(text, field, 'is not in the table; give the basic designation or d, D and B.');
  }
  const odd = supplements.find((part) => !supplement.test(part));
  if (odd !== undefined) {
    throw unknown(text, field, `has the supplement "${odd}", which is not known; leave it out.`);
  }
  const group = supplements.find((part): part is ClearanceGroup => /^C[2N345]$/.test(part));
  return {
    basic,
    type: family[0],
    d: boreMm(code),
    D: size[0],
    B: size[1],
    ...(group ? { clearanceGroup: group } : {}),
    capped: supplements.some((part) => /^(2RS|2Z|ZZ)$/.test(part)),
    taperedBore: supplements.includes('K'),
    separable: roller !== null && roller[1] !== 'NUP',
  };
}
