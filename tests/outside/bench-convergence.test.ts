/**
 * Which methods must converge on which kind of series, and how fast: correct digits with 8 and with 14 coefficients, at a
 * coupling where plain summation is lost. The pins stand 0.3 digits below what the methods reach; 11.5 where a series is of the
 * method's own class (12 digits are asked for).
 * Source of the exact sums: the bench of series with exact answers, computed twice each with mpmath 1.2.1 and PARI/GP 2.15.2.
 */
import { describe, expect, it } from 'vitest';
import { PRESCRIPTIONS } from '../../src/prescriptions/index.js';
import { benchExpansion, digitsReached, growthOf, readBench } from '../support/expansions.js';

type Pin = readonly [method: string, with8: number, with14: number];

const FAMILIES: readonly (readonly [string, readonly (readonly [id: string, x: string, pins: readonly Pin[]])[]])[] = [
  [
    'n! alternating, one branch point',
    [
      [
        's01_euler_alternating',
        '1/5',
        [
          ['pade', 4.6, 6.9],
          ['wynn-epsilon', 4.4, 6.7],
          ['levin', 6.8, 11.5],
          ['weniger-delta', 8.0, 11.5],
          ['borel-pade', 11.5, 11.5],
          ['borel-hypergeometric', 11.5, 11.5],
          ['hyperasymptotic', 11.5, 11.5],
        ],
      ],
      [
        's03_shift_alt_b1_2',
        '1/2',
        [
          ['pade', 2.8, 4.2],
          ['wynn-epsilon', 2.3, 3.9],
          ['levin', 5.1, 9.0],
          ['weniger-delta', 5.8, 10.3],
          ['borel-pade', 5.5, 8.6],
          ['borel-hypergeometric', 11.5, 11.5],
          ['hyperasymptotic', 11.5, 11.5],
        ],
      ],
      [
        's26_bessel_k0',
        '1/2',
        [
          ['pade', 5.0, 7.1],
          ['wynn-epsilon', 4.9, 7.1],
          ['levin', 7.2, 11.5],
          ['weniger-delta', 7.9, 11.5],
          ['borel-pade', 6.7, 10.3],
          ['borel-hypergeometric', 11.5, 11.5],
        ],
      ],
      [
        's24_airy_ai',
        '1/2',
        [
          ['pade', 5.2, 7.4],
          ['wynn-epsilon', 5.2, 7.4],
          ['levin', 7.5, 11.5],
          ['weniger-delta', 8.2, 11.5],
          ['borel-pade', 6.8, 10.5],
          ['borel-hypergeometric', 11.5, 11.5],
        ],
      ],
    ],
  ],
  [
    'n! of one sign, principal value',
    [
      [
        's04_shift_nonalt_b1_2',
        '1/2',
        [
          ['borel-pade', 2.9, 4.5],
          ['borel-leroy-pade', 11.5, 11.5],
          ['borel-dlog', 11.5, 11.5],
          ['borel-conformal', 11.5, 11.5],
          ['borel-partial-pade', 11.5, 11.5],
          ['hyperasymptotic', 11.5, 11.5],
          ['singularity-model', 11.5, 11.5],
          ['borel-hypergeometric', 11.5, 11.5],
        ],
      ],
      [
        's25_airy_bi',
        '1/2',
        [
          ['borel-pade', 3.8, 6.1],
          ['borel-dlog', 5.4, 7.7],
          ['borel-conformal', 5.4, 7.5],
          ['borel-quadratic', 5.8, 8.5],
          ['borel-hypergeometric', 11.5, 11.5],
        ],
      ],
      [
        's13_mass_like',
        '1/5',
        [
          ['borel-pade', 2.7, 4.8],
          ['borel-leroy-pade', 3.1, 4.6],
          ['borel-conformal', 3.0, 4.0],
          ['borel-partial-pade', 2.4, 4.2],
          ['singularity-model', 11.5, 11.5],
        ],
      ],
    ],
  ],
  [
    'ultraviolet and infrared singularities',
    [
      [
        's10_uv1_ir2_branch',
        '1/2',
        [
          ['borel-pade', 2.3, 3.4],
          ['borel-leroy-pade', 3.3, 6.7],
          ['borel-dlog', 2.5, 5.4],
          ['borel-partial-pade', 3.9, 6.3],
          ['borel-conformal', 3.9, 5.6],
          ['singularity-model', 11.5, 11.5],
        ],
      ],
    ],
  ],
  [
    'quantum mechanics and zero dimensions',
    [
      [
        's40_aho_quartic',
        '1/10',
        [
          ['levin', 6.7, 7.6],
          ['weniger-delta', 5.4, 9.2],
          ['borel-pade', 5.3, 9.2],
          ['borel-conformal', 6.8, 9.7],
          ['borel-quadratic', 5.4, 8.7],
          ['borel-hypergeometric', 6.7, 8.9],
        ],
      ],
      [
        's43_cubic_imaginary',
        '1/20',
        [
          ['levin', 5.5, 6.7],
          ['weniger-delta', 4.9, 8.0],
          ['borel-pade', 4.9, 7.6],
          ['borel-conformal', 6.5, 8.1],
          ['borel-quadratic', 4.8, 8.1],
          ['borel-hypergeometric', 6.5, 8.3],
        ],
      ],
      [
        's46_zerodim_phi4',
        '1/20',
        [
          ['levin', 5.8, 9.5],
          ['weniger-delta', 5.9, 11.5],
          ['borel-pade', 4.5, 7.0],
          ['borel-conformal', 6.0, 8.7],
          ['borel-quadratic', 5.6, 8.4],
          ['borel-hypergeometric', 11.5, 11.5],
        ],
      ],
      [
        's41_aho_quartic_negative',
        '1/20',
        [
          ['borel-pade', 4.1, 6.2],
          ['borel-conformal', 5.1, 5.8],
          ['borel-hypergeometric', 5.0, 5.6],
          ['hyperasymptotic', 3.8, 5.3],
        ],
      ],
    ],
  ],
  [
    '(2n)!',
    [
      [
        's113_2nfact_alt',
        '1',
        [
          ['weniger-delta', 2.3, 3.2],
          ['borel-pade-2', 11.5, 11.5],
        ],
      ],
      [
        's36_struve_h0_y0',
        '1',
        [
          ['weniger-delta', 2.5, 3.5],
          ['borel-pade-2', 2.8, 4.0],
        ],
      ],
      [
        's42_aho_sextic',
        '1/20',
        [
          ['weniger-delta', 3.8, 4.3],
          ['borel-pade-2', 3.0, 5.1],
        ],
      ],
      [
        's60_eh_spinor_magnetic',
        '1/4',
        [
          ['weniger-delta', 5.1, 9.2],
          ['borel-pade-2', 7.7, 11.5],
        ],
      ],
      ['s61_eh_spinor_electric', '1/4', [['borel-pade-2', 5.7, 10.5]]],
    ],
  ],
  [
    'large β₀, exact transforms',
    [
      [
        's87_large_b0_adler',
        '1/4',
        [
          ['borel-pade', 1.4, 3.5],
          ['borel-dlog', 2.4, 4.1],
        ],
      ],
      [
        's88_large_b0_potential',
        '1/5',
        [
          ['borel-pade', 3.4, 5.8],
          ['borel-dlog', 2.4, 5.5],
          ['borel-quadratic', 1.7, 4.8],
        ],
      ],
    ],
  ],
  [
    'convergent',
    [
      ['s100_geometric', '9/10', [['pade', 11.5, 11.5]]],
      ['s101_exponential', '5', []],
      [
        's85_massgap_on_sigma',
        '1/14',
        [
          ['fixed-order', 11.5, 11.5],
          ['pade', 11.5, 11.5],
        ],
      ],
    ],
  ],
];

