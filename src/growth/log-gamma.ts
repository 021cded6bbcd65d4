/** ln Γ(x), x > 0 (temporary). */
export function logGamma(x: number): number {
  let shift = 0;
  let product = 1;
  while (x < 12) {
    product *= x;
    if (product > 1e250) {
      shift += Math.log(product);
      product = 1;
    }
    x += 1;
  }
  shift += Math.log(product);
  const z = 1 / (x * x);
  const s =
    (1 / x) *
    (1 / 12 - z * (1 / 360 - z * (1 / 1260 - z * (1 / 1680 - z * (1 / 1188 - z * (691 / 360360 - z * (1 / 156)))))));
  return (x - 0.5) * Math.log(x) - x + 0.9189385332046727 + s - shift;
}
