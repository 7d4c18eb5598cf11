import { describe, expect, it } from 'vitest';
import { Canvas } from '../../../src/screen/draw/canvas.ts';
import { drawChart } from '../../../src/screen/panels/chart.ts';
import { drawFoot } from '../../../src/screen/panels/foot.ts';
import { drawHelp, helpLines } from '../../../src/screen/panels/help.ts';
import { drawHandover, drawNotes, drawRemarks } from '../../../src/screen/panels/lines.ts';
import { drawMoves } from '../../../src/screen/panels/moves.ts';
import { drawTitle } from '../../../src/screen/panels/title.ts';
import { drawVerdict } from '../../../src/screen/panels/verdict.ts';
import type { View } from '../../../src/screen/view.ts';
import { ascii, drawn, frame, unicode } from './support.ts';
import { failing, longNames, passing } from './views.ts';

describe('the title', () => {
  const title = (view: View, columns: number) => drawn(columns, 1, (...to) => drawTitle(view, ...to)).rows[0];

  it('names session and member, and at the right the place in the list and whether it is kept', () => {
    expect(title(failing, 80)).toBe(
      ' thrice  Boathouse at Alder Cove / G1 deck girder                  2 of 7  kept',
    );
  });

  it('adds the method where there is room', () => {
    expect(title(failing, 100)).toMatch(/ASD, NDS 2018, dry {3}member 2 of 7 {3}kept$/);
  });

  it('shortens the session first, then the member, and stays in its row', () => {
    expect(title(longNames, 80)).toBe(
      ' thrice  The long… / Ridge ·  [31mgirder  over the…        120 of 500  not kept',
    );
  });
});