function reached(id: string, x: string, method: string, count: number): number {
  const b = readBench(id);
  const reference = b.references.find((r) => r.x === x);
  const prescription = PRESCRIPTIONS.find((p) => p.name === method);
  if (reference === undefined || prescription === undefined) return expect.fail(`${id}, ${method}`);
  const e = benchExpansion(b, x, count);
  const all = prescription.apply(e, growthOf(e), { digits: 12, central: true });
  const sum = all.find((o) => o.kind === 'sum' && o.central === true) ?? all.find((o) => o.kind === 'sum');
  return sum?.kind === 'sum' ? digitsReached(sum, reference) : expect.fail(`${method} refuses ${id}`);
}

for (const [family, list] of FAMILIES) {
  describe(family, () => {
    for (const [id, x, pins] of list) {
      it(`${id} at ${x}`, () => {
        for (const [method, with8, with14] of pins) {
          expect(reached(id, x, method, 8), `${method}, 8 coefficients`).toBeGreaterThan(with8);
          expect(reached(id, x, method, 14), `${method}, 14 coefficients`).toBeGreaterThan(with14);
        }
      });
    }
  });
}

it('fixed order is lost there, and more so with more terms', () => {
  for (const [id, x] of [
    ['s03_shift_alt_b1_2', '1/2'],
    ['s10_uv1_ir2_branch', '1/2'],
    ['s40_aho_quartic', '1/10'],
    ['s87_large_b0_adler', '1/4'],
  ] as const)
    expect(reached(id, x, 'fixed-order', 14)).toBeLessThan(reached(id, x, 'fixed-order', 8));
});
