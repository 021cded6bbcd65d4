import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { certifiedRoots, R, Rational } from '../../src/numerics/index.js';

interface Reference {
  readonly source: string;
  readonly polynomials: readonly {
    readonly name: string;
    readonly coefficients: readonly string[];
    readonly roots: readonly (readonly [string, string])[];
  }[];
}

const reference = JSON.parse(
  readFileSync(new URL('../data/numerics/polynomial-roots.json', import.meta.url), 'utf8'),
) as Reference;

const parse = (text: string): Rational => {
  const value = Rational.parse(text);
  if (value === undefined) throw new Error(`unreadable number ${text}`);
  return value;
};

/** |x − ball| <= 1e-58·scale, for a reference rounded to 60 digits. */
function near(ball: R.Ball, x: Rational, scale: Rational): boolean {
  const slack = scale.abs().mul(parse('1e-58'));
  return R.containsRational(R.widen(ball, R.fromRational(slack, 64)), x);
}

describe(`roots from ${reference.source}`, () => {
  test.each(reference.polynomials)('$name', ({ coefficients, roots }) => {
    const found = certifiedRoots(coefficients.map(parse), 200);
    if ('failed' in found) throw new Error(found.failed);
    expect(found.roots.length).toBe(roots.length);
    for (const [re, im] of roots) {
      const scale = parse(re).abs().add(parse(im).abs());
      const homes = found.roots.filter((r) => near(r.value.re, parse(re), scale) && near(r.value.im, parse(im), scale));
      expect(homes.length).toBe(1);
      expect(homes[0]!.real).toBe(im === '0');
    }
  });
});

test("Wilkinson's perturbed roots as he published them", () => {
  // J. H. Wilkinson, Numer. Math. 1 (1959) 150, nine decimals (quoted from memory).
  const published = [
    [1, 0],
    [2, 0],
    [3, 0],
    [4, 0],
    [4.999999928, 0],
    [6.000006944, 0],
    [6.999697234, 0],
    [8.007267603, 0],
    [8.917250249, 0],
    [10.095266145, 0.643500904],
    [11.793633881, 1.652329728],
    [13.992358137, 2.51883007],
    [16.730737466, 2.812624894],
    [19.5024394, 1.940330347],
    [20.846908101, 0],
  ] as const;
  const found = certifiedRoots(reference.polynomials[0]!.coefficients.map(parse), 60);
  if ('failed' in found) throw new Error(found.failed);
  for (const [re, im] of published) {
    const homes = found.roots.filter(
      (r) => Math.abs(R.toNumber(r.value.re) - re) < 1.01e-9 && Math.abs(R.toNumber(r.value.im) - im) < 1.01e-9,
    );
    expect(homes.length).toBe(1);
  }
});
