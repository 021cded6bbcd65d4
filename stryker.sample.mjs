/**
 * Which mutants a run tries: all, a share of them drawn by a seed, or those that an earlier report let live. Stryker asks a checker about
 * every mutant before it runs tests; those not chosen are reported as compile errors, which no score counts.
 *
 *   LEASTTERM_MUTATION_SHARE=0.05   one in twenty; the same ones for the same LEASTTERM_MUTATION_SEED (1 by default)
 *   LEASTTERM_MUTATION_AGAIN=FILE   those of the JSON report that survived or were not reached by a test
 */
import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';

/** Reports count lines and columns from one, checkers from zero. */
const nameOf = (file, { location: { start, end }, mutatorName, replacement }, origin) =>
  [file, mutatorName, ...[start.line, start.column, end.line, end.column].map((n) => n - origin), replacement].join(
    ' ',
  );

const inCheckout = (path) => path.slice(path.indexOf('src/numerics/'));

const LIVED = new Set(['Survived', 'NoCoverage']);

function chosen({
  LEASTTERM_MUTATION_AGAIN: again,
  LEASTTERM_MUTATION_SHARE: share,
  LEASTTERM_MUTATION_SEED: seed = '1',
}) {
  if (again !== undefined) {
    const { files } = JSON.parse(readFileSync(again, 'utf8'));
    const names = Object.entries(files).flatMap(([file, { mutants }]) =>
      mutants.filter(({ status }) => LIVED.has(status)).map((mutant) => nameOf(file, mutant, 1)),
    );
    const wanted = new Set(names);
    return (name) => wanted.has(name);
  }
  if (share === undefined) return () => true;
  return (name) => createHash('sha256').update(`${seed} ${name}`).digest().readUInt32BE(0) < Number(share) * 2 ** 32;
}

class Sample {
  async init() {
    this.isChosen = chosen(process.env);
  }

  async check(mutants) {
    const answer = (mutant) =>
      this.isChosen(nameOf(inCheckout(mutant.fileName), mutant, 0))
        ? { status: 'passed' }
        : { status: 'compileError', reason: 'not chosen for this run' };
    return Object.fromEntries(mutants.map((mutant) => [mutant.id, answer(mutant)]));
  }
}

export const strykerPlugins = [{ kind: 'Checker', name: 'sample', factory: () => new Sample() }];
