/** @module The options for papers: forms of a result besides text and JSON. */
import type { OptionSpec } from './option-kinds.js';

export const PAPER_OPTIONS = {
  latex: { kind: 'flag', help: 'write tables in LaTeX, with booktabs and siunitx' },
  bibtex: { kind: 'flag', help: 'write the literature of methods and inputs in BibTeX' },
  markdown: { kind: 'flag', help: 'write tables in Markdown' },
  hepdata: { kind: 'flag', help: 'write tables in the YAML of HEPData submissions' },
} as const satisfies Readonly<Record<string, OptionSpec>>;

export interface PaperGiven {
  readonly latex?: boolean;
  readonly bibtex?: boolean;
  readonly markdown?: boolean;
  readonly hepdata?: boolean;
}
