import { arrange, isTooSmall, LEAST_COLUMNS, LEAST_ROWS, type Placed } from './arrange.ts';
import type { Canvas } from './draw/canvas.ts';
import { keepToGlyphs } from './draw/cells.ts';
import type { Glyphs } from './draw/glyphs.ts';
import { drawChart } from './panels/chart.ts';
import { drawExponents } from './panels/exponents.ts';
import { drawFoot } from './panels/foot.ts';
import { drawGauges } from './panels/gauges.ts';
import { drawKnobs, type EntryPlace } from './panels/knobs.ts';
import { drawHandover, drawNotes, drawRemarks } from './panels/lines.ts';
import { drawMoves } from './panels/moves.ts';
import { drawOthers } from './panels/others.ts';
import { drawRack } from './panels/rack.ts';
import { rule } from './panels/region.ts';
import { drawRuler } from './panels/ruler.ts';
import { drawTitle } from './panels/title.ts';
import { drawVerdict } from './panels/verdict.ts';
import type { View } from './view.ts';

/** Draws the whole explorer over the canvas; says where the field being typed stands, if one is. */
export function drawExplorer(view: View, canvas: Canvas, glyphs: Glyphs): { entry: EntryPlace | null } {
  canvas.glyphs.fill(' ');
  canvas.styles.fill(0);
  let entry: EntryPlace | null = null;
  if (isTooSmall(canvas.columns, canvas.rows)) drawTooSmall(canvas);
  else {
    for (const placed of arrange(view, canvas.columns, canvas.rows)) {
      entry = drawPanel(placed, view, canvas, glyphs) ?? entry;
    }
  }
  keepToGlyphs(canvas, glyphs);
  return { entry };
}

/** One line that says what size is needed, in as many words as there is room for. */
export function drawTooSmall(canvas: Canvas): void {
  const needed = `${LEAST_COLUMNS} x ${LEAST_ROWS}`;
  const sayings = [
    `thrice needs ${needed} cells; this window has ${canvas.columns} x ${canvas.rows}`,
    `thrice needs ${needed} cells`,
    `needs ${needed}`,
  ];
  const saying = sayings.find((text) => text.length <= canvas.columns);
  if (saying !== undefined) canvas.put(0, 0, saying);
}

/** Draws one panel in its own cells. */
export function drawPanel(placed: Placed, view: View, canvas: Canvas, glyphs: Glyphs): EntryPlace | null {
  switch (placed.panel) {
    case 'title':
      drawTitle(view, canvas, placed, glyphs);
      return null;
    case 'verdict':
      drawVerdict(view, canvas, placed, glyphs);
      return null;
    case 'knobs':
      return drawKnobs(view, canvas, placed, glyphs);
    case 'gauges':
      drawGauges(view, canvas, placed, glyphs);
      return null;
    case 'others':
      drawOthers(view, canvas, placed, glyphs);
      return null;
    case 'exponents':
      drawExponents(view, canvas, placed, glyphs);
      return null;
    case 'moves':
      drawMoves(view, canvas, placed, glyphs);
      return null;
    case 'rule':
      rule(canvas, placed, glyphs);
      return null;
    case 'ruler':
      drawRuler(view, canvas, placed, glyphs);
      return null;
    case 'rack':
      drawRack(view, canvas, placed, glyphs, placed);
      return null;
    case 'chart':
      drawChart(view, canvas, placed, glyphs, placed);
      return null;
    case 'notes':
      drawNotes(view, canvas, placed, glyphs);
      return null;
    case 'handover':
      drawHandover(view, canvas, placed);
      return null;
    case 'remarks':
      drawRemarks(view, canvas, placed);
      return null;
    case 'foot':
      drawFoot(view, canvas, placed, glyphs);
      return null;
  }
}
