/** @module The few tones of a report, and the painter that gives them colour or leaves them plain. */

/**
 * strong: titles; faint: rules and what may be skipped; mark: the one row or line to look at first;
 * warn: refusals and cautions.
 */
export type Tone = 'plain' | 'strong' | 'faint' | 'mark' | 'warn';

/** Colours a text that already has its final width, and knows whether the page may use more than ASCII. */
export interface Paint {
  (text: string, tone: Tone): string;
  readonly ascii?: boolean;
}

export const unpainted: Paint = (text) => text;

/** The same painter for a page in plain ASCII. */
export const inAscii = (paint: Paint): Paint =>
  Object.assign((text: string, tone: Tone) => paint(text, tone), { ascii: true });

/**
 * Painter for a terminal that shows colours.
 *
 * @param level 0 for none, 1 for sixteen colours, 2 and 3 for more; the report needs no more than sixteen
 */
export async function painter(level: 0 | 1 | 2 | 3): Promise<Paint> {
  if (level === 0) return unpainted;
  const { Chalk } = await import('chalk');
  const chalk = new Chalk({ level });
  const tones = { strong: chalk.bold, faint: chalk.dim, mark: chalk.cyan, warn: chalk.yellow };
  return (text, tone) => (tone === 'plain' || text === '' ? text : tones[tone](text));
}
