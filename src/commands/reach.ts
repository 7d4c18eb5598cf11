import { type Rack, rackOf, sectionOf } from '../explore/rack.ts';
import { type Reach, reachFinder } from '../explore/reach.ts';
import { harmless, showSpanDown, type Units } from '../quantity/index.ts';
import { woodOf } from '../timber/index.ts';
import type { Member } from '../timber/member.ts';
import { load, type SessionOptions, theMember } from './load.ts';
import { closing, heading, notChecked } from './prose.ts';
import { sizeCells, sizeColumns, sizeJson } from './rack.ts';
import { STATUS } from './status.ts';
import { table } from './table.ts';

/** `thrice reach FILE --member NAME`: the longest span of each stock size. Status 0 when some size passes as it is. */
export function reach(file: string, options: SessionOptions, print: (text: string) => void): number {
  const loaded = load(file, options);
  const { member } = theMember(loaded, file);
  const rack = rackOf(member, loaded.only);
  const find = reachFinder(member, woodOf(member), loaded.only);
  const reaches = rack.sizes.map(({ size, refused }) =>
    refused === null ? find(sectionOf(member, size)) : null,
  );
  if (options.json === true) {
    const sizes = rack.sizes.map((each, at) => ({
      ...sizeJson(member, each, loaded.only),
      span: reaches[at]?.span ?? null,
      stops: reaches[at]?.stops ?? null,
    }));
    const lightest = rack.sizes[rack.lightest]?.size.label ?? null;
    print(
      `${JSON.stringify({ thrice: 1, ...notChecked(loaded.only).json, member: member.name, lightest, sizes }, null, 2)}\n`,
    );
  } else {
    const lines = [
      ...heading(loaded.session),
      ...notChecked(loaded.only).lines,
      '',
      ...reachText(member, rack, reaches, loaded.units),
      '',
      ...closing(),
    ];
    print(`${lines.join('\n')}\n`);
  }
  return rack.lightest >= 0 ? STATUS.yes : STATUS.no;
}

function reachText(member: Member, rack: Rack, reaches: readonly (Reach | null)[], units: Units): string[] {
  return [
    `${harmless(member.name)}  ${member.stock.species} ${member.stock.grade}`,
    ...table(
      [
        ...sizeColumns(units).slice(0, -1),
        { head: 'reach', align: 'right' },
        { head: 'stopped there by', align: 'left' },
      ],
      rack.sizes.map((each, at) => [
        ...sizeCells(each, at === rack.lightest, units).slice(0, -1),
        spanText(reaches[at] ?? null, units),
        each.refused ?? reaches[at]?.stops ?? '',
      ]),
    ),
  ];
}

function spanText(reach: Reach | null, units: Units): string {
  if (reach === null) return '';
  return reach.span === 0 ? 'none' : showSpanDown(reach.span, units);
}
