import { handoversOf, type Segment } from '../explore/handovers/handovers.ts';
import { type Sweep, sweepsOf } from '../explore/handovers/sweep.ts';
import { BEST_WORD } from '../explore/rack/best.ts';
import { rackOf, sizeName } from '../explore/rack/rack.ts';
import type { QuantityKind } from '../quantity/index.ts';
import { harmless, quoted, showSpanDown, type Units } from '../quantity/index.ts';
import { rankingOf } from '../session/index.ts';
import type { Member } from '../timber/member.ts';
import { woodName } from '../timber/member-words.ts';
import { nearestName } from '../timber/nearest-name.ts';
import { printAnswer } from './answer.ts';
import { load, type SessionOptions, theMember } from './load.ts';
import { beside, given, wrapped } from './prose.ts';
import { woodJson } from './rack.ts';
import { BadInput, STATUS } from './status.ts';
import { table } from './table.ts';

export interface HandoverOptions extends SessionOptions {
  readonly knob: string;
  readonly from: string;
  readonly to: string;
}

/** What JSON is in, by kind. */
const BASE_UNIT: Readonly<Record<QuantityKind, string>> = {
  length: 'in',
  areaLoad: 'psi',
  lineLoad: 'lb/in',
  pointLoad: 'lb',
  stress: 'psi',
  area: 'in2',
  number: '',
};

/** `thrice handovers FILE --member NAME --knob KEY --from A --to B`: which size is best from where to where. */
export function handovers(file: string, options: HandoverOptions, print: (text: string) => void): number {
  const loaded = load(file, options);
  const { member, written } = theMember(loaded, file);
  const sweep = sweepBy(member, written, options.knob);
  const [from, to] = [
    end(sweep, 'from', options.from, loaded.units),
    end(sweep, 'to', options.to, loaded.units),
  ];
  if (!(from < to)) {
    throw new BadInput(
      `--from ${harmless(options.from)} --to ${harmless(options.to)}: the range must go from less to more`,
    );
  }
  const ranking = rankingOf(loaded.session);
  const segments = handoversOf(member, sweep.put, from, to, { ranking, only: loaded.only });
  const rack = rackOf(member, loaded.only);
  const name = (segment: Segment) => (segment.size === null ? null : sizeName(rack, segment.size));
  printAnswer(loaded, member, options.json, print, {
    document: () => {
      return {
        member: member.name,
        knob: sweep.key,
        unit: BASE_UNIT[sweep.kind],
        best: ranking.best,
        ...given(member).json,
        segments: segments.map((segment) => ({
          from: segment.from,
          to: segment.to,
          size: segment.size?.label ?? null,
          ...(segment.size !== null && rack.woods.length > 1 ? { wood: woodJson(segment.size.stock) } : {}),
        })),
      };
    },
    lines: () => {
      const show = (value: number) =>
        sweep.kind === 'length' && SPANS.test(sweep.key)
          ? showSpanDown(value, loaded.units)
          : sweep.show(value, loaded.units);
      return [
        ...beside([harmless(member.name), ...rack.woods.map(woodName)]),
        `${BEST_WORD[ranking.best]} size that passes along ${sweep.label}, ${show(from)} to ${show(to)}`,
        '',
        ...strip(segments, from, to),
        ...table(
          [
            { head: '', align: 'left' },
            { head: 'from', align: 'right' },
            { head: 'to', align: 'right' },
            { head: 'size', align: 'left' },
          ],
          segments.map((segment, at) => [
            letter(at),
            show(segment.from),
            show(segment.to),
            name(segment) ?? 'none passes',
          ]),
        ),
      ];
    },
  });
  return STATUS.yes;
}

/** Spans are never overstated. */
const SPANS = /^spans\.\d+$/;

function sweepBy(member: Member, written: unknown, key: string): Sweep {
  const sweeps = sweepsOf(member, loadEnds(written));
  const plain = key.replace(/\[(\d{1,4})\]/g, '.$1');
  const found = sweeps.find((each) => each.key === plain);
  if (found !== undefined) return found;
  if (plain.startsWith('section.')) {
    throw new BadInput(
      `--knob ${quoted(key)}: each size of the rack has its own; spans.0, area.live or maxDepth would be`,
    );
  }
  const keys = sweeps.map((each) => each.key);
  const near = nearestName(plain.slice(0, 60), keys);
  throw new BadInput(
    `--knob ${quoted(key)}: is no number of this member; ${near === null ? `there are ${keys.slice(0, 12).join(', ')}` : `the nearest is ${near}`}`,
  );
}

/** Of which loads and links the file states where they end. */
function loadEnds(written: unknown): { to: boolean }[] {
  const record = (written ?? {}) as {
    readonly loads?: readonly object[];
    readonly links?: readonly object[];
  };
  const placed = [...(record.loads ?? []), ...(record.links ?? [])];
  return placed.map((each) => ({ to: Object.hasOwn(each, 'to') }));
}

function end(sweep: Sweep, which: 'from' | 'to', text: string, units: Units): number {
  const read = sweep.read(text, units);
  if ('fault' in read) throw new BadInput(`--${which} ${quoted(text)}: ${read.fault}`);
  return read.value;
}

const STRIP = 76;

/** The range as a bar, a letter for each stretch that is wide enough to see. */
function strip(segments: readonly Segment[], from: number, to: number): string[] {
  let bar = '';
  for (const [at, segment] of segments.entries()) {
    const until = Math.round((STRIP * (segment.to - from)) / (to - from));
    const width = until - bar.length;
    if (width <= 0) continue;
    const fill = segment.size === null ? ' ' : '-';
    bar +=
      width < 2 ? letter(at) : `|${letter(at)}${fill.repeat(width - letter(at).length - 1)}`.slice(0, width);
  }
  return [...wrapped(`${bar}|`), ''];
}

const LETTERS = 'abcdefghijklmnopqrstuvwxyz';

/** a to z, then a2, b2 and so on. */
function letter(at: number): string {
  const round = Math.floor(at / LETTERS.length);
  return `${LETTERS[at % LETTERS.length]}${round === 0 ? '' : round + 1}`;
}
