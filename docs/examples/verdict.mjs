// The verdict on a catalogue series at a coupling with an error.
import { assess, isNumberProblem, loadSeries, parseUncertain } from 'leastterm';

const series = await loadSeries('adler');
const at = parseUncertain('0.3156(30)');
if (isNumberProblem(at)) throw new Error(at.problem);

const { verdict, growth } = assess(series, at, { digits: 15, request: {} });
console.log(growth.verdict);
console.log(`${verdict.prescription}: ${verdict.printed}`);
