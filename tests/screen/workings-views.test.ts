import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { exponentsOf } from '../../src/explore/exponents.ts';
import { ASKS_NOTHING } from '../../src/explore/powers.ts';
import { pageOf } from '../../src/explore/workings/index.ts';
import { answerOf } from '../../src/screen/answer.ts';
import { diagramsView } from '../../src/screen/diagrams-view.ts';
import { glyphsOf } from '../../src/screen/draw/glyphs.ts';
import { drawState } from '../../src/screen/draw-state.ts';
import { headroomView } from '../../src/screen/headroom-view.ts';
import { moveInHand, movesNow } from '../../src/screen/moves-view.ts';
import { memberOf, type State, withMember } from '../../src/screen/state.ts';
import { viewOf } from '../../src/screen/view-model.ts';
import { workingsSubject } from '../../src/screen/workings-subject.ts';
import type { CheckId } from '../../src/timber/report.ts';
import { WORKINGS_WORD, type WorkingLine } from '../../src/timber/workings/index.ts';
import { pressing, stateOf } from '../support/state.ts';
import { memberOf as bare, NO_AREA } from '../timber/member-of.ts';
import { member } from '../timber/workings/any-member.ts';

function shown(state: State): string[] {
  const { canvas } = drawState(state, glyphsOf('unicode'));
  return Array.from({ length: canvas.rows }, (_, y) => canvas.text(y));
}

/** The page in front. */
function front(state: State): { readonly title: string; readonly lines: readonly WorkingLine[] } {
  if (state.mode.name !== 'workings') throw new Error('no workings are open');
  const { member: whose, about, ids } = workingsSubject(state, state.mode.from);
  return pageOf(whose, ids[state.mode.page]!, 'us', about);
}

function result(lines: readonly WorkingLine[], symbol: string): string {
  const found = lines.find((each) => each.symbol === symbol);
  if (found?.result === undefined) throw new Error(`no line ${symbol}`);
  return found.result;
}

/** "1.284 psi" as the number that it begins with, in so many decimals. */
function rounded(text: string, places: number): string {
  return Number.parseFloat(text).toFixed(places);
}

const STOREY = {
  headroom: { floorToFloor: '9 ft', clear: '7 ft', floor: '1.5 in', joists: '9.25 in', ceiling: '0.625 in' },
};

