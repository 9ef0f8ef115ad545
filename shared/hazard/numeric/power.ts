/**
 * `base ** exponent` for a positive base. The exponents that limit tables print are taken by square
 * roots, which are exact to a few units in the last place and several times faster.
 */
export function power(base: number, exponent: number): number {
  switch (exponent) {
    case 0:
      return 1;
    case 0.25:
      return Math.sqrt(Math.sqrt(base));
    case 0.5:
      return Math.sqrt(base);
    case 0.75:
      return Math.sqrt(base * Math.sqrt(base));
    case -0.25:
      return 1 / Math.sqrt(Math.sqrt(base));
    default:
      return base ** exponent;
  }
}
