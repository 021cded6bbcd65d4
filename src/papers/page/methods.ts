/** @module The formulas behind a report, one or two lines each, by prescription: set as MathML, which needs no font file. */
import katex from 'katex';
import { html } from './escape.js';

interface Method {
  readonly title: string;
  readonly formula: string;
  readonly words: string;
}

/** Symbols: x = coupling/divisor, c_n the coefficients, B the Borel transform, t* its nearest singularity. */
const METHODS: Readonly<Record<string, Method>> = {
  'fixed-order': {
    title: 'Fixed order',
    formula: 'F_N(x) = \\sum_{n=0}^{N-1} c_n x^n',
    words: 'The sum of the known terms. Error: the last term.',
  },
  'least-term': {
    title: 'Least term',
    formula: 'F(x) \\approx \\sum_{n<n^*} c_n x^n, \\qquad |c_{n^*} x^{n^*}| = \\min_n |c_n x^n|',
    words: 'The sum is stopped where the terms are smallest; what is left is of the size of the least term.',
  },
  terminant: {
    title: 'Least term with terminant',
    formula: 'F(x) = \\sum_{n<N} c_n x^n + K\\, c_N x^N',
    words:
      'The rest after the least term is that of a single branch point with the position and exponent of the nearest singularity.',
  },
  pade: {
    title: 'Padé in the coupling',
    formula: '[L/M](x) = P_L(x)/Q_M(x)',
    words: 'A rational function with the known terms.',
  },
  'borel-pade': {
    title: 'Borel–Padé',
    formula:
      'F(x) = \\frac{1}{x} \\int_0^\\infty \\! dt\\, e^{-t/x}\\, B(t), \\qquad B(t) = \\sum_n \\frac{c_n}{n!} t^n \\to [L/M](t)',
    words:
      'The Laplace integral of a Padé approximant of the Borel transform, in closed form; principal value, and the imaginary part of the lateral sum.',
  },
  'borel-leroy-pade': {
    title: 'Borel–Leroy–Padé',
    formula:
      'B_b(t) = \\sum_n \\frac{c_n}{(1+b)_n} t^n, \\qquad F(x) = \\frac{x^{-1-b}}{\\Gamma(1+b)} \\int_0^\\infty \\! dt\\, t^b e^{-t/x} B_b(t)',
    words: 'The same with a weight that turns the leading branch point into a pole.',
  },
  'singularity-model': {
    title: 'Singularity model',
    formula:
      'B(t) = \\sum_i d_i \\left(1 - \\frac{t}{t_i}\\right)^{-\\gamma_i} \\bigl[1 + \\dots\\bigr] + \\text{polynomial}',
    words:
      'The expected branch points with exponents from the renormalisation group; strengths fitted to the known coefficients.',
  },
  'borel-conformal': {
    title: 'Conformally mapped Borel transform',
    formula: 'w(t) = \\frac{\\sqrt{1+t/a}-\\sqrt{1-t/b}}{\\sqrt{1+t/a}+\\sqrt{1-t/b}}',
    words: 'The Borel transform re-expanded in the variable that maps its cut plane onto the unit disc.',
  },
};

const AMBIGUITY: Method = {
  title: 'Ambiguity',
  formula:
    '|\\mathrm{Im}\\, R_+| = \\frac{\\pi N t^*}{\\Gamma(1+b)}\\, X^{b}\\, e^{-X}, \\qquad X = \\frac{t^*}{x}, \\qquad |\\mathrm{Im}\\, R_+| \\propto \\left(\\frac{\\Lambda}{Q}\\right)^{d}',
  words:
    'Half the difference of the lateral sums of a branch point with strength N and exponent 1 + b; quoted as it is in one convention, divided by π in another. It must cancel against the power correction of dimension d.',
};

const mathML = (formula: string): string =>
  katex.renderToString(formula, { output: 'mathml', displayMode: true, throwOnError: true });

const methodHtml = ({ title, formula, words }: Method): string =>
  `<h3>${html(title)}</h3>\n<div class="formula" tabindex="0" role="group" aria-label="${html(`Formula: ${title}`)}">${mathML(formula)}</div>\n<p>${html(words)}</p>`;

/** The methods named, with their formulas; those without a formula here are left to the manual. */
export function methodsHtml(names: readonly string[]): string {
  const known = names.flatMap((name) => METHODS[name] ?? []);
  return known.length === 0 ? '' : [...known, AMBIGUITY].map(methodHtml).join('\n');
}
