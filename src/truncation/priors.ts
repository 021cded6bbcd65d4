/** @module Every adjustable assumption of the truncation-error models: its usual value, its range, its meaning. */

interface Prior {
  readonly usual: number;
  /** Smallest value; `open` excludes it. */
  readonly least: number;
  readonly open?: boolean;
  readonly most: number;
  readonly whole?: boolean;
  readonly meaning: string;
}

export const PRIORS = {
  'conventional.double': {
    usual: 2,
    least: 1,
    most: 10,
    meaning: 'the 95 % band of a conventional estimate over its 68 % band',
  },
  'ch.unit': {
    usual: 1,
    least: 0,
    open: true,
    most: 1e6,
    meaning: 'coefficients are counted in powers of x/unit, x the variable of the series',
  },
  'ch.slope': {
    usual: 0,
    least: 0,
    most: 10,
    meaning: 'prior of the bound on the coefficients: c^(-1-slope), 0 being uniform in ln c',
  },
  'ch.constant': {
    usual: 0,
    least: 0,
    most: 1,
    whole: true,
    meaning: '1: the additive constant of the series counts as a coefficient of order 0',
  },
  'chbar.lambda': {
    usual: 1,
    least: 0,
    open: true,
    most: 1e6,
    meaning: 'lambda of (k-1)! b_k (coupling/lambda)^k',
  },
  'chbar.slope': { usual: 0, least: 0, most: 10, meaning: 'prior of the bound on the b_k: c^(-1-slope)' },
  'geometric.omega': { usual: 1, least: 0, most: 100, meaning: 'prior of the ratio: (1 + omega)(1 - a)^omega' },
  'geometric.epsilon': {
    usual: 0.1,
    least: 0,
    open: true,
    most: 100,
    meaning: 'prior of the size: epsilon c^(-1-epsilon) for c > 1',
  },
  'abc.omega': { usual: 1, least: 0, most: 100, meaning: 'prior of the ratio: (1 + omega)(1 - |a|)^omega/2' },
  'abc.epsilon': {
    usual: 0.1,
    least: 0,
    open: true,
    most: 100,
    meaning: 'prior of the width: epsilon eta^epsilon c^(-1-epsilon) for c > eta',
  },
  'abc.xi': { usual: 2, least: 0, open: true, most: 1e6, meaning: 'prior of the bias: uniform in |b| < xi c' },
  'abc.eta': { usual: 0.1, least: 0, open: true, most: 1e6, meaning: 'smallest width c' },
  'scale.factor': { usual: 2, least: 1, open: true, most: 10, meaning: 'scales run from mu/factor to factor mu' },
  'scale.nodes': {
    usual: 31,
    least: 3,
    most: 99,
    whole: true,
    meaning: 'scales of the average, at the nodes of Gauss and Legendre in ln mu',
  },
  'scale.loops': {
    usual: 4,
    least: 1,
    most: 5,
    whole: true,
    meaning: 'loops of the beta function that moves the scale',
  },
} as const satisfies Readonly<Record<string, Prior>>;

export type PriorName = keyof typeof PRIORS;
export type Priors = Readonly<Record<PriorName, number>>;

const NAMES = Object.keys(PRIORS).filter((name): name is PriorName => name in PRIORS);

/** All names, in the order of the documentation. */
export const priorNames = (): readonly PriorName[] => NAMES;

/** The usual values. */
export const USUAL_PRIORS: Priors = {
  'conventional.double': PRIORS['conventional.double'].usual,
  'ch.unit': PRIORS['ch.unit'].usual,
  'ch.slope': PRIORS['ch.slope'].usual,
  'ch.constant': PRIORS['ch.constant'].usual,
  'chbar.lambda': PRIORS['chbar.lambda'].usual,
  'chbar.slope': PRIORS['chbar.slope'].usual,
  'geometric.omega': PRIORS['geometric.omega'].usual,
  'geometric.epsilon': PRIORS['geometric.epsilon'].usual,
  'abc.omega': PRIORS['abc.omega'].usual,
  'abc.epsilon': PRIORS['abc.epsilon'].usual,
  'abc.xi': PRIORS['abc.xi'].usual,
  'abc.eta': PRIORS['abc.eta'].usual,
  'scale.factor': PRIORS['scale.factor'].usual,
  'scale.nodes': PRIORS['scale.nodes'].usual,
  'scale.loops': PRIORS['scale.loops'].usual,
};

/** What a text that sets priors has wrong. */
export interface PriorProblem {
  readonly problem: string;
  readonly wanted: string;
}

export const isPriorProblem = (x: Priors | PriorProblem): x is PriorProblem => 'problem' in x;

const isName = (text: string): text is PriorName => NAMES.some((name) => name === text);

/** The range in words: "a number above 0 and at most 100". */
function range(prior: Prior): string {
  const kind = prior.whole === true ? 'a whole number' : 'a number';
  const low = prior.open === true ? `above ${prior.least}` : `from ${prior.least}`;
  return `${kind} ${low} ${prior.open === true ? 'and at most' : 'to'} ${prior.most}`;
}

function problemWith(name: PriorName, value: number): string | undefined {
  const prior: Prior = PRIORS[name];
  const low = prior.open === true ? value > prior.least : value >= prior.least;
  const whole = prior.whole !== true || Number.isInteger(value);
  return low && value <= prior.most && whole ? undefined : range(prior);
}

/** Reads "abc.xi=3, geometric.omega=2"; what is not named keeps its usual value. */
export function readPriors(text: string): Priors | PriorProblem {
  let priors = USUAL_PRIORS;
  for (const entry of text.split(',')) {
    const [, name = '', written = ''] = /^\s*([^=\s]+)\s*=\s*([^\s]+)\s*$/.exec(entry) ?? [];
    if (name === '') {
      return { problem: `"${entry.trim()}" is not NAME=VALUE`, wanted: 'a list such as abc.xi=3,geometric.omega=2' };
    }
    if (!isName(name)) return { problem: `no prior "${name}"`, wanted: `one of ${NAMES.join(', ')}` };
    const value = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(written) ? Number(written) : Number.NaN;
    const wanted = Number.isFinite(value) ? problemWith(name, value) : range(PRIORS[name]);
    if (wanted !== undefined) return { problem: `${name} = ${written}`, wanted };
    priors = { ...priors, [name]: value };
  }
  return priors;
}
