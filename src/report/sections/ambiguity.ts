/** @module Section 6: the renormalon ambiguity under its named conventions, and the power correction it stands for. */
import type { AmbiguityReport, Assessment, PowerCorrectionReport } from '../../studies/index.js';
import { shorten } from '../../numerics/index.js';
import { percent, rough, withError } from '../layout/figures.js';
import type { Fact, Page } from '../layout/page.js';
import type { TableNote, TableRow } from '../layout/table.js';
import { sentence, withPi } from '../words.js';

const DIGITS = 4;

const few = (text: string | undefined): string => (text === undefined ? '' : shorten(text, DIGITS));

function conventionTable(page: Page, ambiguity: AmbiguityReport, unit: string): void {
  const rows = ambiguity.conventions.flatMap((c): (TableRow | TableNote)[] => {
    const name = c.name === ambiguity.chosen ? `${withPi(c.name)} (used in the verdict)` : withPi(c.name);
    const cells = [
      name,
      withError(c.value, c.error, DIGITS),
      c.relative === undefined ? '' : percent(c.relative),
      few(c.GeV),
      c.standing,
    ];
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
const unitOf = ({ GeV }: { readonly GeV?: { readonly power: string } }): string =>
  GeV === undefined || GeV.power === '1' ? 'GeV' : `GeV^${GeV.power}`;

function powerFacts(power: PowerCorrectionReport): Fact[] {
  const d = power.dimension ?? 'd';
  const facts: Fact[] = [];
  if (power.lambdaOverQ !== undefined) facts.push({ label: 'Λ/Q', text: few(power.lambdaOverQ) });
  const ratio = d === '1' ? 'Λ/Q' : `(Λ/Q)^${d}`;
  if (power.power !== undefined && d !== '1') facts.push({ label: ratio, text: few(power.power) });
  if (power.inPowerUnits !== undefined) {
    facts.push({ label: 'ambiguity', text: `${few(power.inPowerUnits)} times ${ratio}` });
  }
  if (power.GeV !== undefined) {
    facts.push({ label: 'as energy', text: `${few(power.GeV.value)} ${unitOf(power)}` });
  }
  const { fromStrength: own } = power;
  if (own !== undefined) {
    const energy = own.GeV === undefined ? '' : ` = ${withError(own.GeV.value, own.GeV.error, DIGITS)} ${unitOf(own)}`;
    const root = own.root === undefined ? '' : `, its root ${few(own.root)} GeV`;
    facts.push({
      label: 'from N',
      text: `|Im|/π = ${withError(own.overPower, own.overPowerError, DIGITS)} ${d === '1' ? 'Λ' : `Λ^${d}`}${energy}${root} (${own.lambda})`,
    });
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
        c.wilson === undefined ? NONE : few(c.wilson),
        c.fileValue ?? NONE,
        c.shift === undefined ? NONE : few(c.shift),
        c.shiftIm === undefined ? NONE : few(c.shiftIm),
        c.shiftOverValue === undefined ? NONE : rough(c.shiftOverValue),
      ],
    })),
  );
  const reasons = new Map<string, string[]>();
  for (const { name, missing } of power.condensates) {
    if (missing !== undefined) reasons.set(missing, [...(reasons.get(missing) ?? []), name]);
  }
  page.points([...reasons].map(([why, names]) => `${[...new Set(names)].join(', ')}: ${why}.`));
}

/** Stands for a number that is missing; the line below the table says why. */
const NONE = '–';

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
