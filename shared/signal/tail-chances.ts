/** Upper tail of the gamma distribution of shape a and scale 1 at x (series, or Lentz's fraction). */
export function gammaTail(a: number, x: number): number {
  if (x <= 0) return 1;
  const front = Math.exp(-x + a * Math.log(x) - logGamma(a));
  if (x < a + 1) {
    let [term, sum] = [1 / a, 1 / a];
    for (let n = 1; n < 500 && term > sum * 1e-14; n += 1) {
      term *= x / (a + n);
      sum += term;
    }
    return Math.max(0, 1 - front * sum);
  }
  let b = x + 1 - a;
  let c = 1e300;
  let d = 1 / b;
  let h = d;
  for (let n = 1; n < 500; n += 1) {
    const an = -n * (n - a);
    b += 2;
    d = 1 / (an * d + b || 1e-300);
    c = b + an / c || 1e-300;
    h *= d * c;
    if (Math.abs(d * c - 1) < 1e-14) break;
  }
  return front * h;
}

/** Upper tail of the ratio of two averages of exponential variables, by the incomplete beta function. */
export function fisherTail(ratio: number, averages: number, floorAverages: number): number {
  if (ratio <= 0) return 1;
  return betaShare(floorAverages, averages, floorAverages / (floorAverages + averages * ratio));
}

/** Regularised incomplete beta function I_x(a, b) by its continued fraction (DLMF 8.17.22). */
function betaShare(a: number, b: number, x: number): number {
  if (x <= 0) return 0;
  if (x >= 1) return 1;
  if (x > (a + 1) / (a + b + 2)) return 1 - betaShare(b, a, 1 - x);
  const front =
    Math.exp(logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log1p(-x)) /
    a;
  let [c, d] = [1, 1 / (1 - ((a + b) * x) / (a + 1) || 1e-300)];
  let h = d;
  for (let m = 1; m < 500; m += 1) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / (1 + even * d || 1e-300);
    c = 1 + even / c || 1e-300;
    h *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / (1 + odd * d || 1e-300);
    c = 1 + odd / c || 1e-300;
    h *= d * c;
    if (Math.abs(d * c - 1) < 1e-14) break;
  }
  return front * h;
}

/** ln Γ(x) for x > 0 (Lanczos 1964, g = 7, nine terms). */
export function logGamma(x: number): number {
  const terms = [
    676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059,
    12.507343278686905, -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7,
  ];
  if (x < 0.5) return Math.log(Math.PI / Math.sin(Math.PI * x)) - logGamma(1 - x);
  const z = x - 1;
  let sum = 0.99999999999980993;
  terms.forEach((term, index) => (sum += term / (z + index + 1)));
  const t = z + 7.5;
  return 0.5 * Math.log(2 * Math.PI) + (z + 0.5) * Math.log(t) - t + Math.log(sum);
}
