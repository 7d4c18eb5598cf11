import { compileEffects } from '../../src/loads/index.ts';
import { LOAD_KINDS } from '../../src/loads/kinds.ts';
import { prepare, rate, woodOf } from '../../src/timber/index.ts';
import type { Member } from '../../src/timber/member.ts';
import { roomForRatios } from '../../src/timber/report.ts';
import { memberOf } from '../support/session.ts';
import { median } from './median.ts';

const ROUNDS = 15;
const WARM_UP = 20;

/** A continuous beam with an overhang at either end, every kind on it and this many loads, half of them points. */
function beam(spans: number, loads: number, wood: object = {}): Member {
  const length = 10 * spans + 6;
  return memberOf({
    ...wood,
    spans: Array(spans).fill('10 ft'),
    overhangs: { left: '3 ft', right: '3 ft' },
    area: Object.fromEntries(LOAD_KINDS.map((kind, at) => [kind, `${10 + at} psf`])),
    loads: Array.from({ length: loads }, (_, at) => {
      const kind = LOAD_KINDS[at % LOAD_KINDS.length];
      const place = ((at + 0.5) * length) / loads;
      return at % 2 === 0
        ? { kind, point: '400 lb', at: `${place} ft` }
        : { kind, line: '50 plf', from: `${place * 0.8} ft`, to: `${place} ft` };
    }),
  });
}

function millis(run: () => void): number {
  for (let at = 0; at < WARM_UP; at += 1) run();
  const rounds = Array.from({ length: ROUNDS }, () => {
    const began = performance.now();
    run();
    return performance.now() - began;
  });
  return median(rounds);
}

/** One full evaluation of large beams: search over combinations and patterns, then every check. */
export function run(): void {
  const ratios = roomForRatios();
  const simple = memberOf({});
  console.log(
    `search of a simple span: ${(1000 * millis(() => compileEffects(simple, { heaviest: 16, deadFactor: 0.5 }))).toFixed(0)} µs`,
  );
  let before: { time: number; size: number } | null = null;
  for (const [spans, loads] of [
    [2, 25],
    [4, 50],
    [6, 100],
  ] as const) {
    const member = beam(spans, loads);
    const wood = woodOf(member);
    const time = millis(() => rate(prepare({ ...member }), wood, member.section, ratios));
    const size = spans * loads;
    const growth =
      before === null
        ? ''
        : `, cost x${(time / before.time).toFixed(1)} for spans x loads x${size / before.size}`;
    const aim = loads === 100 ? ' (aim 5 ms)' : '';
    console.log(
      `full evaluation, ${spans} spans, ${loads} loads, all kinds and patterns: ${time.toFixed(2)} ms${aim}${growth}`,
    );
    before = { time, size };
    if (loads === 100)
      console.log(
        `the same of glulam, CV by the worst pattern: x${(glulam(spans, loads) / time).toFixed(1)}`,
      );
  }
}

function glulam(spans: number, loads: number): number {
  const stock = { product: 'glulam', species: 'Western species', grade: '24F-1.8E' };
  const member = beam(spans, loads, { stock, section: { width: '5.125 in', depth: '24 in' } });
  const wood = woodOf(member);
  const ratios = roomForRatios();
  return millis(() => rate(prepare({ ...member }), wood, member.section, ratios));
}
