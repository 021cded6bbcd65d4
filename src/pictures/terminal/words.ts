/** @module The notation of labels as text for the terminal: no italics, scripts where Unicode has them. */

const UPPER: Readonly<Record<string, string>> = Object.fromEntries(
  [...'0123456789+-−n'].map((c, i) => [c, [...'⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻⁻ⁿ'][i]!]),
);
const LOWER: Readonly<Record<string, string>> = Object.fromEntries(
  [...'0123456789+-−n'].map((c, i) => [c, [...'₀₁₂₃₄₅₆₇₈₉₊₋₋ₙ'][i]!]),
);

const scripts = (text: string, table: Readonly<Record<string, string>>): string | undefined => {
  const mapped = [...text].map((c) => table[c]);
  return mapped.some((c) => c === undefined) ? undefined : mapped.join('');
};

const TO_ASCII: Readonly<Record<string, string>> = {
  '−': '-',
  '·': '*',
  '±': '+-',
  α: 'alpha',
  β: 'beta',
  Λ: 'Lambda',
  μ: 'mu',
  σ: 'sigma',
  π: 'pi',
  δ: 'delta',
  Σ: 'Sum',
  '√': 'sqrt',
  '⟨': '<',
  '⟩': '>',
  '≤': '<=',
  '≥': '>=',
  '→': '->',
  '…': '...',
  '–': '-',
  '’': "'",
};

/** "10^{−2}" becomes 10⁻², or 10^-2 without Unicode; "*n*" becomes n. */
export function terminalWords(label: string, unicode: boolean): string {
  let out = '';
  for (let i = 0; i < label.length; i++) {
    const c = label[i]!;
    if (c === '\\' && i + 1 < label.length) out += label[++i]!;
    else if ((c === '_' || c === '^') && i + 1 < label.length) {
      const end = label[i + 1] === '{' ? label.indexOf('}', i) : -1;
      const inner = (end < 0 ? label[i + 1]! : label.slice(i + 2, end)).replace(/\*/g, '');
      i = end < 0 ? i + 1 : end;
      const set = unicode ? scripts(inner, c === '^' ? UPPER : LOWER) : undefined;
      out += set ?? `${c}${inner.length > 1 && !/^[−-]?\d+$/.test(inner) ? `(${inner})` : inner}`;
    } else if (c !== '*') out += c;
  }
  if (unicode) return out;
  // Accents come off: Padé is Pade.
  const bare = out.normalize('NFD').replace(/\p{M}/gu, '');
  return [...bare].map((c) => TO_ASCII[c] ?? (c < '\u0080' ? c : '?')).join('');
}
