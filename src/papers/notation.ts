/** @module The small notation of heads — *x* for a quantity, x_{i}, x^{n} — in the words of each form. */

const GREEK: Readonly<Record<string, string>> = {
  α: '\\alpha',
  β: '\\beta',
  γ: '\\gamma',
  δ: '\\delta',
  Λ: '\\Lambda',
  μ: '\\mu',
  π: '\\pi',
  σ: '\\sigma',
  χ: '\\chi',
  '±': '\\pm',
  '−': '-',
};

const TEX: Readonly<Record<string, string>> = {
  '\\': '\\textbackslash{}',
  '&': '\\&',
  '%': '\\%',
  $: '\\$',
  '#': '\\#',
  _: '\\_',
  '{': '\\{',
  '}': '\\}',
  '~': '\\textasciitilde{}',
  '^': '\\textasciicircum{}',
  '–': '--',
  '—': '---',
  '…': '\\dots{}',
  '’': "'",
  '|': '\\textbar{}',
  '<': '\\textless{}',
  '>': '\\textgreater{}',
  '√': '$\\sqrt{\\;}$',
};

/** Text from outside in LaTeX: every character that means something there is escaped. */
export const texText = (text: string): string =>
  text
    .split(/(\balpha_s\b|α_s|β_0)/)
    .map((part, i) => (i % 2 === 0 ? escaped(part) : part === 'β_0' ? '$\\beta_0$' : '$\\alpha_s$'))
    .join('');

const escaped = (text: string): string =>
  [...text]
    .map((c) => TEX[c] ?? (GREEK[c] === undefined ? c : `$${GREEK[c]}$`))
    .join('')
    .replace(/\$\$/g, '');

const MATH = /\*([^*]+)\*((?:[_^](?:\{[^}]*\}|.))*)/g;

/** A head in LaTeX: quantities and their scripts become mathematics, the rest is text. */
export function texHead(head: string): string {
  let out = '';
  let from = 0;
  for (const match of head.matchAll(MATH)) {
    out += texText(head.slice(from, match.index));
    const body = `${match[1] ?? ''}${match[2] ?? ''}`;
    out += `$${[...body].map((c) => (GREEK[c] === undefined ? c : `${GREEK[c]} `)).join('')}$`;
    from = match.index + match[0].length;
  }
  return out + texText(head.slice(from));
}

/** A head as plain text. */
export const plainHead = (head: string): string => head.replace(/\*/g, '').replace(/([_^])\{([^}]*)\}/g, '$1$2');

/** Text in a cell of Markdown. */
export const markdownText = (text: string): string => text.replace(/([\\|*_`<>[\]])/g, '\\$1').replace(/\n/g, ' ');
