/**
 * @module What a series file may weigh. Far above any series ever published, and low enough that a hostile file is turned
 * away within two seconds and 400 MB on a slow machine.
 */
export const LIMITS = {
  /** Bytes of a file. */
  bytes: 4 * 1024 * 1024,
  coefficients: 5_000,
  /** Coefficients of a contour quantity. */
  contour: 200,
  /** Lines, and entries of lists and maps, of a whole file. */
  entries: 20_000,
  /** Characters that mean something to YAML (quotes, brackets, colons, …), anywhere in a file. */
  marks: 50_000,
  /** Lists and maps inside each other. */
  depth: 12,
  /** Characters of one number. */
  numberLength: 10_000,
  /** Largest decimal exponent, either sign. */
  exponent: 20_000,
  /** Characters of one expression. */
  expressionLength: 4_000,
  /** Parentheses inside each other. */
  expressionDepth: 60,
  /** Largest integer power in an expression, and largest argument of zeta. */
  power: 1_000,
  /** Bits of any number met while an expression is evaluated. */
  bits: 100_000,
  /** Characters of a title, a note, a source. */
  text: 4_000,
  /** Rows of a correlation matrix. */
  correlation: 200,
  /** Problems listed for one file. */
  problems: 40,
  /** Exact arithmetic a file may ask for: sum of products of the lengths, in 19-digit words, of what is reduced. */
  work: 2_000_000,
  /** The share of that allowance which the parser needs for one character of an expression. */
  workPerCharacter: 20,
  /** Named constants. */
  constants: 200,
} as const;

/** 4194304 -> "4,194,304". */
export const grouped = (n: number): string => n.toString().replace(/\B(?=(\d{3})+$)/g, ',');
