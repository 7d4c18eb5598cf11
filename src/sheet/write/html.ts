import type { Paper } from '../../session/session.ts';
import type { WorkingLine } from '../../timber/workings/index.ts';
import type { Block, Fact, Row, Section, Sheet, Table, Verdict } from '../sheet.ts';
import { escapeHtml } from './escape-html.ts';
import { printRules, STYLE } from './html-style.ts';
import { svg } from './svg.ts';

/** Columns of a drawing. */
const COLUMNS = 110;

/** The sheet as one HTML file that needs nothing beside itself: no script, no font, no picture of another place. */
export function writeHtml(sheet: Sheet, paper: Paper): string {
  const { sections, title, titleBlock } = sheet;
  return `<!DOCTYPE html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta http-equiv="Content-Security-Policy" content="default-src 'none'; style-src 'unsafe-inline'">
<title>${escapeHtml(title)}</title>
<style>${STYLE}${printRules(titleBlock, paper)}</style>
</head>
<body>
<header>
<h1>${escapeHtml(title)}</h1>
${facts(titleBlock, 'title-block')}
</header>
${navigation(sections)}
<main>
${sections.map(sectionHtml).join('\n')}
</main>
</body>
</html>
`;
}

function navigation(sections: readonly Section[]): string {
  const items = sections.map(({ id, title }) => `<li><a href="#${id}">${escapeHtml(title)}</a></li>`);
  return `<nav aria-label="Contents"><ul>\n${items.join('\n')}\n</ul></nav>`;
}

function sectionHtml({ id, title, blocks }: Section): string {
  const body = blocks.map((block, at) => blockHtml(block, `${id}-${at}`, title)).join('\n');
  return `<section id="${id}" aria-labelledby="${id}-title">\n<h2 id="${id}-title">${escapeHtml(title)}</h2>\n${body}\n</section>`;
}

/** `id`: of the block, for what refers to it; `of`: the section that it stands in. */
function blockHtml(block: Block, id: string, of: string): string {
  switch (block.kind) {
    case 'heading':
      return `<h3>${escapeHtml(block.text)}</h3>`;
    case 'verdict':
      return verdictHtml(block);
    case 'facts':
      return `<p class="caption">${escapeHtml(block.caption)}</p>\n${facts(block.facts, 'inputs')}`;
    case 'text':
      return `<p>${escapeHtml(block.text)}</p>`;
    case 'list':
      return `<ul>\n${block.items.map((item) => `<li>${escapeHtml(item)}</li>`).join('\n')}\n</ul>`;
    case 'table':
      return tableHtml(block, of);
    case 'picture':
      return [
        '<figure>',
        svg(block.draw(COLUMNS), block.caption, block.says, id),
        `<figcaption>${escapeHtml(block.caption)}</figcaption>`,
        '</figure>',
      ].join('\n');
    case 'workings':
      return [
        '<section class="workings">',
        `<h4>${escapeHtml(block.title)}</h4>`,
        ...workingsHtml(block.lines),
        '</section>',
      ].join('\n');
  }
}

function verdictHtml({ passes, word, sentence, facts: list }: Verdict): string {
  return `<div class="verdict ${passes ? 'passes' : 'fails'}">\n<p><strong>${escapeHtml(word)}</strong> ${escapeHtml(sentence)}</p>\n${facts(list, 'facts')}\n</div>`;
}

function facts(list: readonly Fact[], name: string): string {
  if (list.length === 0) return '';
  const pairs = list.map(
    ([label, value]) => `<div><dt>${escapeHtml(label)}</dt><dd>${escapeHtml(value)}</dd></div>`,
  );
  return `<dl class="${name}">${pairs.join('')}</dl>`;
}

/** A word that would push its table off the page. */
const LONG_WORD = /\S{15}/;

/** The region around a wide table scrolls, and so has to be reached by the keyboard. */
function tableHtml({ caption, columns, rows }: Table, of: string): string {
  // Only what holds a long word is broken within words: else short columns would be narrower than theirs.
  const look = (at: number, text: string) => {
    const names = [columns[at]!.align === 'right' ? 'right' : '', LONG_WORD.test(text) ? 'long' : ''];
    const list = names.filter((name) => name !== '').join(' ');
    return list === '' ? '' : ` class="${list}"`;
  };
  // A column without a head holds remarks: an empty head would tell a screen reader nothing.
  const heads = columns.map(({ head }, at) =>
    head === '' ? `<td${look(at, head)}></td>` : `<th scope="col"${look(at, head)}>${escapeHtml(head)}</th>`,
  );
  const cell = ({ leadsTo }: Row, text: string, at: number): string => {
    const written = escapeHtml(text);
    if (at > 0) return `<td${look(at, text)}>${written}</td>`;
    const led = leadsTo === undefined ? written : `<a href="#${leadsTo}">${written}</a>`;
    return `<th scope="row"${look(at, text)}>${led}</th>`;
  };
  const body = rows.map((row) => {
    const data = row.check === undefined ? '' : ` data-check="${row.check}"`;
    const name = row.strong === true ? ' class="strong"' : '';
    return `<tr${name}${data}>${row.cells.map((text, at) => cell(row, text, at)).join('')}</tr>`;
  });
  return [
    `<div class="table" role="region" aria-label="${escapeHtml(`${caption}: ${of}`)}" tabindex="0">`,
    `<table>\n<caption>${escapeHtml(caption)}</caption>`,
    `<thead><tr>${heads.join('')}</tr></thead>`,
    `<tbody>\n${body.join('\n')}\n</tbody>\n</table>\n</div>`,
  ].join('\n');
}

/** A calculation: its lines in order, each a paragraph, its parts told apart by equals signs as in print. */
function workingsHtml(lines: readonly WorkingLine[]): string[] {
  return lines.map((line) => {
    if (line.heading !== undefined) return `<h5>${escapeHtml(line.heading)}</h5>`;
    const { symbol, formula, numbers, result, clause = '', note = '' } = line;
    const chain = [symbol, formula, numbers, result].filter((part) => part !== undefined);
    return [
      '<p class="line">',
      chain.length === 0 ? '' : `<span class="chain">${escapeHtml(chain.join(' = '))}</span> `,
      note === '' ? '' : `<span class="note">${escapeHtml(note)}</span> `,
      clause === '' ? '' : `<span class="clause">${escapeHtml(clause)}</span>`,
      '</p>',
    ].join('');
  });
}
