/**
 * @module Adaptive quadrature of piecewise smooth functions in doubles.
 *
 * Purpose    posterior integrals of one variable; their kinks are known and given as edges.
 * Method     15-point Kronrod rule with its embedded 7-point Gauss rule on every panel; the panel with the largest
 *            difference of the two is halved until the differences sum to less than the tolerance.
 * Bound      none proved: the difference of the rules overestimates the error of the Kronrod sum by far when the
 *            function is smooth on the panel. The result counts as converged.
 * Reference  A. S. Kronrod 1965; R. Piessens et al., QUADPACK (1983). Nodes and weights recomputed with mpmath 1.3.0 from the orthogonality of the Stieltjes polynomial.
 */

/** Positive nodes and their weights in both rules. */
const RULE: readonly (readonly [node: number, kronrod: number, gauss: number])[] = [
  [0.9914553711208126, 0.022935322010529224, 0],
  [0.9491079123427585, 0.06309209262997856, 0.1294849661688697],
  [0.8648644233597691, 0.10479001032225019, 0],
  [0.7415311855993945, 0.14065325971552592, 0.27970539148927664],
  [0.5860872354676911, 0.1690047266392679, 0],
  [0.4058451513773972, 0.19035057806478542, 0.3818300505051189],
  [0.20778495500789848, 0.20443294007529889, 0],
];
const CENTRE = [0.20948214108472782, 0.4179591836734694] as const;

/** No integrand of this room needs as many; a guard against endless halving. */
const MOST_PANELS = 2000;

export interface Node {
  readonly at: number;
  readonly kronrod: number;
  readonly gauss: number;
}

/** The 15 nodes of a panel, weights of both rules included. */
export function panelNodes(from: number, to: number): Node[] {
  const [middle, half] = [(from + to) / 2, (to - from) / 2];
  const nodes = RULE.flatMap(([node, kronrod, gauss]) =>
    [-1, 1].map((side) => ({ at: middle + side * node * half, kronrod: kronrod * half, gauss: gauss * half })),
  );
  return [...nodes, { at: middle, kronrod: CENTRE[0] * half, gauss: CENTRE[1] * half }];
}

interface Panel {
  readonly from: number;
  readonly to: number;
  readonly value: number;
  readonly error: number;
}

function measure(f: (x: number) => number, from: number, to: number): Panel {
  const [middle, half] = [(from + to) / 2, (to - from) / 2];
  const centre = f(middle);
  let kronrod = CENTRE[0] * centre;
  let gauss = CENTRE[1] * centre;
  for (const [node, k, g] of RULE) {
    const pair = f(middle - node * half) + f(middle + node * half);
    kronrod += k * pair;
    gauss += g * pair;
  }
  return { from, to, value: kronrod * half, error: Math.abs(kronrod - gauss) * half };
}

export interface Integral {
  readonly value: number;
  /** Sum of the differences of the two rules. */
  readonly error: number;
}

/**
 * ∫ f over the edges, which are ascending.
 *
 * @param tolerance relative to the value
 */
export function integrate(f: (x: number) => number, edges: readonly number[], tolerance: number): Integral {
  const panels: Panel[] = [];
  for (let i = 0; i + 1 < edges.length; i++) {
    const [from = 0, to = 0] = [edges[i], edges[i + 1]];
    if (to > from) panels.push(measure(f, from, to));
  }
  for (;;) {
    let [value, error, worst] = [0, 0, 0];
    panels.forEach((p, i) => {
      value += p.value;
      error += p.error;
      if (p.error > (panels[worst]?.error ?? 0)) worst = i;
    });
    const panel = panels[worst];
    if (panel === undefined || !(error > tolerance * Math.abs(value)) || panels.length >= MOST_PANELS) {
      return { value, error };
    }
    const middle = (panel.from + panel.to) / 2;
    if (!(middle > panel.from && middle < panel.to)) return { value, error };
    panels.splice(worst, 1, measure(f, panel.from, middle), measure(f, middle, panel.to));
  }
}
