import { LEAST_CHART_ROWS } from './panels/chart.ts';
import { EXPONENT_COLUMNS } from './panels/exponents.ts';
import { rackColumns } from './panels/rack.ts';
import type { Region } from './panels/region.ts';
import { RULER_ROWS } from './panels/ruler.ts';
import type { View } from './view.ts';

/** The smallest screen that shows the explorer. */
export const LEAST_COLUMNS = 60;
export const LEAST_ROWS = 18;
/** Below this many columns everything stands in one column. */
const TWO_COLUMNS = 72;
/** From here: demand and capacity, exponents, reach or a small chart. */
const WIDE = 100;
/** From here: the verdict on one row, reach and the full chart. */
const WIDER = 120;
/** From here: the moves beside the gauges. */
export const WIDEST = 160;
/** From here: the remarks in a column of their own. */
const NOTES = 200;
/** More is left blank: nothing would be gained by stretching. */
const MOST_COLUMNS = 240;
const NOTES_COLUMNS = 36;
const MOST_CHART_COLUMNS = 130;
const MOST_CHART_ROWS = 28;

export type PanelName =
  | 'title'
  | 'verdict'
  | 'knobs'
  | 'gauges'
  | 'others'
  | 'exponents'
  | 'moves'
  | 'rule'
  | 'ruler'
  | 'rack'
  | 'chart'
  | 'notes'
  | 'handover'
  | 'remarks'
  | 'foot';

/** A panel and the cells that are its own. */
export interface Placed extends Region {
  readonly panel: PanelName;
  /** The heading is laid into a rule across the panel. */
  readonly ruled: boolean;
  /** The rack shows reach. */
  readonly reach: boolean;
}

/** True when the explorer has no room and only says what it needs. */
export function isTooSmall(columns: number, rows: number): boolean {
  return columns < LEAST_COLUMNS || rows < LEAST_ROWS;
}

/** Which panel stands where on a screen of at least 60 x 18. No two share a cell. */
export function arrange(view: View, columns: number, rows: number): Placed[] {
  const width = Math.min(columns, MOST_COLUMNS);
  if (width < TWO_COLUMNS) return oneColumn(view, width, rows);
  const plan = new Plan();
  const top = plan.down(0, width, width >= WIDER ? { title: 1, verdict: 1 } : { title: 1, verdict: 2 });

  const remarks = rows < 22 ? 0 : rows >= 48 ? 2 : 1;
  const handover = rows >= 20 ? 1 : 0;
  const bottom = rows - 1 - remarks - handover;
  plan.down(bottom, width, { handover, remarks, foot: 1 });
  const body = bottom - top;
  const stacked = width >= WIDE ? stackedRows(view, body, rows, width) : null;
  if (stacked === null) {
    plan.down(bottom - 1 - RULER_ROWS, width, { rule: 1, ruler: RULER_ROWS });
    beside(plan, view, width, top, body - 1 - RULER_ROWS);
    return plan.placed;
  }
  middle(plan, view, width, top, stacked);
  const ruler = plan.down(top + stacked, width, { rule: 1, ruler: RULER_ROWS });
  lower(plan, view, width, ruler, bottom - ruler);
  return plan.placed;
}

/** Collects placed panels, leaving out those without a row. */
class Plan {
  readonly placed: Placed[] = [];

  add(
    panel: PanelName,
    x: number,
    y: number,
    columns: number,
    rows: number,
    how?: { ruled?: boolean; reach?: boolean },
  ): void {
    if (rows < 1 || columns < 1) return;
    this.placed.push({ panel, x, y, columns, rows, ruled: how?.ruled ?? false, reach: how?.reach ?? false });
  }

  /** Panels of full width from row y down; returns the row below the last. */
  down(y: number, columns: number, panels: Partial<Record<PanelName, number>>): number {
    let row = y;
    for (const [panel, rows] of Object.entries(panels) as [PanelName, number][]) {
      this.add(panel, 0, row, columns, rows);
      row += rows;
    }
    return row;
  }
}

function knobColumns(width: number): number {
  if (width >= WIDEST) return 34;
  return width >= WIDE ? 28 : 26;
}

function movesColumns(width: number): number {
  if (width < WIDEST) return 0;
  return width >= NOTES ? 68 : 56;
}

/** Powers with demand and capacity, the others on two rows, exponents: what the middle holds at least. */
const MIDDLE_ROWS = 1 + 6 + 2 + 4;
/** Title, verdict, handover, a remark, foot. */
const OTHER_ROWS = 1 + 2 + 1 + 1 + 1;

/** The smallest screen with a chart on it; a row less where the verdict has one row. */
export const CHART_NEEDS = {
  columns: WIDE,
  rows: OTHER_ROWS + MIDDLE_ROWS + 1 + RULER_ROWS + LEAST_CHART_ROWS,
};

