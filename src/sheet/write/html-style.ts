import type { Paper } from '../../session/session.ts';
import type { Fact } from '../sheet.ts';
import { cssString } from './escape-html.ts';

/** Ink on paper: passing and failing are told by words and by the weight of a border, never by colour alone. */
export const STYLE = `
:root { color-scheme: light; }
body { font: 15px/1.45 "DejaVu Sans", Verdana, system-ui, sans-serif; color: #111; background: #fff; max-width: 62rem; margin: 0 auto; padding: 1.5rem; }
h1 { font-size: 1.5rem; } h2 { font-size: 1.3rem; border-top: 3px solid #111; padding-top: .6rem; margin-top: 3rem; }
h3 { font-size: 1.1rem; margin: 1.6rem 0 .4rem; } h4 { font-size: 1rem; margin: 1.2rem 0 .3rem; } h5 { font-size: .9rem; margin: .8rem 0 .2rem; }
h1, h2, h3, h4, h5, p, li, dd, figcaption, .long { overflow-wrap: anywhere; }
a { color: #0b3d91; }
dl { display: flex; flex-wrap: wrap; gap: .3rem 1.6rem; margin: .4rem 0; }
dl div { display: flex; gap: .5rem; min-width: 0; } dt { color: #444; } dt::after { content: ":"; } dd { margin: 0; font-weight: 600; min-width: 0; }
.title-block { border: 1px solid #111; padding: .5rem .8rem; }
.verdict { border: 2px solid #111; padding: .4rem .8rem; margin: .6rem 0; } .verdict p { margin: .2rem 0; font-size: 1.1rem; }
.verdict.fails { border-width: 5px; }
.inputs { display: grid; grid-template-columns: repeat(auto-fill, minmax(17rem, 1fr)); gap: .1rem 1.6rem; } .caption { font-weight: 600; font-size: .9rem; margin-bottom: .2rem; }
.table { overflow-x: auto; margin: .8rem 0; }
table { border-collapse: collapse; font-size: .9rem; } caption { text-align: left; font-weight: 600; padding-bottom: .2rem; }
th, td { text-align: left; vertical-align: top; padding: .15rem .6rem .15rem 0; border-bottom: 1px solid #bbb; font-weight: 400; }
thead th { border-bottom: 1px solid #111; color: #333; } .right { text-align: right; } tr.strong > * { font-weight: 700; }
figure { margin: 1rem 0; } figcaption { font-size: .9rem; color: #333; } svg { width: 100%; height: auto; }
.line { margin: .1rem 0 .1rem 1rem; padding-left: 1.5rem; text-indent: -1.5rem; } .note { color: #444; } .clause { color: #333; font-style: italic; }
`;

/** How it is printed: the paper, the title block and the page number on every page, nothing torn apart. */
export function printRules(titleBlock: readonly Fact[], paper: Paper): string {
  const running = titleBlock.map(([label, value]) => `${label} ${value}`).join('   ');
  return `
@page { size: ${paper}; margin: 20mm 15mm 18mm; @top-left { content: ${cssString(running)}; font: 8pt "DejaVu Sans", Verdana, sans-serif; vertical-align: bottom; padding-bottom: 3mm; width: 100%; } @bottom-right { content: counter(page) " of " counter(pages); font: 8pt "DejaVu Sans", Verdana, sans-serif; } }
@media print {
body { font-size: 9.5pt; max-width: none; padding: 0; margin: 0; } nav { display: none; }
section[id] { break-before: page; } #job { break-before: auto; } h2 { margin-top: 0; }
h2, h3, h4, h5, caption { break-after: avoid; } figure, .verdict, tr, .line { break-inside: avoid; } thead { display: table-header-group; }
.table { overflow: visible; } table { font-size: 8.5pt; } a { color: inherit; text-decoration: none; }
}
`;
}
