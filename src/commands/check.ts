import { type Checked, checkedMember } from '../explore/checked.ts';
import { crossovers } from '../explore/crossovers.ts';
import { exponentsOf } from '../explore/exponents.ts';
import { powersOf } from '../explore/powers.ts';
import { spanToDepthOf } from '../explore/span-to-depth.ts';
import { harmless, showRatio, type Units } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import { lengthsText, measuredText, placeText } from '../timber/member-words.ts';
import { CHECK_IDS, type CheckId } from '../timber/report.ts';
import { carriersText, linksJson } from './links.ts';
import { type Loaded, load, type SessionOptions } from './load.ts';
import { beside, closing, heading, notChecked, wrapped } from './prose.ts';
import { STATUS } from './status.ts';
import { table } from './table.ts';
import { pagesJson, type Written, workingsJson, workingsTexts } from './workings.ts';

export interface CheckOptions extends SessionOptions {
  /** The calculation behind each check. */
  readonly workings?: boolean;
}

/** `thrice check FILE`: each member's checks, what governs, pass or fail. Status 0 when every member passes. */
export function check(file: string, options: CheckOptions, print: (text: string) => void): number {
  const loaded = load(file, options);
  const json = options.json === true;
  // JSON is the same whatever the units of the session.
  const words = json ? 'us' : loaded.units;
  const results = loaded.members.map(({ member }) => checkedMember(member, loaded.only, words));
  const workings = options.workings === true;
  if (json) {
    const members = results.map((result) => ({
      ...memberJson(result, workings ? writtenFor(loaded, result) : null),
      ...linksJson(loaded.session, result.member.name),
    }));
    const document = { thrice: 1, ...notChecked(loaded.only).json, members };
    print(`${JSON.stringify(document, null, 2)}\n`);
  } else {
    print(`${memberTexts(loaded, results, workings).join('\n')}\n`);
  }
  return results.every((result) => result.passes) ? STATUS.yes : STATUS.no;
}

/** JSON has no Infinity: a ratio that nothing can meet is null. */
function finite(value: number): number | null {
  return Number.isFinite(value) ? value : null;
}

/** How the calculations of a member are written. */
function writtenFor({ session, units }: Loaded, { checks }: Checked): Written {
  return { checks: checks.map(({ id }) => id), ranking: rankingOf(session), job: session.members, units };
}

/** `workings`: how to write the calculations; null leaves them out. */
function memberJson(
  { member, report, checks, passes, governing, ratios }: Checked,
  workings: Written | null,
) {
  const exponents = exponentsOf(member);
  const spanToDepth = spanToDepthOf(member);
  const [shear, bending, deflection] = powersOf(ratios).map((power) => power.ratio ?? 0);
  return {
    name: report.name,
    section: {
      label: report.label,
      width: report.width,
      depth: report.depth,
      plies: report.plies,
      weight: report.weight,
    },
    passes,
    governing,
    spanToDepth,
    crossovers: crossovers(spanToDepth, shear!, bending!, deflection!),
    checks: checks.map((each) => ({
      id: each.id,
      ratio: finite(each.ratio),
      demand: each.demand,
      capacity: each.capacity,
      unit: each.unit,
      combination: each.combination,
      pattern: each.pattern,
      ...(SUPPORT_CHECKS.includes(each.id) ? { support: each.place } : { span: each.place }),
      at: each.at,
      clause: each.clause,
      factors: Object.fromEntries(each.factors.map(({ symbol, value }) => [symbol, value])),
      exponents: exponents[each.id] ?? null,
      ...(workings === null ? {} : { workings: workingsJson(member, each.id, workings.units) }),
    })),
    advice: report.advice,
    reactions: report.analysed().reactions.map(({ at, byKind, max, min }) => ({ at, byKind, max, min })),
    analysis: report.analysed().analysis,
    assumptions: report.assumptions,
    cautions: report.cautions,
    ...(workings === null ? {} : { workings: pagesJson(member, workings) }),
  };
}

const SUPPORT_CHECKS: readonly CheckId[] = ['bearing', 'uplift', 'notch'];

function memberTexts(loaded: Loaded, results: readonly Checked[], workings: boolean): string[] {
  const lines = [...heading(loaded.session), ...notChecked(loaded.only).lines];
  for (const result of results) {
    lines.push('', ...memberText(result, loaded.units));
    lines.push(...carriersText(loaded.session, result.member.name, loaded.units, '  '));
    if (workings) lines.push(...workingsTexts(result.member, writtenFor(loaded, result)));
  }
  const failing = results.filter((result) => !result.passes).length;
  if (results.length > 1)
    lines.push(
      '',
      failing === 0 ? `all ${results.length} members pass` : `${failing} of ${results.length} members fail`,
    );
  return [...lines, '', ...closing()];
}

function memberText({ member, report, checks, passes, governing }: Checked, units: Units): string[] {
  const title = beside([
    harmless(member.name),
    report.label,
    `${member.stock.species} ${member.stock.grade}`,
    lengthsText(member, units),
  ]);
  const rows = [...checks]
    .sort((a, b) => CHECK_IDS.indexOf(a.id) - CHECK_IDS.indexOf(b.id))
    .map((each) => [
      `${each.id === governing ? '>' : ' '} ${each.id}`,
      measuredText(each, each.demand, units),
      measuredText(each, each.capacity, units),
      showRatio(each.ratio),
      each.combination,
      placeText(each, units),
    ]);
  return [
    ...title.map((line, at) => `${at > 0 ? '      ' : passes ? 'PASSES' : 'FAILS '}  ${line}`),
    ...table(
      [
        { head: '  check', align: 'left' },
        { head: 'demand', align: 'right' },
        { head: 'capacity', align: 'right' },
        { head: 'ratio', align: 'right' },
        { head: 'loads', align: 'left' },
        { head: 'at', align: 'left' },
      ],
      rows,
    ),
    ...report.cautions.flatMap((caution) => wrapped(`beware: ${caution.text}`, '  ')),
    ...(report.assumptions.length > 0 ? wrapped(`assumed: ${report.assumptions.join('; ')}`, '  ') : []),
  ];
}