/**
 * The rows of the middle where the rack has room below the ruler with a chart beside it; null where it has
 * not, and the rack stands beside the knobs instead.
 */
function stackedRows(view: View, body: number, rows: number, width: number): number | null {
  const spare = body - MIDDLE_ROWS - 1 - RULER_ROWS - LEAST_CHART_ROWS;
  if (spare < 0) return null;
  const longer = Math.max(view.knobs.length + 1 - MIDDLE_ROWS, width >= WIDEST ? view.others.length : 0);
  return MIDDLE_ROWS + (rows >= 40 ? Math.max(0, Math.min(longer, Math.floor(spare / 2))) : 0);
}

/** Knobs, gauges with what belongs to them, and from 160 columns the moves. */
function middle(plan: Plan, view: View, width: number, y: number, rows: number): void {
  const left = knobColumns(width);
  const moves = movesColumns(width);
  const right = width - left - moves;
  plan.add('knobs', 0, y, left, rows);
  plan.add('moves', width - moves, y, moves, rows);
  plan.add('gauges', left, y, right, 7);
  const extra = rows - MIDDLE_ROWS;
  const gap = extra > 0 ? 1 : 0;
  // A spare row shows one more of the other checks as a gauge, as long as there are any.
  const more = Math.max(0, Math.min(extra - gap, view.others.length - 1));
  plan.add('others', left, y + 7, right, 2 + more);
  plan.add('exponents', left, y + 9 + more + gap, right, 4);
}

/** Rack and chart below the ruler, and from 200 columns all remarks in full. */
function lower(plan: Plan, view: View, width: number, y: number, rows: number): void {
  const reach = width >= WIDER;
  const rack = Math.min(rackColumns(view.rack, reach), Math.floor(width * 0.64));
  const rest = width - rack;
  const chart = width >= NOTES ? Math.min(MOST_CHART_COLUMNS, rest - NOTES_COLUMNS) : rest;
  plan.add('rack', 0, y, rack, rows, { ruled: true, reach });
  plan.add('chart', rack, y, chart, Math.min(rows, MOST_CHART_ROWS), { ruled: true });
  plan.add('notes', rack + chart, y, rest - chart, rows);
}

/** Knobs at the left; at the right all that fits in the order of worth, the rack at the end. */
function beside(plan: Plan, view: View, width: number, y: number, rows: number): void {
  const left = knobColumns(width);
  const moves = movesColumns(width);
  const right = width - left - moves;
  plan.add('knobs', 0, y, left, rows);
  plan.add('moves', width - moves, y, moves, rows);

  // What is left for the rack once heading, three gauges and a row of other checks stand.
  let rack = rows - 1 - 3 - 1;
  const take = (wanted: number, keep: number): number => {
    if (rack - wanted < keep) return 0;
    rack -= wanted;
    return wanted;
  };
  const wide = width >= WIDE;
  const demand = take(3, wide ? 6 : 9);
  const hasExponents = view.exponents.length > 0 && right >= EXPONENT_COLUMNS;
  const exponents = hasExponents ? take(4, wide ? 6 : 9) : 0;
  const other = take(1, 10);
  const gap = exponents > 0 ? take(1, 10) : 0;
  const gapBelow = take(1, 11);
  const chart = view.chart === null ? 0 : take(LEAST_CHART_ROWS + 1, 11);

  let row = y;
  const put = (panel: PanelName, height: number, how?: { reach: boolean }): void => {
    plan.add(panel, left, row, right, height, how);
    row += height;
  };
  put('gauges', 4 + demand);
  put('others', 1 + other);
  row += gap;
  put('exponents', exponents);
  row += gapBelow;
  put('rack', rack, { reach: wide });
  row += chart > 0 ? 1 : 0;
  put('chart', chart - 1);
}

/** Verdict, the knob in hand among as many as fit, gauges, ruler; a rack where there are rows for it. */
function oneColumn(view: View, width: number, rows: number): Placed[] {
  const plan = new Plan();
  const remarks = rows >= 22 ? 1 : 0;
  const top = plan.down(0, width, { title: 1, verdict: 2 });
  plan.down(rows - 1 - remarks, width, { remarks, foot: 1 });
  let spare = rows - 1 - remarks - top - (1 + 4 + 1 + 1 + RULER_ROWS);
  const take = (wanted: number): number => {
    const taken = Math.max(0, Math.min(wanted, spare));
    spare -= taken;
    return taken;
  };
  let knobs = take(4);
  const rack = spare >= 6 ? take(Math.min(view.rack.rows.length + 1, 12)) : 0;
  knobs += take(view.knobs.length - knobs);
  plan.down(top, width, { knobs: 1 + knobs, gauges: 4, others: 1, rack, rule: 1, ruler: RULER_ROWS });
  return plan.placed;
}
