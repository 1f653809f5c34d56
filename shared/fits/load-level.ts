import type { LoadLevel } from './fit-types.ts';

/**
 * Load level from equivalent load over dynamic rating: up to 0.06 light, up to 0.12 normal, above
 * heavy (common practice, makers differ by a little).
 *
 * @param pOverC - ≥ 0
 *
 * @example
 * loadLevelOf(0.1) // => 'normal'
 */
export function loadLevelOf(pOverC: number): LoadLevel {
  if (pOverC <= 0.06) return 'light';
  return pOverC <= 0.12 ? 'normal' : 'heavy';
}
