import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { pageIds, pageOf } from '../../src/explore/workings/index.ts';
import { glyphsOf } from '../../src/screen/draw/glyphs.ts';
import { drawState } from '../../src/screen/draw-state.ts';
import { memberOf, type State } from '../../src/screen/state.ts';
import { workingsRows, wrapText } from '../../src/sheet/workings-rows.ts';
import { reportMember } from '../../src/timber/index.ts';
import { CHECK_IDS } from '../../src/timber/report.ts';
import { pressing, stateOf } from '../support/state.ts';
import { member } from '../timber/workings/any-member.ts';

const SIZES = [
  [80, 24],
  [120, 36],
] as const;

function shown(state: State, kind: 'unicode' | 'ascii' = 'unicode'): string[] {
  const { canvas } = drawState(state, glyphsOf(kind));
  return Array.from({ length: canvas.rows }, (_, y) => canvas.text(y));
}

const HEADER = {
  name: 'H1',
  spans: ['10\'-3"'],
  bearing: '3 in',
  area: { dead: '15 psf', live: '40 psf', snow: '25 psf' },
  section: { width: '1.5 in', depth: '9.25 in', plies: 2 },
  bracing: 'ends',
};

describe('the workings view', () => {
  it.each(SIZES)('reads so at %d x %d', async (columns, rows) => {
    const opened = pressing(stateOf([HEADER], { columns, rows }), 'w').state;
    await expect(shown(opened).join('\n')).toMatchFileSnapshot(`./frames/workings-${columns}x${rows}.txt`);
    const lower = pressing(opened, 'pagedown').state;
    await expect(shown(lower).join('\n')).toMatchFileSnapshot(
      `./frames/workings-lower-${columns}x${rows}.txt`,
    );
    const si = pressing(opened, 'i').state;
    await expect(shown(si, 'ascii').join('\n')).toMatchFileSnapshot(
      `./frames/workings-si-ascii-${columns}x${rows}.txt`,
    );
    const ids = pageIds(memberOf(opened), 'us');
    const crossovers = pressing(opened, ...Array(ids.indexOf('crossovers')).fill('right')).state;
    await expect(shown(crossovers).join('\n')).toMatchFileSnapshot(
      `./frames/workings-crossovers-${columns}x${rows}.txt`,
    );
  });

  it('opens on what governs with one key, and comes back with Escape to the same state', () => {
    const start = stateOf([HEADER]);
    const opened = pressing(start, 'w').state;
    const governing = reportMember(memberOf(start)).governing!;
    expect(pageIds(memberOf(start), 'us')[0]).toBe(governing);
    expect(shown(opened)[0]).toContain(pageOf(memberOf(start), governing, 'us').title);
    for (const key of ['escape', 'w', 'enter', 'ctrl+c']) {
      const back = pressing(opened, key);
      expect(back.state.mode.name).toBe('explore');
      expect(back.state.session).toBe(start.session);
      expect(back.effects).toEqual([]);
    }
  });

  it('reaches every check and every basis by stepping, and comes round', () => {
    const start = pressing(stateOf([HEADER]), 'w').state;
    const ids = pageIds(memberOf(start), 'us');
    for (const { id } of reportMember(memberOf(start)).checks) expect(ids).toContain(id);
    for (const id of ['loads', 'design values', 'l/h', 'crossovers', 'exponents', 'reach', 'rack'] as const) {
      expect(ids).toContain(id);
    }
    let state = start;
    const titles = ids.map(() => {
      const title = shown(state)[0];
      state = pressing(state, 'tab').state;
      return title;
    });
    expect(new Set(titles).size).toBe(ids.length);
    expect(shown(state)[0]).toBe(titles[0]);
    expect(shown(pressing(state, 'left').state)[0]).toBe(titles.at(-1));
    expect(shown(pressing(state, 'shift+tab').state)[0]).toBe(titles.at(-1));
  });

  it('scrolls to its last line and no further', () => {
    const opened = pressing(stateOf([HEADER], { columns: 80, rows: 24 }), 'w').state;
    const end = pressing(opened, 'end').state;
    expect(shown(end).slice(2, -1).join('\n')).toContain('ratio = ');
    expect(shown(pressing(end, 'down', 'pagedown').state)).toEqual(shown(end));
    expect(shown(pressing(end, 'home').state)).toEqual(shown(opened));
  });

  it('shows nothing of a beam that a rule forbids but the rule', () => {
    const state = pressing(
      stateOf([{ notch: { left: '2 in', right: '0 in' }, section: { width: '1.5 in', depth: '11.25 in' } }]),
      'w',
    ).state;
    expect(shown(state).join('\n')).not.toContain('NaN');
  });
});

describe('the rows of workings', () => {
  it('of any member are never wider than asked, cut no word that fits, and keep every word', () => {
    fc.assert(
      fc.property(member, fc.constantFrom(58, 78, 100), (each, width) => {
        for (const id of pageIds(each, 'us').filter((page) =>
          (CHECK_IDS as readonly string[]).includes(page),
        )) {
          const { lines } = pageOf(each, id, 'us');
          const rows = workingsRows(lines, width).map(({ text }) => text);
          for (const row of rows) expect(row.length).toBeLessThanOrEqual(width);
          const words = (texts: readonly string[]) =>
            texts
              .flatMap((text) => text.split(' '))
              .filter((word) => word !== '' && word !== '=')
              .sort();
          expect(words(rows)).toEqual(words(lines.flatMap((line) => Object.values(line))));
        }
      }),
      { numRuns: 40 },
    );
  });

  it('cut a word only where it is longer than the row', () => {
    expect(wrapText('ab cdefghij kl', 4)).toEqual(['ab', 'cdef', 'ghij', 'kl']);
    expect(wrapText('ab cd ef', 5, 2)).toEqual(['ab cd', '  ef']);
    expect(wrapText('', 10)).toEqual([]);
  });
});
