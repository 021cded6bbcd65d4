/** @module A user's own series cut at μ_f, for people. */
import { shorten } from '../numerics/index.js';
import type { SeriesCutResult, SeriesCutValues } from '../extraction/index.js';
import { cautionPoints, couplingFacts, plusMinus, rough, sentence, withError } from '../report/index.js';
import type { Fact, Page, TerminalOptions } from '../report/index.js';
import { pageOf } from './bubbles.js';

/** Where the cut stands and what it removes. */
function modelFacts({ cut }: SeriesCutResult): Fact[] {
  const { singularity, strengths } = cut;
  const [used, ...others] = strengths.map((s) => {
    const own = Number(s.error) > 0 ? withError(s.value, s.error, 6) : shorten(s.value, 6);
    return `${own} from ${s.source}`;
  });
  return [
    {
      label: 'removed',
      text: `k < μ_f of λ ∫ dτ/τ τ^${shorten(singularity.u, 6)} x(k), τ = k²/Q²: the model of the singularity at u = ${shorten(singularity.u, 6)}, d = ${singularity.dimension}, exponent ${shorten(singularity.exponent, 6)} (${singularity.origin})`,
    },
    {
      label: 'μ_f',
      text: 'the scale of the MSbar coupling under the integral; the virtuality of a gluon in a bubble chain is e^(5/6) = 2.30 times larger',
      tone: 'faint',
    },
    { label: 'λ', text: used ?? '' },
    ...(others.length === 0 ? [] : [{ label: 'not used', text: others.join(', '), tone: 'faint' as const }]),
    { label: 'trust', text: 'indicative: one singularity stands for all low momenta' },
  ];
}

function coefficients(page: Page, { cut }: SeriesCutResult): void {
  page.head('Coefficients by momentum');
  page.table(
    [
      { head: 'order', align: 'right' },
      { head: 'all', align: 'point' },
      { head: 'k < μ_f', align: 'point' },
      { head: 'k > μ_f', align: 'point' },
    ],
    cut.terms.map((t) => ({ cells: [String(t.n), ...[t.whole, t.low, t.high].map((x) => shorten(x, 6))] })),
  );
  page.blank();
  page.facts([
    { label: 'all', text: cut.growth.whole.statement },
    { label: 'k > μ_f', text: cut.growth.high.statement },
  ]);
}

function sums(page: Page, values: SeriesCutValues): void {
  page.head('The two parts and their sum');
  page.table(
    [
      { head: 'μ_f/Q', align: 'point' },
      { head: 'k > μ_f', align: 'point' },
      { head: 'its last term', align: 'point', tone: 'faint' },
      { head: 'k < μ_f', align: 'point' },
      { head: 'sum', align: 'point' },
    ],
    values.rows.map((r) => ({
      cells: [r.cut, r.high, rough(r.lastTerm), r.low ?? 'refused', r.sum ?? ''],
    })),
  );
  page.blank();
  if (values.refused !== undefined) {
    page.say(`k < μ_f: refused. ${sentence(values.refused.reason)} Remedy: ${values.refused.remedy}.`, 'warn');
    return;
  }
  page.facts([
    { label: 'uncut, fixed order', text: values.whole },
    { label: 'sum at this cut', text: values.sum ?? '' },
    ...(values.spread === undefined
      ? []
      : [{ label: 'moves with μ_f', text: `by no more than ${rough(values.spread)} over the cuts of the table` }]),
    { label: 'last term, k > μ_f', text: plusMinus(values.truncation) },
    ...(values.strengthError === undefined
      ? []
      : [{ label: 'from the error of λ', text: plusMinus(values.strengthError) }]),
    ...(values.inputError === undefined ? [] : [{ label: 'from the coupling', text: plusMinus(values.inputError) }]),
    ...(values.ambiguity === undefined
      ? []
      : [
          {
            label: 'ambiguity, k < μ_f',
            text: `${plusMinus(values.ambiguity)} (|Im|/π); none above μ_f from this singularity`,
          },
        ]),
    ...(values.inGeV === undefined
      ? []
      : [{ label: 'k < μ_f, times Q^d', text: `${values.inGeV.value} ${values.inGeV.unit}` }]),
  ]);
  page.blank();
  page.say(
    'k < μ_f is a principal value; a condensate with the scale μ_f holds it in place of the series. The sum would not move if all terms above μ_f were known.',
    'faint',
  );
}

/** The page of growth --cut. */
export function seriesCutText(result: SeriesCutResult, options: TerminalOptions = {}): string {
  const page = pageOf(options);
  const { series, cut, coupling } = result;
  const where = `${shorten(cut.overHard, 6)} Q${cut.GeV === undefined ? '' : ` = ${shorten(cut.GeV, 6)} GeV`}`;
  page.title(`${series.title}, cut at μ_f = ${where}`);
  page.blank();
  page.facts([...(coupling === undefined ? [] : couplingFacts(series, coupling)), ...modelFacts(result)]);
  coefficients(page, result);
  if (cut.values !== undefined) sums(page, cut.values);
  cautionPoints(page, result.cautions);
  return page.text();
}
