/**
 * Quantile of the standard normal distribution: P. J. Acklam's rational approximation (relative
 * error below 1.15e-9), sharpened by one step of Halley's method on the complementary error function,
 * which leaves about the precision of that function.
 * @param p strictly between 0 and 1; anything else throws a RangeError
 */
export function normalQuantile(p: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError('A probability lies strictly between 0 and 1.');
  if (p > 0.5) return -normalQuantile(1 - p);
  const rough = acklam(p);
  const error = 0.5 * complementaryError(-rough / Math.SQRT2) - p;
  const step = error * Math.sqrt(2 * Math.PI) * Math.exp((rough * rough) / 2);
  return rough - step / (1 + (rough * step) / 2);
}

const A = [
  -3.969683028665376e1, 2.209460984245205e2, -2.759285104469687e2, 1.38357751867269e2,
  -3.066479806614716e1, 2.506628277459239,
] as const;
const B = [
  -5.447609879822406e1, 1.615858368580409e2, -1.556989798598866e2, 6.680131188771972e1,
  -1.328068155288572e1, 1,
] as const;
const C = [
  -7.784894002430293e-3, -3.223964580411365e-1, -2.400758277161838, -2.549732539343734,
  4.374664141464968, 2.938163982698783,
] as const;
const D = [
  7.784695709041462e-3, 3.224671290700398e-1, 2.445134137142996, 3.754408661907416, 1,
] as const;
/** Below this the tail's approximation is used. */
const TAIL = 0.02425;

const polynomial = (coefficients: readonly number[], x: number): number =>
  coefficients.reduce((sum, coefficient) => sum * x + coefficient, 0);

/** For p up to one half. */
function acklam(p: number): number {
  if (p < TAIL) {
    const q = Math.sqrt(-2 * Math.log(p));
    return polynomial(C, q) / polynomial(D, q);
  }
  const q = p - 0.5;
  return (q * polynomial(A, q * q)) / polynomial(B, q * q);
}

/**
 * erfc(x) for x ≥ 0: the power series of erf below 2.5 (Abramowitz and Stegun 7.1.6), the continued
 * fraction of erfc above (7.1.14).
 */
function complementaryError(x: number): number {
  const scale = Math.exp(-x * x) / Math.sqrt(Math.PI);
  if (x < 2.5) {
    let term = x;
    let sum = x;
    for (let n = 1; term > sum * 1e-17 && n < 200; n += 1) {
      term *= (2 * x * x) / (2 * n + 1);
      sum += term;
    }
    return 1 - 2 * scale * sum;
  }
  let fraction = x;
  for (let n = 120; n >= 1; n -= 1) fraction = x + n / 2 / fraction;
  return scale / fraction;
}
