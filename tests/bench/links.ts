import type { State } from '../../src/screen/state.ts';
import { update } from '../../src/screen/update.ts';
import { readSession, type Session, sessionDocument } from '../../src/session/index.ts';
import { FLOOR_BEAM } from '../support/session.ts';
import { press, stateOf } from '../support/state.ts';
import { median } from './median.ts';

const MEMBERS = 500;
const ROUNDS = 30;

/** Each stands with its left end on the end of the next, so that a nudge of the first is felt undiminished to the last. */
function chain(): object[] {
  return Array.from({ length: MEMBERS }, (_, at) => ({
    ...FLOOR_BEAM,
    name: `M${at}`,
    ...(at === 0 ? {} : { links: [{ member: `M${at - 1}`, end: 'left', at: '0 ft' }] }),
  }));
}

/** Twenty joists of two spans; 384 girders, all of which carry the first of them; 96 beams of two spans under four girders each. */
function house(): object[] {
  const joist = (at: number) => ({ ...FLOOR_BEAM, name: `J${at}`, spans: ['12 ft', '10 ft'] });
  const girder = (at: number) => ({
    ...FLOOR_BEAM,
    name: `G${at}`,
    links: ['left', 1, 'right'].map((end) => ({ member: 'J0', end, every: '16 in' })),
  });
  const beam = (at: number) => ({
    ...FLOOR_BEAM,
    name: `B${at}`,
    spans: ['8 ft', '8 ft'],
    links: [0, 1, 2, 3].map((each) => ({
      member: `G${4 * at + each}`,
      end: 'right',
      at: `${2 + 4 * each} ft`,
    })),
  });
  const many = (count: number, make: (at: number) => object) =>
    Array.from({ length: count }, (_, at) => make(at));
  return [...many(20, joist), ...many(384, girder), ...many(96, beam)];
}

function sessionOf(members: object[]): Session {
  const read = readSession(JSON.stringify({ thrice: 1, title: 'Bench', members }), 'bench.json');
  if (!read.ok) throw new Error(read.fault);
  return read.session;
}

/** A nudge of the first member, which the others stand on, through the one function that changes the explorer's state. */
function nudges(name: string, members: object[]): void {
  const session = sessionOf(members);
  const times: number[] = [];
  const works: number[] = [];
  let felt = 0;
  let state: State = { ...stateOf(), session, kept: session };
  for (let round = 0; round < ROUNDS; round += 1) {
    const key = { type: 'key', press: press('right'), time: round * 5000 } as const;
    const before = { at: performance.now(), cpu: process.cpuUsage() };
    const after = update(state, key).state;
    times.push(performance.now() - before.at);
    const { user, system } = process.cpuUsage(before.cpu);
    works.push((user + system) / 1000);
    felt = after.session.members.filter(
      ({ member }, at) => member !== state.session.members[at]!.member,
    ).length;
    state = after;
  }
  const figure = (value: number) => `${value.toFixed(1)} ms`;
  console.log(
    `  ${name}: a nudge ${figure(median(times))}, of the processor ${figure(median(works))}, the first ${figure(works[0]!)}; ${felt} of ${members.length} members changed (aim: 100 ms)`,
  );
}

/** How long a change takes to reach all that carry it; beside it, writing the same session once. */
export function run(): void {
  console.log('links');
  nudges('a chain', chain());
  nudges('a house', house());
  const session = sessionOf(chain());
  const began = performance.now();
  for (let round = 0; round < 5; round += 1) sessionDocument(session);
  console.log(`  writing the chain once: ${((performance.now() - began) / 5).toFixed(1)} ms`);
}
