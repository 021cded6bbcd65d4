/** @module Foreign text inside a message: quoted, on one line, short, without control characters. */

const LONGEST = 60;

/** `"text"`, cut in the middle when long. */
export function quote(text: string): string {
  const cut = text.length > LONGEST ? `${text.slice(0, 40)}… (${text.length} characters)` : text;
  // Control, format and line-separating characters would act on the terminal.
  const clean = cut.replace(/[\p{Cc}\p{Cf}\p{Zl}\p{Zp}\p{Cs}]/gu, (c) => {
    if (c === '\n') return '\\n';
    if (c === '\t') return '\\t';
    return `\\u${c.codePointAt(0)!.toString(16).padStart(4, '0')}`;
  });
  return `"${clean}"`;
}