describe('the verdict', () => {
  const verdict = (view: View, columns: number, rows: number) =>
    drawn(columns, rows, (...to) => drawVerdict(view, ...to)).rows;

  it('goes on in the second of two rows rather than lose the ratio', () => {
    const reason = 'Bending over support 2 is nearest its limit at 0.69.';
    const long: View = { ...passing, verdict: { ...passing.verdict, reason, cures: ['A.'] } };
    expect(verdict(long, 60, 2)).toEqual([
      '  PASSES  Bending over support 2 is nearest its limit at',
      '          0.69. A.',
    ]);
    expect(verdict(long, 80, 2)[1]).toBe('          A.');
  });

  it('says the word, what stops it, and its cures below', () => {
    expect(verdict(failing, 80, 2)).toEqual([
      '  FAILS  Bending stops it at 1.28.',
      `         Lightest cure: (2) 2x14, 0.93. Or shorten to 13'-3".`,
    ]);
  });

  it('leaves a cure out whole where it does not fit', () => {
    expect(verdict(failing, 60, 2)[1]).toBe('         Lightest cure: (2) 2x14, 0.93.');
  });

  it('takes one row on wide screens, with as many cures that it has not told at the right as fit whole', () => {
    expect(verdict(failing, 120, 1)[0]).toMatch(/shorten to 13'-3"\. {4}a ply more 0\.87 · widen 1\.10$/);
    expect(verdict(passing, 120, 1)[0]).toMatch(/^ {2}PASSES {2}Bending is nearest, at 0\.93\. It would/);
  });
});

describe('the foot', () => {
  const foot = (view: View, columns: number, glyphs = unicode) =>
    drawn(columns, 1, (canvas, region) => drawFoot(view, canvas, region, glyphs)).rows[0];

  it('drops whole items from the end and always keeps the key that lists the others', () => {
    expect(foot(failing, 80)).toBe(` ↑↓ knob  ←→ nudge 3"  Shift x10  Enter type  u undo  m moves  ? keys`);
    expect(foot(failing, 24)).toBe(' ↑↓ knob  ? keys');
    expect(foot(failing, 10)).toBe(' ? keys');
  });

  it('names the arrow keys where there are no arrows', () => {
    expect(foot(failing, 80, ascii)).toMatch(/^ Up\/Down knob {2}Left\/Right nudge 3"/);
  });

  it('gives way to the message of the moment, cut after a word', () => {
    const notice = { text: 'the span ends at 100 ft: not nudged', style: 'governs' } as const;
    expect(foot({ ...failing, notice }, 60)).toBe(' the span ends at 100 ft: not nudged  ? keys');
    expect(foot({ ...failing, notice }, 30)).toBe(' the span ends at …  ? keys');
  });
});

describe('handover, remarks and moves', () => {
  it('stand whole, or without the last clauses, or not at all', () => {
    const handover = (columns: number) =>
      drawn(columns, 1, (canvas, region) => drawHandover(failing, canvas, region)).rows[0];
    expect(handover(80)).toMatch(/^ handover {2}\(2\) 2x14 is lightest .* above, 4x14$/);
    expect(handover(72)).toMatch(/^ \(2\) 2x14 is lightest .* above, 4x14$/);
    expect(handover(60)).toBe(` (2) 2x14 is lightest from 14'-4" to 15'-6"; below, 3x14`);
    expect(handover(56)).toBe(` handover  (2) 2x14 is lightest from 14'-4" to 15'-6"`);
    expect(handover(40)).toBe('');
  });

  it('take the next remark that fits when the first does not', () => {
    const view = { ...failing, remarks: ['x'.repeat(90), 'short enough'] };
    expect(drawn(80, 1, (canvas, region) => drawRemarks(view, canvas, region)).rows[0]).toBe(' short enough');
  });

  it('show every remark, wrapped, in a column of its own', () => {
    expect(drawn(36, 5, (...to) => drawNotes(failing, ...to)).rows).toEqual([
      ' assumed ───────────────────────────',
      ' assumed: top edge held throughout,',
      ' seasoned',
      ' preliminary sizing: local code and',
      ' a licensed professional decide',
    ]);
  });

  it('list what a change does and costs', () => {
    expect(drawn(46, 3, (...to) => drawMoves(failing, ...to)).rows).toEqual([
      ' moves ─────────────────── ratio ─────── cost',
      ' deepen      (2) 2x14       0.93   +1.4 lb/ft',
      ' a ply more  (3) 2x12       0.87   +3.9 lb/ft',
    ]);
  });
});

describe('the chart', () => {
  it('draws each power in its own line over the limit, with a bead on each at now', () => {
    expect(
      drawn(58, 13, (canvas, region, glyphs) => drawChart(failing, canvas, region, glyphs, { ruled: true }))
        .rows,
    ).toMatchInlineSnapshot(`
      [
        "────── ratio against span ────────────────────────────────",
        "     2│                                 ╔═══════²   ┏≡≡≡³",
        "      │                           ╔═════╝      ┏≡≡≡≡┛",
        "      │                     ╔══●══╝       ┏≡≡≡≡┛",
        "     1│┄┄┄┄┄┄┄┄┄┄┄┄┄┄┄╔═════╝┄┄┄┄┄┄┄┄┏≡≡≡≡┛┄┄┄┄┄┄┄┄┄┄┄┄┄",
        "      │           ╔═══╝          ┏≡≡≡┛",
        "      │      ╔════╝          ┏≡●≡┛                  ╭───¹",
        "    .5│  ╔═══╝           ┏≡≡≡┛       ╭──────────────╯",
        "      │══╝            ┏≡≡┛─────●─────╯",
        "      │        ╭──┏≡≡≡┛──╯",
        "   .25│  ──────╯≡≡┛",
        "      ┴────────────┴───────────▲───────────┴───────────┴",
        "    8'-0"       11'-6"      15'-0"      18'-6"      22'-0"",
      ]
    `);
  });

  it('draws the frame alone when the series have no values', () => {
    const empty = {
      ...failing,
      chart: { ...failing.chart!, series: [{ power: 1 as const, ratios: [Number.NaN, Number.NaN] }] },
    };
    const { rows } = drawn(58, 13, (canvas, region, glyphs) =>
      drawChart(empty, canvas, region, glyphs, { ruled: false }),
    );
    expect(rows.join('')).not.toContain('●');
    expect(rows[11]).toContain('▲');
  });
});

describe('the list of keys', () => {
  const sections = [
    {
      title: 'keys',
      lines: [
        ['↑↓', 'choose a knob'],
        ['q', 'leave; asks when the file is behind'],
      ],
    },
    {
      title: 'words',
      lines: [
        ['rack', 'the stock sizes of the chosen wood, lightest first,'],
        ['', 'with the lightest lit'],
      ],
    },
  ] as const;

  it('sets terms apart and wraps what they mean beside them', () => {
    expect(helpLines(sections, 40, unicode).map((line) => line.text.trimEnd())).toEqual([
      'keys',
      '  ↑↓    choose a knob',
      '  q     leave; asks when the file is',
      '        behind',
      '',
      'words',
      '  rack  the stock sizes of the chosen',
      '        wood, lightest first, with the',
      '        lightest lit',
    ]);
  });

  it('scrolls to its last line and no further', () => {
    const canvas = new Canvas(40, 8);
    expect(drawHelp(canvas, sections, 99, unicode)).toEqual({ lastOffset: 4 });
    const rows = frame(canvas);
    expect(rows[1]).toContain(' lines 5 to 9 of 9 ');
    expect(rows[6]).toBe('         lightest lit');
    expect(rows[7]).toBe(' ↑↓ scroll  Esc back');
  });
});
