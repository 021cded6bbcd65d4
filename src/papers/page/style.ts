/** @module The style sheet of the page: one column to read, wide tables that scroll, light, dark and print. */

export const STYLE = `
:root { color-scheme: light dark; --ink: #1c1c1c; --paper: #ffffff; --faint: #5c5c5c; --rule: #d0d0d0; --link: #14448c; --tint: #f2f4f8; }
@media (prefers-color-scheme: dark) {
  :root { --ink: #e6e6e6; --paper: #16181c; --faint: #a8a8a8; --rule: #3a3d44; --link: #8fb8f0; --tint: #1f2228; }
}
* { box-sizing: border-box; }
body { margin: 0 auto; max-width: 60rem; padding: 1.5rem; font: 1rem/1.55 Georgia, "DejaVu Serif", serif; color: var(--ink); background: var(--paper); }
h1, h2, h3, nav, table, figcaption, .facts { font-family: "DejaVu Sans", Verdana, sans-serif; }
h1 { font-size: 1.6rem; line-height: 1.25; margin: 0.5rem 0; }
h2 { font-size: 1.2rem; margin: 2.2rem 0 0.6rem; border-bottom: 1px solid var(--rule); padding-bottom: 0.2rem; }
h3 { font-size: 1rem; margin: 1.4rem 0 0.4rem; }
a { color: var(--link); }
a:focus-visible, [tabindex]:focus-visible, summary:focus-visible { outline: 3px solid var(--link); outline-offset: 2px; }
.skip { position: absolute; left: -999rem; }
.skip:focus { left: 1rem; top: 1rem; background: var(--paper); padding: 0.4rem; }
nav ol { columns: 16rem 2; padding-left: 1.4rem; font-size: 0.9rem; }
nav a { display: inline-block; min-height: 1.6rem; line-height: 1.6rem; }
.verdict { background: var(--tint); border-left: 4px solid var(--link); padding: 0.8rem 1rem; font-size: 1.15rem; }
.facts { display: grid; grid-template-columns: max-content 1fr; gap: 0.15rem 1rem; font-size: 0.9rem; margin: 0.6rem 0; }
.facts dt { color: var(--faint); }
.facts dd { margin: 0; overflow-wrap: anywhere; }
.scroll { overflow-x: auto; }
table { border-collapse: collapse; font-size: 0.82rem; margin: 0.4rem 0; min-width: 40%; }
caption { text-align: left; color: var(--faint); padding-bottom: 0.3rem; }
th, td { padding: 0.2rem 0.7rem 0.2rem 0; border-bottom: 1px solid var(--rule); text-align: left; vertical-align: top; }
thead th { border-bottom: 2px solid var(--ink); }
.n { text-align: right; font-variant-numeric: tabular-nums; white-space: nowrap; }
figure { margin: 1rem 0; }
figure svg { max-width: 100%; height: auto; background: #ffffff; }
figcaption, .notes { font-size: 0.85rem; color: var(--faint); }
.cautions li { margin: 0.2rem 0; }
math { font-size: 1.05em; }
.formula { margin: 0.5rem 0 0.5rem 1.5rem; overflow-x: auto; }
@media print {
  body { max-width: none; padding: 0; font-size: 10pt; color: #000000; background: #ffffff; }
  nav, .skip, .screen { display: none; }
  h2 { break-after: avoid; }
  figure, table { break-inside: avoid; }
  a { color: inherit; text-decoration: none; }
}
`;
