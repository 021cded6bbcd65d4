/** @module Text in HTML. */

const ESCAPES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

export const html = (text: string): string => text.replace(/[&<>"']/g, (c) => ESCAPES[c]!);

/** JSON inside a script element: nothing in it may end the element. */
export const scriptJson = (value: unknown): string => JSON.stringify(value, null, 1).replaceAll('<', '\\u003c');
