// A series from text: 1 - 1 + 2 - 6 + 24 …, whose Borel sum at x = 1 is e E1(1) = 0.596347362…
import { isNumberProblem, parseSeries, parseUncertain, sumStudy } from 'leastterm';

let c = 1;
const coefficients = Array.from({ length: 20 }, (_, n) => (n === 0 ? 1 : (c *= -n)));
const series = await parseSeries(`variable: x\ncoefficients: [${coefficients.join(', ')}]\n`, { name: 'euler' });
const at = parseUncertain('1');
if (isNumberProblem(at)) throw new Error(at.problem);

const { values } = sumStudy(series, at, { digits: 12, request: {} });
for (const { prescription, variant, value, central } of values)
  if (central && value !== undefined) console.log(prescription, variant, value);
