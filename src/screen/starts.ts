import { KIND_WORD, LOAD_KINDS } from '../loads/kinds.ts';
import { showInches, showQuantity, showSpan, type Units } from '../quantity/index.ts';
import { MEMBER_KINDS, type MemberKind } from '../session/index.ts';
import { LIMITS_BY_USE } from '../timber/member.ts';
import type { StartMode } from './mode.ts';
import { ALL_KEYS, type FootView } from './view.ts';

/** A line of the start that can be taken in hand. */
export type StartLine =
  | { readonly is: 'kind'; readonly kind: MemberKind }
  | { readonly is: 'sample'; readonly index: number }
  | { readonly is: 'file'; readonly file: string }
  /** A file whose name is typed. */
  | { readonly is: 'path' };

export interface StartView {
  readonly title: string;
  /** Headings, and lines that can be taken in hand. */
  readonly rows: readonly StartRow[];
  /** Index of the row in hand. */
  readonly inHand: number;
  readonly foot: readonly FootView[];
  /** Why the last answer will not do. */
  readonly fault: string | null;
  /** What is asked, and what may be typed; null while a line is chosen. */
  readonly question: { readonly asks: string; readonly hint: string } | null;
}

export type StartRow =
  | { readonly heading: string }
  | { readonly key: string; readonly text: string; readonly about: string };

/** Everything that a start offers: a new member of each kind and, where there is no session yet, what to open. */
export function startLines({ offers, addTo }: Pick<StartMode, 'offers' | 'addTo'>): StartLine[] {
  const kinds = MEMBER_KINDS.map((kind): StartLine => ({ is: 'kind', kind }));
  if (addTo !== null) return kinds;
  return [
    ...kinds,
    ...offers.samples.map((_, index): StartLine => ({ is: 'sample', index })),
    ...offers.files.map((file): StartLine => ({ is: 'file', file })),
    { is: 'path' },
  ];
}

export function startView(mode: StartMode, units: Units): StartView {
  const rows: StartRow[] = [];
  let inHand = 0;
  let part = '';
  for (const [at, line] of startLines(mode).entries()) {
    const heading = HEADING[line.is];
    if (heading !== part) rows.push({ heading });
    part = heading;
    if (at === mode.line) inHand = rows.length;
    rows.push(rowOf(line, at, mode, units));
  }
  return {
    title: mode.addTo === null ? 'where to begin' : 'a member to add',
    rows,
    inHand,
    foot: [
      { keys: '↑↓', does: 'choose' },
      { keys: 'Enter', does: 'take it' },
      { keys: 'Esc', does: mode.addTo === null ? 'leave' : 'back' },
      ...(mode.step === 'choose' ? [ALL_KEYS] : []),
    ],
    fault: mode.fault,
    question: questionOf(mode, units),
  };
}

const HEADING: Readonly<Record<StartLine['is'], string>> = {
  kind: 'New. What is it part of?',
  sample: 'Open a sample',
  file: 'Open a file',
  path: 'Open a file',
};

function rowOf(line: StartLine, at: number, { offers }: StartMode, units: Units): StartRow {
  switch (line.is) {
    case 'kind':
      return { key: String(at + 1), text: line.kind.name, about: beginsWith(line.kind, units) };
    case 'sample': {
      const { title, members } = offers.samples[line.index]!;
      return { key: '', text: title, about: `${members} members` };
    }
    case 'file':
      return { key: '', text: line.file, about: '' };
    case 'path':
      return { key: '', text: 'another', about: 'its name is typed' };
  }
}

/** What a kind of member begins with: "dead 12 psf, live 40 psf; l/360, l/240; every 16"". */
function beginsWith({ area, use, spacing, service }: MemberKind, units: Units): string {
  const loads = LOAD_KINDS.filter((kind) => area[kind] > 0).map(
    (kind) => `${KIND_WORD[kind]} ${showQuantity('areaLoad', area[kind], units)}`,
  );
  const { live, total } = LIMITS_BY_USE[use];
  return [
    loads.join(', '),
    `l/${live}, l/${total}`,
    ...(spacing === null ? [] : [`every ${showInches(spacing, units)}`]),
    ...(service === 'wet' ? ['wet'] : []),
  ].join('; ');
}

function questionOf(mode: StartMode, units: Units): StartView['question'] {
  const examples = units === 'us' ? `14-6, 14'6", 14.5, 4.4m` : '4.4, 4400mm, 14-6';
  switch (mode.step) {
    case 'choose':
      return null;
    case 'file':
      return { asks: 'Which file?', hint: 'as job.json or ../job.json; Enter opens it, Esc goes back' };
    case 'span': {
      const { supports } = MEMBER_KINDS[mode.line]!;
      const asks = supports === 'cantilever' ? 'How far does it reach out?' : 'How far does it span?';
      return { asks, hint: `in ${units === 'us' ? 'feet' : 'm'}, or any unit: ${examples}` };
    }
    case 'width': {
      const { spacing } = MEMBER_KINDS[mode.line]!;
      const spans = showSpan(mode.span, units);
      if (spacing === null)
        return { asks: `It spans ${spans}. What width does it carry?`, hint: `in any unit: ${examples}` };
      const usual = showInches(spacing, units);
      return { asks: `It spans ${spans}. How far apart are they?`, hint: `as ${usual}; Enter takes that` };
    }
  }
}
