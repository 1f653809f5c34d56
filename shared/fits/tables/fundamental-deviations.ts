/**
 * Fundamental deviations of ISO 286-1:2010 Tables 2–5 for the classes bearing seats use, in µm, in
 * the columns of `gradeUpToMm` (r and s in the finer steps of `fineUpToMm`). Sizes to 3 mm are from
 * memory, all others equal in two published tables.
 */
export const fineUpToMm = [
  3, 6, 10, 18, 30, 50, 65, 80, 100, 120, 140, 160, 180, 200, 225, 250, 280, 315, 355, 400, 450,
  500,
] as const;

/** Upper deviation es of shafts d … h; the hole's lower deviation EI is its negative. */
export const upperDeviationUm = {
  d: [-20, -30, -40, -50, -65, -80, -100, -120, -145, -170, -190, -210, -230],
  e: [-14, -20, -25, -32, -40, -50, -60, -72, -85, -100, -110, -125, -135],
  f: [-6, -10, -13, -16, -20, -25, -30, -36, -43, -50, -56, -62, -68],
  g: [-2, -4, -5, -6, -7, -9, -10, -12, -14, -15, -17, -18, -20],
  h: [0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0],
} as const satisfies Record<string, readonly number[]>;

/** Lower deviation ei of shafts j; j exists for the grades 5, 6 and 7 alone. */
export const jShaftLowerUm: Readonly<Record<number, readonly number[]>> = {
  5: [-2, -2, -2, -3, -4, -5, -7, -9, -11, -13, -16, -18, -20],
  6: [-2, -2, -2, -3, -4, -5, -7, -9, -11, -13, -16, -18, -20],
  7: [-4, -4, -5, -6, -8, -10, -12, -15, -18, -21, -26, -28, -32],
};

/** Lower deviation ei of shafts k to p; that of k holds for the grades 4–7, otherwise it is 0. */
export const lowerDeviationUm = {
  k: [0, 1, 1, 1, 2, 2, 2, 3, 3, 4, 4, 4, 5],
  m: [2, 4, 6, 7, 8, 9, 11, 13, 15, 17, 20, 21, 23],
  n: [4, 8, 10, 12, 15, 17, 20, 23, 27, 31, 34, 37, 40],
  p: [6, 12, 15, 18, 22, 26, 32, 37, 43, 50, 56, 62, 68],
} as const satisfies Record<string, readonly number[]>;

/** Lower deviation ei of shafts r and s, in the columns of `fineUpToMm`. */
export const fineLowerDeviationUm = {
  r: [10, 15, 19, 23, 28, 34, 41, 43, 51, 54, 63, 65, 68, 77, 80, 84, 94, 98, 108, 114, 126, 132],
  s: [
    14, 19, 23, 28, 35, 43, 53, 59, 71, 79, 92, 100, 108, 122, 130, 140, 158, 170, 190, 208, 232,
    252,
  ],
} as const satisfies Record<string, readonly number[]>;

/** Upper deviation ES of holes J; J exists for the grades 6, 7 and 8 alone. */
export const jHoleUpperUm: Readonly<Record<number, readonly number[]>> = {
  6: [2, 5, 5, 6, 8, 10, 13, 16, 18, 22, 25, 29, 33],
  7: [4, 6, 8, 10, 12, 14, 18, 22, 26, 30, 36, 39, 43],
  8: [6, 10, 12, 15, 20, 24, 28, 34, 41, 47, 55, 60, 66],
};

/** Δ of the holes K … R by grade: IT(n) − IT(n−1) with the standard's own rounding; 0 to 3 mm. */
export const deltaUm: Readonly<Record<number, readonly number[]>> = {
  3: [0, 1, 1, 1, 1.5, 1.5, 2, 2, 3, 3, 4, 4, 5],
  4: [0, 1.5, 1.5, 2, 2, 3, 3, 4, 4, 4, 4, 5, 5],
  5: [0, 1, 2, 3, 3, 4, 5, 5, 6, 6, 7, 7, 7],
  6: [0, 3, 3, 3, 4, 5, 6, 7, 7, 9, 9, 11, 13],
  7: [0, 4, 6, 7, 8, 9, 11, 13, 15, 17, 20, 21, 23],
  8: [0, 6, 7, 9, 12, 14, 16, 19, 23, 26, 29, 32, 34],
};
