type Coefficients = readonly [number, number, number, number, number, number, number, number];

// Lowest power first. In the middle of r = 0.425² − (p − ½)², in the tails of r = √(−ln p) less 1.6 or 5.
const MIDDLE: readonly [Coefficients, Coefficients] = [
  [
    3.387132872796366608, 133.14166789178437745, 1971.5909503065514427, 13731.693765509461125, 45921.953931549871457,
    67265.770927008700853, 33430.575583588128105, 2509.0809287301226727,
  ],
  [
    1, 42.313330701600911252, 687.1870074920579083, 5394.1960214247511077, 21213.794301586595867, 39307.89580009271061,
    28729.085735721942674, 5226.495278852854561,
  ],
];
const TAIL: readonly [Coefficients, Coefficients] = [
  [
    1.42343711074968357734, 4.6303378461565452959, 5.7694972214606914055, 3.64784832476320460504,
    1.27045825245236838258, 0.24178072517745061177, 0.0227238449892691845833, 7.7454501427834140764e-4,
  ],
  [
    1, 2.05319162663775882187, 1.6763848301838038494, 0.68976733498510000455, 0.14810397642748007459,
    0.0151986665636164571966, 5.475938084995344946e-4, 1.05075007164441684324e-9,
  ],
];
const FAR_TAIL: readonly [Coefficients, Coefficients] = [
  [
    6.6579046435011037772, 5.4637849111641143699, 1.7848265399172913358, 0.29656057182850489123,
    0.026532189526576123093, 0.0012426609473880784386, 2.71155556874348757815e-5, 2.01033439929228813265e-7,
  ],
  [
    1, 0.59983220655588793769, 0.13692988092273580531, 0.0148753612908506148525, 7.868691311456132591e-4,
    1.8463183175100546818e-5, 1.4215117583164458887e-7, 2.04426310338993978564e-15,
  ],
];

/**
 * The x below which a part p of a standard normal distribution lies, to about 16 digits. One uniform number gives one
 * deviate, so that every cause keeps its place in the stream.
 *
 * Source: M. J. Wichura, Algorithm AS 241, Appl. Statist. 37 (1988), PPND16.
 * Worked: p = 0.25 gives −0.67448 97501 96081 7.
 *
 * @param p between 0 and 1, both excluded
 */
export function normalQuantile(p: number): number {
  const q = p - 0.5;
  if (Math.abs(q) <= 0.425) return q * ratio(MIDDLE, 0.180625 - q * q);
  const r = Math.sqrt(-Math.log(q < 0 ? p : 1 - p));
  const distance = r <= 5 ? ratio(TAIL, r - 1.6) : ratio(FAR_TAIL, r - 5);
  return q < 0 ? -distance : distance;
}

function ratio(fraction: readonly [Coefficients, Coefficients], r: number): number {
  return polynomial(fraction[0], r) / polynomial(fraction[1], r);
}

function polynomial(c: Coefficients, r: number): number {
  return ((((((c[7] * r + c[6]) * r + c[5]) * r + c[4]) * r + c[3]) * r + c[2]) * r + c[1]) * r + c[0];
}
