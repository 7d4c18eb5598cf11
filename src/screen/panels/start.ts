import { showSpan } from '../../quantity/index.ts';
import type { Canvas } from '../draw/canvas.ts';
import type { Glyphs } from '../draw/glyphs.ts';
import { loadsText, STARTS } from '../starts.ts';
import type { StartMode } from '../state.ts';
import type { Place } from './prompt.ts';

const LEFT = 3;
const FIELD = 20;

/** The three questions of an empty start: use, span, tributary width. */
export function drawStart(mode: StartMode, canvas: Canvas, glyphs: Glyphs): Place | null {
  canvas.put(1, 0, 'thrice', 'strong');
  canvas.put(9, 0, 'a beam to begin with');
  canvas.put(LEFT, 2, 'What is it part of?', mode.step === 'use' ? 'strong' : 'quiet');
  STARTS.forEach(({ use, label }, index) => {
    const chosen = index === mode.use;
    const style = chosen ? 'now' : mode.step === 'use' ? 'plain' : 'quiet';
    canvas.put(LEFT, 3 + index, `${chosen ? glyphs.hand : ' '} ${index + 1}  ${label}`, style);
    canvas.put(LEFT + 36, 3 + index, loadsText(use), 'quiet');
  });
  const row = 4 + STARTS.length;
  let place: Place | null = null;
  const question = (y: number, text: string, step: StartMode['step'], answer: string | null) => {
    canvas.put(LEFT, y, text, mode.step === step ? 'strong' : 'quiet');
    if (mode.step === step) place = { row: y, column: LEFT + 36, width: FIELD };
    else if (answer !== null) canvas.put(LEFT + 36, y, answer);
  };
  question(row, 'How far does it span?', 'span', mode.span > 0 ? showSpan(mode.span, 'us') : null);
  question(row + 1, 'What width does it carry?', 'tributary', null);
  if (mode.fault !== null) canvas.put(LEFT, row + 3, mode.fault, 'governs');
  const hint =
    mode.step === 'use'
      ? 'arrows or 1 to 4 choose, Enter goes on, Esc leaves'
      : `in feet, or any unit: 14-6, 14'6", 14.5, 4.4m; Enter goes on, Esc goes back`;
  canvas.put(LEFT, row + 4, hint, 'quiet');
  canvas.put(LEFT, canvas.rows - 1, 'or open a session: thrice FILE', 'quiet');
  return place;
}
