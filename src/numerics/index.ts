/** @module The public face of the numerics room: import from here, not from the files behind it. */
export { Rational, gcdBigInt, PARSE_LIMITS } from './rational.js';
export * from './exact.js';
export type { Ball } from './ball/real.js';
export type { Complex } from './ball/complex.js';
export * as R from './ball/real.js';
export * as C from './ball/complex.js';
export type { Field } from './field.js';
export { rationalField, doubleField, ballField } from './field.js';
export type { Decimal, Tie } from './decimal/decimal.js';
export {
  leadingPlace,
  parseDecimal,
  roundToDigits,
  roundToPlace,
  shorten,
  writeDecimal,
  writePlain,
  writeScientific,
} from './decimal/decimal.js';
export type { ErrorText, RoundedError, RoundedValue } from './decimal/pdg.js';
export { pdgPlace, roundPdg, writeParentheses, writePlusMinus } from './decimal/pdg.js';
export { pi, ln2, eulerGamma } from './ball/constants.js';
export { exp, expm1, sinh, cosh, tanh, log, log1p, sinCos, sinCosPi, atan, atan2, pow } from './ball/elementary.js';
export type { SinCos } from './ball/elementary.js';
export { cexp, clog, cpow, csqrt, arg } from './ball/complex-elementary.js';
export * as DoubleDouble from './double-double/index.js';
export { bernoulli } from './special/bernoulli.js';
export { zeta } from './special/zeta.js';
export { zetaReal } from './special/zeta-real.js';
export { polylogHalf } from './special/polylog-half.js';
export { gamma, rgamma } from './special/gamma.js';
export { gammaComplex, rgammaComplex } from './special/gamma-complex.js';
export { logGamma, logGamma1p } from './special/log-gamma.js';
export { digamma } from './special/digamma.js';
export { digammaComplex } from './special/digamma-complex.js';
export { kummerM, kummerU } from './special/confluent.js';
export { gauss } from './special/gauss.js';
export type { ComplexRational } from './special/parameter.js';
export * from './polynomial/index.js';
export * from './linear/index.js';
export * from './quadrature/index.js';
export { scaledE1, eiScaled } from './special/expint.js';
export { expintE1 } from './special/expint-real.js';
export { upperGamma, upperGammaComplex } from './special/upper-gamma.js';
export { branchSame, branchAlternating, branchCut } from './special/kernels.js';
export type { BranchValue } from './special/kernels.js';
export type { DecimalText } from './enclose.js';
export { certainDigits, raisePrecision, toDecimal } from './enclose.js';
export { LARGEST_SEED, Philox, Substreams } from './random/index.js';
export * from './interpolation/index.js';
export {
  gammaDouble,
  rgammaDouble,
  logGammaDouble,
  digammaDouble,
  branchSameDouble,
  branchAlternatingDouble,
  branchCutDouble,
  scaledE1Double,
} from './special/double.js';
export type { BranchDouble, ComplexDouble } from './special/double.js';
