const EULER_GAMMA = 0.5772156649015329;
const SERIES_LIMIT = 40;

/**
 * Exponential integral Ei(z) = −∫_{−z}^{∞} e^{−t}/t dt for z > 0.
 *
 *   z < 40:  γ + ln z + Σ zⁿ/(n·n!)      z ≥ 40:  (e^z/z) Σ n!/zⁿ, cut at its smallest term
 *
 * @param z [-], greater than 0
 * @throws RangeError if z ≤ 0
 *
 * Source: Abramowitz & Stegun, 5.1.10 and 5.1.51. Worked: Ei(1) = 1.895117816355937.
 */
export function exponentialIntegral(z: number): number {
  if (!(z > 0)) throw new RangeError(`z must be > 0, got ${z}`);
  return z < SERIES_LIMIT ? convergentSeries(z) : asymptoticSeries(z);
}

function convergentSeries(z: number): number {
  let power = 1;
  let sum = 0;
  for (let n = 1; ; n += 1) {
    power *= z / n;
    const term = power / n;
    sum += term;
    if (n > z && term < 1e-17 * sum) return EULER_GAMMA + Math.log(z) + sum;
  }
}

function asymptoticSeries(z: number): number {
  let term = 1;
  let sum = 1;
  for (let n = 1; n < z && term > 1e-17 * sum; n += 1) {
    term *= n / z;
    sum += term;
  }
  return (Math.exp(z) / z) * sum;
}
