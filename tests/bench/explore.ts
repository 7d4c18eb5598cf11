import { aroundOf, handoversOf } from '../../src/explore/handovers/handovers.ts';
import { knobsOf } from '../../src/explore/knobs/knobs.ts';
import { movesOf } from '../../src/explore/moves/index.ts';
import { BY_WEIGHT } from '../../src/explore/rack/best.ts';
import { rankedRack } from '../../src/explore/rack/ranked.ts';
import { gradesOf, speciesOf } from '../../src/timber/index.ts';
import type { Member, Product, Stock } from '../../src/timber/member.ts';
import { memberOf } from '../support/session.ts';
import { median } from './median.ts';

const RUNS = 25;
const FEET = 12;
const SIZES = 1000;

let sink = 0;

/** Median and least milliseconds of a task, warmed up. */
function timed(task: () => number): string {
  const times: number[] = [];
  for (let run = 0; run < 2 * RUNS; run += 1) {
    const began = performance.now();
    sink += task();
    if (run >= RUNS) times.push(performance.now() - began);
  }
  return `${median(times).toFixed(2)} ms, least ${Math.min(...times).toFixed(2)} ms`;
}

/** Woods of every product until their sizes are a thousand. */
function manyWoods(): Stock[] {
  const products: Product[] = ['glulam', 'dimension lumber', 'timber', 'machine stress rated', 'LVL'];
  return products.flatMap((product) =>
    (product === 'LVL' ? [''] : speciesOf(product)).flatMap((species) =>
      gradesOf(product, species).map(
        (grade): Stock => ({ product, species, grade, values: null, valuesFrom: null }),
      ),
    ),
  );
}

/** A member with woods on its rack up to about a thousand sizes. */
function mixed(member: Member): Member {
  const rack: Stock[] = [];
  for (const stock of manyWoods()) {
    const more = { ...member, rack: [...rack, stock] };
    if (rankedRack(more).sizes.length > SIZES) continue;
    rack.push(stock);
  }
  return { ...member, rack };
}

/** The rack of a thousand sizes, moves and handovers, each of a simple span and of three spans. */
export async function run(): Promise<void> {
  const simple = memberOf({ spans: ['16 ft'], bracing: 'ends' });
  const three = memberOf({
    spans: ['14 ft', '16 ft', '12 ft'],
    area: { dead: '12 psf', live: '40 psf', snow: '25 psf' },
    bracing: 'ends',
  });
  for (const [name, member] of [
    ['simple span', simple],
    ['three spans', three],
  ] as const) {
    const many = mixed(member);
    const count = rankedRack(many).sizes.length;
    // A fresh object each time, as a nudge makes it: nothing kept for the member helps.
    console.log(
      `${name}: mixed rack of ${count} sizes: ${timed(() => rankedRack({ ...many }).lit)} (aim 3 ms)`,
    );
    console.log(`${name}: moves: ${timed(() => movesOf({ ...member }).moves.length)} (aim 50 ms)`);
    for (const [key, from, to] of [
      ['spans.0', 6 * FEET, 24 * FEET],
      ['area.live', 0, 120 / 144],
    ] as const) {
      const knob = knobsOf(member).find((each) => each.key === key)!.number!;
      const sweep = () => handoversOf({ ...member }, knob.put, from, to).length;
      const around = () =>
        aroundOf({ ...member }, knob, knob.get(member), { ranking: BY_WEIGHT }).above?.at ?? 0;
      console.log(`${name}: handovers along ${key}: ${timed(sweep)} (aim 50 ms)`);
      console.log(`${name}: next on each side along ${key}: ${timed(around)}`);
    }
  }
  if (!Number.isFinite(sink)) throw new Error('the tasks gave no numbers');
}
