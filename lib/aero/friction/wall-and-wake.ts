import { exponentialIntegral } from "../numerics/exponential-integral";

const KAPPA = 0.41;
const WALL_CONSTANT = 5.0;
const WAKE = 0.55;
/** Si(π)/π. */
const SINE_INTEGRAL_RATIO = 0.5894898722360836;
/** c = e^(−κ(8.5−B)): makes the fully rough limit Nikuradse's 8.5. */
export const ROUGHNESS_COEFFICIENT = Math.exp(-KAPPA * (8.5 - WALL_CONSTANT));

const A = (1 + WAKE) / KAPPA;
const C = (2 + 2 * WAKE * (1 + SINE_INTEGRAL_RATIO) + 1.5 * WAKE ** 2) / KAPPA ** 2;
const K = Math.exp(-KAPPA * WALL_CONSTANT - 2 * WAKE);
/** λ = C/A at which θ = 0. */
export const START_OF_WALL_AND_WAKE = C / A;
const START = START_OF_WALL_AND_WAKE;
const EI_AT_START = exponentialIntegral(KAPPA * START);
/** The fits that start the search are good to 0.14 and about 1 in λ; the margins put the start above the root. */
const SMOOTH_GUESS_MARGIN = 0.15;
const ROUGH_GUESS_MARGIN = 1;
const SMALLEST_GUESS = 1;
/** Below this u the closed form loses digits to a difference, and a quadrature of the positive integrand keeps them. */
const QUADRATURE_LIMIT = 2;

/**
 * Turbulent layer by the law of the wall and wake (Coles), zero pressure gradient, turbulent from x = 0.
 *
 * The state is u = λ − C/A with λ = √(2/C_f) = U/u_τ; θ = 0 at u = 0. With r = c Re_k, g = 1 + r/λ:
 *
 *   Re_θ = K e^(κλ) g (A − C/λ) = K e^(κλ) g A u/λ
 *   Re_x = ∫ λ² dRe_θ (closed form with Ei, or quadrature for small u)
 *   δ/θ = λ²/(A u),  H = δ* /θ = λ/u,  local C_f = 2/λ²
 *
 * κ = 0.41, B = 5.0, Π = 0.55. Range: Re 1e6 to 1e9, ±4 % from 1e7 up, low by up to 8 % at 1e6.
 *
 * Source: D. Coles, J. Fluid Mech. 1 (1956) 191–226; momentum integral: von Kármán 1921; roughness shift
 * (1/κ) ln(1 + c k⁺): White, Viscous Fluid Flow. Worked: smooth, λ = 10 gives Re_θ = 3.31145, Re_x = 256.914.
 */
export function reynoldsThetaAt(u: number, r: number): number {
  const lambda = START + u;
  return ((K * Math.exp(KAPPA * lambda) * (1 + r / lambda) * A) / lambda) * u;
}

/** dRe_θ/dλ at u; greater than 0. */
function thetaSlope(u: number, r: number): number {
  const lambda = START + u;
  const h = (A * u) / lambda;
  const g = 1 + r / lambda;
  return K * Math.exp(KAPPA * lambda) * (h * (KAPPA + (r / lambda) * (KAPPA - 1 / lambda)) + (g * C) / lambda ** 2);
}

/** Re_x at u > 0. */
export function reynoldsAt(u: number, r: number): number {
  if (u < QUADRATURE_LIMIT) return reynoldsByQuadrature(u, r);
  const lambda = START + u;
  const fromStart = growth(lambda, r, exponentialAt(lambda, r)) - growth(START, r, r === 0 ? 0 : EI_AT_START);
  return lambda ** 2 * reynoldsThetaAt(u, r) - 2 * K * fromStart;
}

/** ∫ λ Re_θ dλ over K, up to a constant. */
function growth(lambda: number, r: number, ei: number): number {
  return Math.exp(KAPPA * lambda) * (A * (lambda / KAPPA - 1 / KAPPA ** 2) + (r * A - C) / KAPPA) - r * C * ei;
}

/** Ei(κλ); a smooth layer does without. */
function exponentialAt(lambda: number, r: number): number {
  return r === 0 ? 0 : exponentialIntegral(KAPPA * lambda);
}

/** Nodes (on 0 to 1, the left half) and weights of the ten-point Gauss–Legendre rule; A&S table 25.4. */
const GAUSS = [
  [0.013046735741414128, 0.06667134430868814],
  [0.06746831665550773, 0.1494513491505806],
  [0.16029521585048778, 0.21908636251598204],
  [0.2833023029353764, 0.26926671930999635],
  [0.4255628305091844, 0.29552422471475287],
] as const;

function reynoldsByQuadrature(u: number, r: number): number {
  const integrand = (t: number): number => (START + t) ** 2 * thetaSlope(t, r);
  let sum = 0;
  for (const [node, weight] of GAUSS) sum += (weight / 2) * (integrand(node * u) + integrand((1 - node) * u));
  return sum * u;
}

/**
 * State u at which a layer has reached Re_x.
 *
 * @param reynolds Re_x [-], greater than 0
 * @param r c·Re_k [-], 0 or greater
 */
export function stateAtReynolds(reynolds: number, r: number): number {
  const linear = reynolds / (START ** 2 * thetaSlope(0, r));
  const s = Math.max(Math.log10(reynolds), 0);
  const smooth = 0.024 + 3.541 * s + 0.0749 * s ** 2 + SMOOTH_GUESS_MARGIN - START;
  // x/k_s = c Re/r; on a smooth layer this guess is infinite.
  const rough = 4.51 + 4.806 * Math.log10((ROUGHNESS_COEFFICIENT * reynolds) / r) + ROUGH_GUESS_MARGIN - START;
  return newtonFromAbove(Math.min(linear, Math.max(Math.min(smooth, rough), SMALLEST_GUESS)), (u) => {
    const reached = reynoldsAt(u, r);
    return Math.log(reached / reynolds) / ((u * (START + u) ** 2 * thetaSlope(u, r)) / reached);
  });
}

/**
 * State u at which a layer has reached Re_θ: the profile of that momentum thickness.
 *
 * @param reynoldsTheta Re_θ = U θ/ν [-], greater than 0
 * @param r c·Re_k [-], 0 or greater
 */
export function stateAtReynoldsTheta(reynoldsTheta: number, r: number): number {
  const upper = Math.max(START + 1, Math.log(reynoldsTheta / (0.49 * K)) / KAPPA) - START;
  return newtonFromAbove(Math.min(reynoldsTheta / thetaSlope(0, r), upper), (u) => {
    const reached = reynoldsThetaAt(u, r);
    return Math.log(reached / reynoldsTheta) / ((u * thetaSlope(u, r)) / reached);
  });
}

/**
 * Root in ln u, by the Newton step at u. ln Re_x and ln Re_θ are convex and rising in ln u, and the start lies above the
 * root: Newton falls to it without overshooting.
 */
function newtonFromAbove(start: number, stepAt: (u: number) => number): number {
  let u = start;
  for (let iteration = 0; iteration < 100; iteration += 1) {
    const step = stepAt(u);
    u *= Math.exp(-step);
    if (Math.abs(step) < 1e-9) return u;
  }
  throw new RangeError("the wall-and-wake layer did not converge");
}

/** Local C_f = 2/λ² [-]. */
export function localCoefficientAt(u: number): number {
  return 2 / (START + u) ** 2;
}

/** δ/θ [-]. */
export function thicknessRatioAt(u: number): number {
  return (START + u) ** 2 / (A * u);
}

/** H = δ* /θ [-]. */
export function shapeFactorAt(u: number): number {
  return (START + u) / u;
}
