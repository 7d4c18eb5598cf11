import { describe, expect, it } from 'vitest';
import { drawState } from '../../src/screen/draw-state.ts';
import { saidAfter } from '../../src/screen/ear/said.ts';
import type { OpenAnswer } from '../../src/screen/effect.ts';
import type { Offers } from '../../src/screen/mode.ts';
import { startWith } from '../../src/screen/modes/start.ts';
import { memberOf, type State } from '../../src/screen/state.ts';
import { MEMBER_KINDS, writeSession } from '../../src/session/index.ts';
import { afterEvents, pressing, stateOf } from '../support/state.ts';
import { ascii, frame, unicode } from './panels/support.ts';

const OFFERS: Offers = {
  samples: [
    { title: 'Boathouse', members: 7 },
    { title: 'Market hall', members: 24 },
  ],
  files: ['garage.json', `${'long '.repeat(30)}\u001b[2J.json`],
};
const EMPTY = { title: '', units: 'us', combinations: 'ASCE 7-16', members: [] } as const;
const empty = (offers = OFFERS): State =>
  stateOf([{}], { session: EMPTY, kept: null, file: null, mode: startWith(offers), columns: 80, rows: 24 });
const shown = (state: State, columns = 80, rows = 24, glyphs = unicode) =>
  frame(drawState({ ...state, columns, rows }, glyphs).canvas);
const downTo = (line: number) => Array<string>(line).fill('down');
const FIRST_SAMPLE = MEMBER_KINDS.length;
const FIRST_FILE = FIRST_SAMPLE + OFFERS.samples.length;

describe('an empty start', () => {
  for (const [columns, rows] of [
    [60, 18],
    [80, 24],
    [120, 36],
  ] as const) {
    it(`offers new, samples and files at ${columns}x${rows} as in its frame`, async () => {
      const lines = `${shown(empty(), columns, rows).join('\n')}\n`;
      await expect(lines).toMatchFileSnapshot(`./frames/start-${columns}x${rows}.txt`);
    });
  }

  it('fits every screen at every line, also without signs, whatever files are called', () => {
    for (const [columns, rows] of [
      [60, 18],
      [220, 60],
    ] as const) {
      for (let line = 0; line <= FIRST_FILE + OFFERS.files.length; line += 1) {
        for (const keys of [downTo(line), [...downTo(line), 'enter', 'x', 'enter']]) {
          const lines = shown(pressing(empty(), ...keys).state, columns, rows, ascii);
          expect(lines).toHaveLength(rows);
          for (const each of lines) expect(each).toMatch(/^[\x20-\x7e]*$/);
          for (const each of lines) expect(each.length).toBeLessThanOrEqual(columns);
          if (keys.length === line) expect(lines.some((each) => each.startsWith(' >'))).toBe(true);
        }
      }
    }
  });

  it('makes a sized beam of each kind, with the usual spacing where Enter answers', () => {
    for (const [at, { name, use, spacing }] of MEMBER_KINDS.entries()) {
      const keys = [String(at + 1), '8', 'enter', ...(spacing === null ? ['4'] : []), 'enter'];
      const { state } = pressing(empty(), ...keys);
      expect(state.mode.name, name).toBe('explore');
      expect(memberOf(state)).toMatchObject({ use, tributary: spacing ?? 48 });
      expect(state.kept).toBeNull();
      expect(() => writeSession(state.session)).not.toThrow();
    }
  });

  it('goes back a question with Esc, and leaves at the first', () => {
    const at = (...keys: string[]) => pressing(empty(), ...keys).state.mode;
    expect(at('2', '8', 'enter', 'escape')).toMatchObject({ step: 'span' });
    expect(at('2', 'escape')).toMatchObject({ step: 'choose', line: 1 });
    expect(pressing(empty(), 'escape').effects).toEqual([{ do: 'leave' }]);
  });

  it('asks for what shall be opened, a sample, a file here or one whose name is typed', () => {
    const asked = (...keys: string[]) =>
      pressing(empty(), ...keys).effects.filter((each) => each.do === 'open');
    expect(asked(...downTo(FIRST_SAMPLE + 1), 'enter')).toEqual([{ do: 'open', what: { sample: 1 } }]);
    expect(asked(...downTo(FIRST_FILE), 'enter')).toEqual([{ do: 'open', what: { file: 'garage.json' } }]);
    expect(asked('end', 'enter', ...'../a.json', 'enter')).toEqual([
      { do: 'open', what: { file: '../a.json' } },
    ]);
    expect(asked('end', 'enter', 'enter')).toEqual([]);
    expect(shown(pressing(empty(), 'end', 'enter', 'enter').state).join('\n')).toContain(
      'type the name of a session file',
    );
  });

  it('goes on in what was opened, nothing to be kept or undone yet; else tells why not and waits', () => {
    const { session } = stateOf([{ name: 'J1' }]);
    const opened = (answer: OpenAnswer) => afterEvents(empty(), { type: 'opened', answer }).state;
    const found = {
      ok: true,
      session,
      file: 'a.json',
      readOnly: null,
      recovered: null,
      notice: null,
    } as const;
    expect(opened(found)).toMatchObject({
      mode: { name: 'explore' },
      file: 'a.json',
      kept: session,
      past: [],
    });
    const before = { session, time: 0, isOlder: false };
    expect(opened({ ...found, recovered: before }).mode).toMatchObject({
      name: 'recovered',
      recovered: before,
    });
    const faulty = opened({ ok: false, fault: 'a.json: no such file' });
    expect(shown(faulty).join('\n')).toContain('a.json: no such file');
    expect(pressing(faulty, 'down').state.mode).toMatchObject({ fault: null });
  });

  it('is read by ear', () => {
    const said = saidAfter(null, empty()).join(' ');
    expect(said).toContain('In hand: 1, girder, dead 12 psf, live 40 psf');
    expect(said).toContain('Market hall, 24 members');
  });
});
