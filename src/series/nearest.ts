/** @module The known word nearest to a mistyped one. */

/** Number of insertions, deletions, replacements and swaps of neighbours that turn a into b. */
export function editDistance(a: string, b: string): number {
  let beforeLast: number[] = [];
  let last = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const row = [i];
    for (let j = 1; j <= b.length; j++) {
      const change = a[i - 1] === b[j - 1] ? 0 : 1;
      let best = Math.min(last[j]! + 1, row[j - 1]! + 1, last[j - 1]! + change);
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1])
        best = Math.min(best, beforeLast[j - 2]! + 1);
      row.push(best);
    }
    beforeLast = last;
    last = row;
  }
  return last[b.length]!;
}

/** Share of letters that may differ before a suggestion becomes a guess (heuristic). */
const TOLERANCE = 0.4;

/** Letters at the beginning that make an abbreviation (heuristic). */
const ABBREVIATION = 4;

/** The candidate nearest to `word` (the longest of several), or undefined when none is near. Capital letters do not count. */
export function nearest(word: string, candidates: Iterable<string>): string | undefined {
  if (word.length > 64 || word.length < 2) return undefined;
  let best: string | undefined;
  let bestDistance = Math.max(1, Math.floor(word.length * TOLERANCE)) + 1;
  for (const candidate of candidates) {
    const d = editDistance(word.toLowerCase(), candidate.toLowerCase());
    const better = d < bestDistance || (d === bestDistance && best !== undefined && candidate.length > best.length);
    if (better) [best, bestDistance] = [candidate, d];
  }
  return best ?? abbreviated(word.toLowerCase(), candidates);
}

function abbreviated(word: string, candidates: Iterable<string>): string | undefined {
  const start = word.slice(0, ABBREVIATION);
  if (start.length < ABBREVIATION) return undefined;
  return [...candidates].find((candidate) => candidate.toLowerCase().startsWith(start));
}

/** ` (did you mean "x"?)`, or nothing. */
export function suggestion(word: string, candidates: Iterable<string>): string {
  const near = nearest(word, candidates);
  return near === undefined ? '' : ` (did you mean "${near}"?)`;
}
