/** @module Topics of the help beside the commands. Plain ASCII, folded by the help. */

export interface Topic {
  readonly name: string;
  readonly summary: string;
  readonly paragraphs: readonly string[];
}

export const TOPICS: readonly Topic[] = [
  {
    name: 'numbers',
    summary: 'how to write values with errors, and how they are printed',
    paragraphs: [
      "A value is written 0.1180(9), 0.1180+-0.0009 or '0.25 +0.03 -0.02'. Shells read parentheses themselves: put them in quotes. Scales and masses have units: 91.1879GeV, 500MeV; a bare number is no scale.",
      'Decimals are read exactly, however long. Printed are only digits that are known; errors to two digits; the verdict as the Particle Data Group rounds. --digits asks for more certified digits of each value, --json has them all, as text.',
    ],
  },
  {
    name: 'trust',
    summary: 'certified, converged, indicative: what stands behind a number',
    paragraphs: [
      'Every number has two marks. Its digits are certified (an enclosure proves them) or converged (two independent evaluations agree). Its trust as an answer is certified, converged, or indicative: the number of a model or a heuristic.',
      'A Borel-Pade sum of exact coefficients is the typical case: certified digits of an indicative model. The two are never merged.',
    ],
  },
  {
    name: 'ambiguity',
    summary: 'conventions of the renormalon ambiguity, which differ by factors',
    paragraphs: [
      'A same-sign factorial series has two lateral sums, value +- i Im. As an error some quote |Im|, some |Im|/pi, some the least term, some the spread of partial sums about it: the numbers differ by factors of 2 and pi. leastterm prints them side by side and takes |Im|/pi where one is needed; compare numbers only within one convention.',
      'The ambiguity must cancel against a power correction (Lambda/Q)^d. Where Lambda, the dimension and a condensate are known, the shift of the condensate that absorbs it is printed too.',
    ],
  },
  {
    name: 'series-file',
    summary: 'the smallest series files; all fields are in docs/series-file.md',
    paragraphs: [
      'The smallest file is a list, [1, -1, 2, -6, 24], or one number a line. A file in YAML says more: coupling: { name: alpha_s, divisor: pi }, first power, scheme, flavours, scale ratio, hard scale, coefficients with errors as 6.371(4), singularities: [{ dimension: 4 }], condensates, sources.',
      "Coefficients may be expressions of nf, pi, zeta(n), log, sqrt. 'leastterm new FILE' writes a commented file to start from; 'leastterm catalogue show adler -q' prints a complete one.",
    ],
  },
  {
    name: 'verdict',
    summary: 'which number the verdict takes, and how to change it',
    paragraphs: [
      'The verdict goes down a ladder: a Borel-Pade sum that has converged, then the singularity model where positions and exponents are known, then Borel sums, then the least term with its terminant, then the fixed-order sum. Convergent and very short series get the fixed-order sum at once. The record of a prescription is shown but changes nothing. The rung is printed with the value, the rule stands in docs/verdict.md, and --verdict-rule changes it. Nothing is averaged.',
    ],
  },
  {
    name: 'exit-codes',
    summary: 'what the program returns',
    paragraphs: [
      '0: done. 1: every prescription refused, or a check or a replay found something. 2: wrong input or usage; the message says what was found and what is wanted. 3: a fault of leastterm. 130: interrupted; what was known was printed where that is possible.',
    ],
  },
];
