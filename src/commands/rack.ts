import { ratiosById } from '../explore/judge.ts';
import { powersOf } from '../explore/powers.ts';
import { type Rack, type RackSize, rackOf } from '../explore/rack.ts';
import { harmless, showRatio, showSpan, type Units, weightNumber, weightUnit } from '../quantity/index.ts';
import { standingDepth, standingWidth } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import type { CheckId } from '../timber/report.ts';
import { load, type SessionOptions, theMember } from './load.ts';
import { closing, heading, notChecked } from './prose.ts';
import { STATUS } from './status.ts';
import { type Column, table } from './table.ts';

/** `thrice rack FILE --member NAME`: the stock sizes, lightest first. Status 0 when some size passes. */
export function rack(file: string, options: SessionOptions, print: (text: string) => void): number {
  const loaded = load(file, options);
  const { member } = theMember(loaded, file);
  const sizes = rackOf(member, loaded.only);
  if (options.json === true) {
    print(
      `${JSON.stringify({ thrice: 1, ...notChecked(loaded.only).json, ...rackJson(member, sizes, loaded.only) }, null, 2)}\n`,
    );
  } else {
    const lines = [
      ...heading(loaded.session),
      ...notChecked(loaded.only).lines,
      '',
      ...rackText(member, sizes, loaded.units),
      '',
      ...closing(),
    ];
    print(`${lines.join('\n')}\n`);
  }
  return sizes.lightest >= 0 ? STATUS.yes : STATUS.no;
}

function rackJson(member: Member, { sizes, lightest }: Rack, only: readonly CheckId[] | null) {
  return {
    member: member.name,
    lightest: sizes[lightest]?.size.label ?? null,
    sizes: sizes.map((each) => sizeJson(member, each, only)),
  };
}

/** One size as rack and reach print it. */
export function sizeJson(member: Member, each: RackSize, only: readonly CheckId[] | null) {
  const { size } = each;
  const byId = each.refused === null ? ratiosById(each.ratios, only) : {};
  const ratios = Object.fromEntries(
    Object.entries(byId).map(([id, ratio]) => [id, Number.isFinite(ratio) ? ratio : null]),
  );
  return {
    label: size.label,
    width: standingWidth({ ...size, flat: member.section.flat }),
    depth: standingDepth({ ...size, flat: member.section.flat }),
    plies: size.plies,
    product: member.stock.product,
    species: member.stock.species,
    grade: member.stock.grade,
    weight: each.weight,
    boardFeet: size.boardFeet,
    passes: each.passes,
    governing: each.governing,
    ratios,
    ...(each.refused === null ? {} : { refused: each.refused }),
  };
}

/** Heads of the columns that rack and reach share. */
export function sizeColumns(units: Units): Column[] {
  return [
    { head: '', align: 'left' },
    { head: 'size', align: 'left' },
    { head: weightUnit(units), align: 'right' },
    { head: 'shear', align: 'right' },
    { head: 'bending', align: 'right' },
    { head: 'deflection', align: 'right' },
    { head: 'stopped by', align: 'left' },
  ];
}

/** Cells of the columns that rack and reach share. */
export function sizeCells(each: RackSize, lit: boolean, units: Units): string[] {
  const powers = each.refused === null ? powersOf(each.ratios) : null;
  const ratio = (at: 0 | 1 | 2) => (powers?.[at].ratio == null ? '' : showRatio(powers[at].ratio));
  return [
    lit ? '*' : '',
    each.size.label,
    weightNumber(each.weight, units),
    ratio(0),
    ratio(1),
    ratio(2),
    lit ? 'lightest' : (each.refused ?? (each.passes ? '' : (each.governing ?? 'no load'))),
  ];
}

function rackText(member: Member, { sizes, lightest }: Rack, units: Units): string[] {
  const { stock, beam } = member;
  return [
    `${harmless(member.name)}  ${stock.species} ${stock.grade}  ${beam.spans.map((span) => showSpan(span, units)).join(', ')}`,
    ...table(
      sizeColumns(units),
      sizes.map((each, at) => sizeCells(each, at === lightest, units)),
    ),
    lightest < 0 ? 'no size passes' : `lightest that passes: ${sizes[lightest]!.size.label}`,
  ];
}