describe('w within a view', () => {
  it.each([
    ['moves', ['m'], 'workings of deepen: what changes'],
    ['handovers', ['H'], 'workings: handovers'],
    ['diagrams', ['v'], 'workings: shear, moment and deflection at the cursor'],
    ['compare', ['p', 'right', 'c'], 'workings of pin 1: '],
    ['reach', ['e'], 'workings: reach'],
    ['headroom', ['h'], 'workings: headroom'],
    ['proportions', ['='], 'workings: crossovers'],
    ['buying', ['$'], 'workings: what to buy'],
  ])('of %s opens on its own page, and Escape leads back to the very same view', (name, keys, title) => {
    const view = pressing(stateOf([{ name: 'B1' }]), ...keys).state;
    expect(view.mode.name).toBe(name);
    const opened = pressing(view, 'w').state;
    expect(opened.mode.name).toBe('workings');
    expect(shown(opened)[0]).toContain(title.replace('deepen', movesName(view)));
    for (const key of ['escape', 'w', 'q']) {
      const back = pressing(opened, 'right', 'down', key).state;
      expect(back.mode).toBe(view.mode);
      expect(shown(back)).toEqual(shown(view));
      expect(back.session).toBe(view.session);
    }
  });

  it('of a link opens on the reactions of the member that is carried', () => {
    const members = [{ name: 'J1' }, { name: 'G1', links: [{ member: 'J1', end: 'left', at: '3 ft' }] }];
    const view = pressing(stateOf(members, { member: 1 }), 'K').state;
    const opened = pressing(view, 'w').state;
    expect(shown(opened)[0]).toContain('workings of J1: reactions');
    expect(pressing(opened, 'escape').state.mode).toBe(view.mode);
  });

  it('of the trail opens on what the change in hand did', () => {
    const view = pressing(stateOf(), 'right', 'd', 'right', 'T', 'up').state;
    expect(view.mode.name).toBe('trail');
    const opened = pressing(view, 'w').state;
    expect(shown(opened)[0]).toContain('workings of then: what changes');
    expect(shown(opened).join('\n')).toContain('span = 14\'-3"  before: 14\'-0"');
    expect(pressing(opened, 'escape').state.mode).toBe(view.mode);
  });

  it('of choosing wood opens with Ctrl W, for letters begin to type there', () => {
    const view = pressing(stateOf(), 'y').state;
    expect(pressing(view, 'w').state.mode).toMatchObject({ name: 'wood', edit: { text: 'w' } });
    const opened = pressing(view, 'ctrl+w').state;
    expect(shown(opened)[0]).toContain('workings of as chosen: design values');
    expect(pressing(opened, 'escape').state.mode).toBe(view.mode);
  });

  it('of a wood that is still being chosen shows no page that is no number, whatever was chosen', () => {
    const KEYS = ['up', 'down', 'left', 'right', 'shift+left', 'shift+right', ' '];
    fc.assert(
      fc.property(
        fc.array(fc.constantFrom(...KEYS), { maxLength: 25 }),
        fc.integer({ min: 0, max: 25 }),
        (keys, pages) => {
          const opened = pressing(stateOf(), 'y', ...keys, 'ctrl+w', ...Array(pages).fill('right')).state;
          expect(opened.mode.name).toBe('workings');
          const text = shown(opened).join('\n');
          expect(text).toContain('workings of as chosen');
          expect(text).not.toMatch(/NaN|Infinity|undefined/);
          expect(shown(pressing(opened, 'l').state).join('\n')).toContain('every page');
        },
      ),
      { numRuns: 30 },
    );
  });

  it('with scatter told opens on the scatter', () => {
    const opened = pressing(stateOf(), 'z', 'w').state;
    expect(front(opened).title).toBe('scatter of stiffness');
    expect(front(pressing(stateOf(), 'w').state).title).toContain('bending');
  });

  it('turns the units of the view it goes back to as well', () => {
    const view = pressing(stateOf(), 'H').state;
    const back = pressing(view, 'w', 'i', 'escape').state;
    expect(back.mode).toMatchObject({ name: 'handovers', strip: null });
    expect(back.session.units).toBe('si');
  });

  function movesName(view: State): string {
    return view.mode.name === 'moves' ? moveInHand(movesNow(view), view.mode)!.kind : '';
  }
});

describe('the list of pages', () => {
  it('names every page with the ratio of each check, and opens the one that is chosen', () => {
    const opened = pressing(stateOf(), 'w', 'l').state;
    const { ids } = workingsSubject(opened, { name: 'explore' });
    const text = shown(opened).join('\n');
    expect(text).toContain('bending 1.651');
    expect(text).toContain('handovers');
    const chosen = pressing(opened, 'down', 'down', 'enter').state;
    expect(chosen.mode).toMatchObject({ name: 'workings', page: 2, line: null });
    expect(pressing(opened, 'end', 'enter').state.mode).toMatchObject({ page: ids.length - 1 });
    expect(pressing(opened, 'down', 'escape').state.mode).toMatchObject({ page: 0, line: null });
  });

  it.each([
    [80, 24],
    [120, 36],
  ])('reads so at %d x %d', async (columns, rows) => {
    const opened = pressing(stateOf([{}], { columns, rows }), 'w', 'l', 'down', 'down').state;
    await expect(shown(opened).join('\n')).toMatchFileSnapshot(
      `./frames/workings-list-${columns}x${rows}.txt`,
    );
    const diagrams = pressing(stateOf([{}], { columns, rows }), 'v', 'w').state;
    await expect(shown(diagrams).join('\n')).toMatchFileSnapshot(
      `./frames/workings-diagrams-${columns}x${rows}.txt`,
    );
    const move = pressing(stateOf([{}], { columns, rows }), 'm', 'w').state;
    await expect(shown(move).join('\n')).toMatchFileSnapshot(`./frames/workings-move-${columns}x${rows}.txt`);
  });
});

