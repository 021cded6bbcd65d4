/**
 * @module Plain ASCII for terminals that show nothing else: signs and Greek letters by the words and marks that physicists
 * type for them.
 */

const LETTERS: Readonly<Record<string, string>> = {
  '±': '+-', '∓': '-+', '−': '-', '–': '-', '—': '-', '×': 'x', '·': '*', '…': '...', '─': '-', '→': '->', '←': '<-',
  '≤': '<=', '≥': '>=', '≈': '~', '∝': '~', '∞': 'infinity', '√': 'sqrt', '∫': 'int', '∮': 'oint', 'Σ': 'sum', 'Π': 'prod',
  '∈': 'in', '∉': 'not in', '∂': 'd', '°': ' deg', '′': "'", '’': "'", '‘': "'", '“': '"', '”': '"', '⟨': '<', '⟩': '>',
  'α': 'alpha', 'β': 'beta', 'γ': 'gamma', 'Γ': 'Gamma', 'δ': 'delta', 'Δ': 'Delta', 'ε': 'epsilon', 'ζ': 'zeta', 'η': 'eta',
  'θ': 'theta', 'κ': 'kappa', 'λ': 'lambda', 'Λ': 'Lambda', 'μ': 'mu', 'µ': 'mu', 'ν': 'nu', 'π': 'pi', 'ρ': 'rho',
  'σ': 'sigma', 'τ': 'tau', 'φ': 'phi', 'χ': 'chi', 'ψ': 'psi', 'ω': 'omega', 'Ω': 'Omega', 'ß': 'ss', 'ø': 'o', 'Ø': 'O',
  'ł': 'l', 'Ł': 'L', 'æ': 'ae', 'Æ': 'Ae', 'đ': 'd', '\u00a0': ' ',
}; // prettier-ignore

const UP = '⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻';
const DOWN = '₀₁₂₃₄₅₆₇₈₉₊₋';
const DIGITS = '0123456789+-';

/** Everything beyond the first 128 signs; line ends and tabs stay. */
const BEYOND = /[\u0080-\u{10ffff}]/gu;

/** A run of raised or lowered digits: x² is x^2, β₀ is beta_0. */
function moved(run: string, from: string, mark: string): string {
  return mark + Array.from(run, (sign) => DIGITS[from.indexOf(sign)] ?? '').join('');
}

/** The text in ASCII: accents are dropped, and what has no word for it becomes a question mark. */
export function asciiOf(text: string): string {
  if (text.search(BEYOND) < 0) return text;
  return text
    .replaceAll(/[⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻]+/g, (run) => moved(run, UP, '^'))
    .replaceAll(/[₀₁₂₃₄₅₆₇₈₉₊₋]+/g, (run) => moved(run, DOWN, '_'))
    .replaceAll(BEYOND, (sign) => LETTERS[sign] ?? sign)
    .normalize('NFD')
    .replaceAll(/[\u0300-\u036f]/g, '')
    .replaceAll(BEYOND, '?');
}
