import type { HousingMaterial, ShaftMaterial } from '../fit-types.ts';

/** Elastic modulus GPa, Poisson's ratio, coefficient of expansion 1/K. */
export interface Material {
  modulusGpa: number;
  poisson: number;
  alphaPerK: number;
}

/** Through-hardened bearing steel; modulus and α equal in two published tables, ν from memory. */
export const ringSteel: Material = { modulusGpa: 208, poisson: 0.3, alphaPerK: 12.5e-6 };

/**
 * Shafts. α of shaft steel: one source, 11.0–12.8 with 11.5 as typical; austenitic stainless: one
 * source. The modulus of plain steel is set to the rings': the published formulas for the loss of
 * internal clearance take shaft, housing and ring as one steel.
 */
export const shaftMaterial: Readonly<Record<ShaftMaterial, Material>> = {
  steel: { ...ringSteel, alphaPerK: 11.5e-6 },
  stainless: { modulusGpa: 197, poisson: 0.3, alphaPerK: 17.3e-6 },
};

/** Housings; iron (10–11) and die-cast aluminium from one source, ν of both from memory. */
export const housingMaterial: Readonly<Record<HousingMaterial, Material>> = {
  steel: { ...ringSteel, alphaPerK: 11.5e-6 },
  'cast iron': { modulusGpa: 100, poisson: 0.26, alphaPerK: 10.5e-6 },
  aluminium: { modulusGpa: 71, poisson: 0.33, alphaPerK: 21e-6 },
};