describe('the numbers on the screen are those of their pages', () => {
  it('of the gauges, what a nudge changes, the others and the ruler, for any member', () => {
    fc.assert(
      fc.property(member, (each) => {
        const start = withMember(stateOf(), each);
        const nudged = pressing(start, 'right').state;
        const view = viewOf(nudged);
        const now = memberOf(nudged);
        const answer = answerOf(now);
        const page = (id: CheckId) => pageOf(now, id, 'us').lines;
        for (const [at, { check, ratio }] of answer.powers.entries()) {
          if (check === null || ratio === null || !Number.isFinite(ratio)) continue;
          expect(view.gauges[at]!.ratio).toBe(ratio);
          expect(Math.abs(Number(result(page(check), 'ratio')) - ratio)).toBeLessThan(5.1e-4);
        }
        for (const { label, ratio } of view.others) {
          const id = answer.others.find((one) => one.ratio === ratio)!.id;
          if (Number.isFinite(ratio)) {
            expect(Math.abs(Number(result(page(id), 'ratio')) - ratio), label).toBeLessThan(5.1e-4);
          } else expect(result(page(id), 'ratio')).toBe('untied');
        }
        const { lines: crossed } = pageOf(now, 'crossovers', 'us');
        expect(Number(result(crossed, 'l/h')) / view.ruler.now).toBeCloseTo(1, 4);
        if (view.ruler.standsTo !== null && answer.worst > ASKS_NOTHING)
          expect(Number(result(crossed, 'l/h that it stands to')) / view.ruler.standsTo).toBeCloseTo(1, 4);
      }),
      { numRuns: 25 },
    );
  });

  it('of the ruler where one check asks so little that it is rounding, and another more', () => {
    const each = bare({
      beam: {
        spans: [12, 12, 96.625, 12],
        overhangs: { left: 0, right: 0 },
        supports: 'bearings',
        fixed: { left: false, right: true },
      },
      tributary: 0,
      area: NO_AREA,
      selfWeight: false,
      loads: [{ type: 'point', kind: 'dead', at: 2.3e-7, load: 1e-6 }],
    });
    const { powers, standsTo } = answerOf(each);
    const ratios = powers.map(({ ratio }) => ratio ?? 0);
    expect(Math.min(...ratios)).toBeLessThan(ASKS_NOTHING);
    expect(Math.max(...ratios)).toBeGreaterThan(ASKS_NOTHING);
    const { lines } = pageOf(each, 'crossovers', 'us');
    expect(Number(result(lines, 'l/h that it stands to')) / standsTo!).toBeCloseTo(1, 4);
  });

  it('of what a nudge changes, beside the gauges', () => {
    const nudged = pressing(stateOf(), 'right', 'right').state;
    const { lines } = pageOf(memberOf(nudged), 'change', 'us', workingsSubject(nudged, nudged.mode).about);
    for (const { label, nudge } of viewOf(nudged).gauges) {
      const word = label === 'deflection' ? WORKINGS_WORD['deflection-total'] : label;
      const live = lines.find((one) => one.symbol === WORKINGS_WORD['deflection-live']);
      const found =
        label === 'deflection' && live !== undefined
          ? [result(lines, word), live.result!]
          : [result(lines, word)];
      expect(found.map((text) => rounded(text, 3))).toContain(nudge!.toFixed(3));
    }
  });

  it('of the diagrams at any place of the cursor', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 9 }), fc.constantFrom(0, 1, 2), (steps, turns) => {
        const keys = ['v', 'home', ...Array(steps).fill('}'), ...Array(turns).fill('down')];
        const state = pressing(stateOf([{ spans: ['12 ft', '9 ft'] }]), ...keys).state;
        const { mode } = state;
        if (mode.name !== 'diagrams') throw new Error('no diagrams');
        const view = diagramsView(state, mode.at, mode.which);
        const { lines } = front(pressing(state, 'w').state);
        for (const [plot, symbol, places] of [
          [view.plots[0]!, 'V', 0],
          [view.plots[1]!, 'M', 0],
          [view.plots[2]!, 'deflection', 2],
        ] as const) {
          const results = lines.filter((one) => one.symbol === symbol).map((one) => one.result!);
          const read = plot.reading.map((text) => (text.endsWith(' up') ? -1 : 1) * Number.parseFloat(text));
          const near = (value: number) =>
            results.some((text) => Math.abs(Number.parseFloat(text) - value) <= 0.51 * 10 ** -places);
          for (const value of read)
            expect(near(value), `${symbol} ${value} of ${results.join(', ')}`).toBe(true);
        }
      }),
      { numRuns: 20 },
    );
  });

  it('of a move, its ratios after', () => {
    const view = pressing(stateOf(), 'm').state;
    if (view.mode.name !== 'moves') throw new Error('no moves');
    const move = moveInHand(movesNow(view), view.mode)!;
    const opened = pressing(view, 'w').state;
    const subject = workingsSubject(opened, view.mode);
    expect(subject.member).toBe(move.member);
    const last = pageOf(subject.member, move.governing!, 'us', subject.about).lines.at(-1)!;
    expect(Math.abs(Number(last.result) - move.worst)).toBeLessThan(5.1e-4);
  });

  it('of a pin, its own checks and not those of the design at hand', () => {
    const pinned = pressing(stateOf(), 'p', '}', 'c').state;
    const opened = pressing(pinned, 'w').state;
    const { member: whose, about, ids } = workingsSubject(opened, pinned.mode);
    expect(whose.beam.spans[0]).toBe(168);
    expect(about.before).toBe(memberOf(pinned));
    expect(pageOf(whose, ids[0]!, 'us', about).title).toContain('bending 1.651');
  });

  it('of the headroom: what is left, and by how much it is over', () => {
    const state = pressing(stateOf([STOREY]), 'h').state;
    if (state.mode.name !== 'headroom') throw new Error('no headroom');
    // 108 - 1.5 - 9.25 - 0.625 - 84 = 12.625 in, by hand.
    expect(headroomView(state, state.mode).sentence).toBe('left 12 5/8", it fits');
    expect(result(front(pressing(state, 'w').state).lines, 'depth left')).toBe('12.625 in');
  });

  it('of the local exponents', () => {
    const state = stateOf();
    const { lines } = pageOf(memberOf(state), 'exponents', 'us');
    const own = exponentsOf(memberOf(state)).bending!;
    const from = lines.findIndex((one) => one.heading === WORKINGS_WORD.bending);
    expect(lines.slice(from + 1, from + 5).map((one) => Number(one.result!.replace('+', '')))).toEqual(
      [own.span, own.depth, own.width, own.load].map((each) => Number(each.toFixed(3))),
    );
  });

  it('of an uplift that nothing holds down: untied, in the gauges, the verdict and the workings', () => {
    const state = stateOf([
      { spans: ['14 ft', '4 ft'], area: { dead: '5 psf', live: '60 psf' }, selfWeight: false },
    ]);
    const view = viewOf(state);
    expect(view.verdict.reason).toMatch(/^Uplift at support \d stops it: it is untied\.$/);
    expect(shown(state).join('\n')).toMatch(/uplift .*untied/);
    const { lines, title } = pageOf(memberOf(state), 'uplift', 'us');
    expect(title).toMatch(/^uplift untied: /);
    expect(result(lines, 'ratio')).toBe('untied');
  });
});
