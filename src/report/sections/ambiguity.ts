/** @module Section 6: the renormalon ambiguity under its named conventions, and the power correction it stands for. */
import type { AmbiguityReport, Assessment, PowerCorrectionReport } from '../../studies/index.js';
import { shorten } from '../../numerics/index.js';
import { percent, rough } from '../layout/figures.js';
import type { Fact, Page } from '../layout/page.js';
import type { TableNote, TableRow } from '../layout/table.js';
import { sentence, withPi } from '../words.js';

const DIGITS = 4;

const few = (text: string | undefined): string => (text === undefined ? '' : shorten(text, DIGITS));

function conventionTable(page: Page, ambiguity: AmbiguityReport, unit: string): void {
  const rows = ambiguity.conventions.flatMap((c): (TableRow | TableNote)[] => {
    const name = c.name === ambiguity.chosen ? `${withPi(c.name)} (used in the verdict)` : withPi(c.name);
    const cells = [name, few(c.value), c.relative === undefined ? '' : percent(c.relative), few(c.GeV), c.standing];
    return [{ cells }, { note: c.origin, indent: 2, tone: 'faint' }];
  });
  if (rows.length === 0) return;
  page.table(
    [
      { head: 'convention', align: 'left' },
      { head: 'ambiguity', align: 'point' },
      { head: 'relative', align: 'point' },
      { head: `in ${unit}`, align: 'point' },
      { head: 'trust', align: 'left' },
    ],
    rows,
  );
  page.blank();
}

/** "GeV", "GeV^4". */
const unitOf = ({ GeV }: PowerCorrectionReport): string =>
  GeV === undefined || GeV.power === '1' ? 'GeV' : `GeV^${GeV.power}`;

function powerFacts(power: PowerCorrectionReport): Fact[] {
  const d = power.dimension ?? 'd';
  const facts: Fact[] = [];
  if (power.lambdaOverQ !== undefined) facts.push({ label: 'Λ/Q', text: few(power.lambdaOverQ) });
  if (power.power !== undefined) facts.push({ label: `(Λ/Q)^${d}`, text: few(power.power) });
  if (power.inPowerUnits !== undefined) {
    facts.push({ label: 'ambiguity', text: `${few(power.inPowerUnits)} times (Λ/Q)^${d}` });
  }
  if (power.GeV !== undefined) {
    facts.push({ label: 'as energy', text: `${few(power.GeV.value)} ${unitOf(power)}` });
  }
  return facts;
}

function condensateTable(page: Page, power: PowerCorrectionReport): void {
  if (power.condensates.length === 0) return;
  const unit = power.condensates.find((c) => c.unit !== undefined)?.unit;
  const inUnit = unit === undefined ? '' : `, ${unit}`;
  page.blank();
  page.say('Shift of the condensate that would absorb the ambiguity:');
  page.blank();
  page.table(
    [
      { head: 'condensate', align: 'left' },
      { head: 'd', align: 'right' },
      { head: 'Wilson', align: 'point' },
      { head: `in the file${inUnit}`, align: 'point' },
      { head: 'shift, |Im|/π', align: 'point' },
      { head: 'shift, |Im|', align: 'point' },
      { head: 'shift/value', align: 'point' },
    ],
    power.condensates.map((c) => ({
      cells: [
        c.name,
        c.dimension,
        few(c.wilson),
        c.fileValue ?? '',
        few(c.shift),
        few(c.shiftIm),
        c.shiftOverValue === undefined ? '' : rough(c.shiftOverValue),
      ],
    })),
  );
}

export function ambiguitySection(
  page: Page,
  { ambiguity, powerCorrection }: Pick<Assessment, 'ambiguity' | 'powerCorrection'>,
): void {
  page.head('The ambiguity and the power correction');
  conventionTable(page, ambiguity, unitOf(powerCorrection));
  page.say(sentence(ambiguity.statement));
  const facts = powerFacts(powerCorrection);
  if (facts.length > 0) {
    page.blank();
    page.facts(facts);
  }
  condensateTable(page, powerCorrection);
  page.blank();
  page.say(sentence(powerCorrection.statement));
}
