/** Elastic modulus in GPa and Poisson's ratio of a part. */
interface Elastic {
  modulusGpa: number;
  poisson: number;
}

/** (outer² + inner²)/(outer² − inner²), the geometry of Lamé's thick cylinder. */
function thickness(innerMm: number, outerMm: number): number {
  return (outerMm ** 2 + innerMm ** 2) / (outerMm ** 2 - innerMm ** 2);
}

/**
 * Growth of the inner ring's raceway per µm of interference with the shaft, by Lamé's thick
 * cylinders. With one steel it is d/Di on a solid shaft and (d/Di)·(1−(ds/d)²)/(1−(d/Di)²(ds/d)²)
 * on a hollow one.
 *
 * @param d - bore, mm
 * @param racewayMm - raceway diameter Di, mm; > d
 * @param shaftBoreMm - bore of a hollow shaft ds, mm; 0 ≤ ds < d
 * @returns loss of radial internal clearance over effective interference, 0–1
 *
 * @example
 * innerLossFactor(60, 75, 0, steel, steel) // => 0.8
 */
export function innerLossFactor(
  d: number,
  racewayMm: number,
  shaftBoreMm: number,
  shaft: Elastic,
  ring: Elastic,
): number {
  const shaftGive = (thickness(shaftBoreMm, d) - shaft.poisson) / shaft.modulusGpa;
  const ringGive = (thickness(d, racewayMm) + ring.poisson) / ring.modulusGpa;
  // Pressure over interference, then raceway growth over pressure.
  const pressure = 1 / (d * (shaftGive + ringGive));
  return (pressure * 2 * d ** 2 * racewayMm) / (ring.modulusGpa * (racewayMm ** 2 - d ** 2));
}

/**
 * Shrinkage of the outer ring's raceway per µm of interference with the housing, by Lamé. With one
 * steel it is (De/D)·(1−(D/Dh)²)/(1−(De/D)²(D/Dh)²), and De/D in a very thick housing.
 *
 * @param D - outside diameter, mm
 * @param racewayMm - raceway diameter De, mm; < D
 * @param housingOutsideMm - outside diameter Dh of the housing, mm; > D, `Infinity` for very thick
 * @returns loss of radial internal clearance over effective interference, 0–1
 *
 * @example
 * outerLossFactor(100, 80, Infinity, steel, steel) // => 0.8
 */
export function outerLossFactor(
  D: number,
  racewayMm: number,
  housingOutsideMm: number,
  housing: Elastic,
  ring: Elastic,
): number {
  const wall = housingOutsideMm === Infinity ? 1 : thickness(D, housingOutsideMm);
  const housingGive = (wall + housing.poisson) / housing.modulusGpa;
  const ringGive = (thickness(racewayMm, D) - ring.poisson) / ring.modulusGpa;
  const pressure = 1 / (D * (housingGive + ringGive));
  return (pressure * 2 * D ** 2 * racewayMm) / (ring.modulusGpa * (D ** 2 - racewayMm ** 2));
}
