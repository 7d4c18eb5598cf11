import type { Reach } from '../explore/reach/reach.ts';
import { type SpanTable, spanTable } from '../explore/reach/span-table.ts';
import { KIND_WORD, LOAD_KINDS } from '../loads/kinds.ts';
import {
  harmless,
  parseQuantity,
  quoted,
  showInches,
  showQuantity,
  showSpan,
  showSpanDown,
  type Units,
} from '../quantity/index.ts';
import { standingDepth, standingWidth } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { woodName } from '../timber/member-words.ts';
import { CHECK_IDS, type CheckId } from '../timber/report.ts';
import { CHECK_WORD } from '../timber/words.ts';
import { printAnswer } from './answer.ts';
import { load, type SessionOptions, theMember } from './load.ts';
import { beside, given, wrapped } from './prose.ts';
import { woodJson } from './rack.ts';
import { BadInput, STATUS } from './status.ts';
import { table } from './table.ts';

export interface SpansOptions extends SessionOptions {
  readonly spacings: string;
}

/** `thrice spans FILE --member NAME --spacings 12,16,24`: the span table of a grade, to print. Status 0 when done. */
export function spans(file: string, options: SpansOptions, print: (text: string) => void): number {
  const loaded = load(file, options);
  const { member } = theMember(loaded, file);
  const spacings = readSpacings(options.spacings, loaded.units);
  const found = spanTable(member, spacings, loaded.only);
  printAnswer(loaded, member, options.json, print, {
    document: () => {
      return {
        member: member.name,
        ...woodJson(member.stock),
        ...given(member).json,
        spacings,
        sizes: found.rows.map(({ size, weight, reaches }) => ({
          label: size.label,
          width: standingWidth({ ...size, flat: member.section.flat }),
          depth: standingDepth({ ...size, flat: member.section.flat }),
          plies: size.plies,
          weight,
          spans: reaches.map((reach) => reach?.span ?? null),
          stops: reaches.map((reach) => reach?.stops ?? null),
        })),
      };
    },
    lines: () => spansText(member, found, loaded.units),
  });
  return STATUS.yes;
}

const MOST_SPACINGS = 24;
const LEAST_SPACING = 1;
const MOST_SPACING = 50 * 12;

/** "12,16,24": inches, or millimetres where the units are SI; each may have its own unit. */
function readSpacings(text: string, units: Units): number[] {
  const parts = text.split(',').map((part) => part.trim());
  if (parts.length > MOST_SPACINGS)
    throw new BadInput(`--spacings: ${parts.length} are given; it takes at most ${MOST_SPACINGS}`);
  return parts.map((part) => {
    const parsed = parseQuantity('length', part, units === 'us' ? 'in' : 'mm');
    if (!parsed.ok) throw new BadInput(`--spacings ${quoted(text)}: ${parsed.fault}`);
    if (!(parsed.value >= LEAST_SPACING && parsed.value <= MOST_SPACING)) {
      throw new BadInput(`--spacings ${quoted(part)}: is out of range; it must be 1 in to 50 ft`);
    }
    return parsed.value;
  });
}

/** A column for each spacing, as many side by side as 80 columns hold. */
const BESIDE = 5;

function spansText(member: Member, { spacings, rows }: SpanTable, units: Units): string[] {
  const lines = [
    ...beside([harmless(member.name), woodName(member.stock), 'longest spans']),
    ...wrapped(loadsText(member, units)),
  ];
  for (let first = 0; first < spacings.length; first += BESIDE) {
    const shown = spacings.slice(first, first + BESIDE);
    lines.push(
      '',
      ...table(
        [
          { head: 'size', align: 'left' },
          ...shown.map((spacing) => ({ head: `${spacingText(spacing, units)}  `, align: 'right' }) as const),
        ],
        rows.map(({ size, reaches }) => [
          size.label,
          ...reaches.slice(first, first + BESIDE).map((reach) => cell(reach, units)),
        ]),
      ),
    );
  }
  const stops = CHECK_IDS.filter((id) =>
    rows.some(({ reaches }) => reaches.some((reach) => reach?.stops === id)),
  );
  return [
    ...lines,
    '',
    ...wrapped(`stopped by: ${stops.map((id) => `${LETTER[id]} ${CHECK_WORD[id]}`).join(', ')}`),
  ];
}

/** Spacings are spoken of in decimals: 19.2". */
function spacingText(spacing: number, units: Units): string {
  return units === 'us' ? `${Number(spacing.toFixed(2))}"` : showInches(spacing, units);
}

/** What stops a span, a letter behind it. */
const LETTER: Readonly<Record<CheckId, string>> = {
  shear: 's',
  bending: 'b',
  'bending-hogging': 'h',
  'deflection-live': 'd',
  'deflection-total': 't',
  bearing: 'r',
  slenderness: 'l',
  uplift: 'u',
  notch: 'n',
};

/** Rounded down, to the inch as span tables are; in SI to 5 mm. */
function cell(reach: Reach | null, units: Units): string {
  if (reach === null) return '-  ';
  if (reach.span === 0) return `none ${reach.stops === null ? ' ' : LETTER[reach.stops]}`;
  const text = units === 'us' ? showSpan(Math.floor(reach.span), units) : showSpanDown(reach.span, units);
  return `${text} ${reach.stops === null ? ' ' : LETTER[reach.stops]}`;
}

function loadsText(member: Member, units: Units): string {
  const area = LOAD_KINDS.filter((kind) => member.area[kind] > 0).map(
    (kind) => `${KIND_WORD[kind]} ${showQuantity('areaLoad', member.area[kind], units)}`,
  );
  const { live, total } = member.limits;
  const parts = [...area, `live l/${live}`, `total l/${total}`, member.service];
  if (member.loads.length > 0) parts.push('its line and point loads');
  if ((member.links ?? []).length > 0) parts.push('what it carries of other members');
  const several = member.beam.spans.length > 1 ? '; the longest of its spans, all by one factor' : '';
  return `${parts.join(', ')}${several}`;
}
