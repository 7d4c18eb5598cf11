import { useApp } from 'ink';
import { type ReactElement, useState } from 'react';
import { Canvas } from '../../src/screen/draw/canvas.ts';
import { Screen } from '../../src/screen/draw/screen.tsx';
import { chooseTheme } from '../../src/screen/draw/theme.ts';
import type { KeyPress } from '../../src/screen/terminal/key-press.ts';
import { openScreen, type Size } from '../../src/screen/terminal/open.tsx';
import { useKeys } from '../../src/screen/terminal/use-keys.ts';

const theme = chooseTheme(process.env);
const FIELD = { row: 2, column: 10, width: 8 };

interface Shown {
  readonly count: number;
  /** The text being typed; null when nothing is. */
  readonly typed: string | null;
  readonly pasted: string;
}

function after(state: Shown, press: KeyPress): Shown {
  if (state.typed !== null && press.name === 'char') return { ...state, typed: state.typed + press.char };
  if (press.name === 'backspace') return { ...state, typed: state.typed?.slice(0, -1) ?? null };
  if (press.name === 'enter') return { ...state, typed: '' };
  if (press.name === 'escape') return { ...state, typed: null };
  if (press.name === 'right') return { ...state, count: state.count + (press.shift ? 10 : 1) };
  return press.name === 'left' ? { ...state, count: state.count - 1 } : state;
}

/** The least program on this project's screen: it counts arrows, types into a field, and breaks on request. */
function SmallProgram({ columns, rows }: Size): ReactElement {
  const [state, setState] = useState<Shown>({ count: 0, typed: null, pasted: '' });
  const { exit } = useApp();
  const onKeys = (keys: readonly KeyPress[]): void => {
    for (const press of keys) {
      if (state.typed === null && press.char === 'q') exit('left by q');
      if (state.typed === null && press.char === 'x')
        setTimeout(() => Promise.reject(new Error('broken later')));
      if (state.typed === null && press.char === 'y') throw new Error('broken at once');
      setState((before) => after(before, press));
    }
  };
  useKeys({ onKeys, onPaste: (text) => setState((before) => ({ ...before, pasted: text })) });

  const canvas = new Canvas(columns, rows);
  canvas.put(0, 0, `${columns}x${rows} count ${state.count} pasted ${state.pasted}`, 'strong');
  for (let y = 1; y < rows - 1; y += 1) canvas.put(0, y, `row ${y}`, 'quiet');
  canvas.put(20, FIELD.row, 'right of the field', 'now');
  canvas.put(0, rows - 1, '━'.repeat(columns - 1), 'governs');
  canvas.put(columns - 1, rows - 1, '●', 'now');
  const { typed } = state;
  const entry = typed === null ? null : { ...FIELD, value: typed, cursor: typed.length };
  return <Screen canvas={canvas} theme={theme} entry={entry} />;
}

const end = await openScreen((size) => <SmallProgram {...size} />);
if (end.kind === 'closed') console.log(`closed: ${end.value}`);
else console.error(end.kind === 'refused' ? `refused: ${end.fault}` : `failed: ${end.error.message}`);
process.exitCode = end.kind === 'closed' ? 0 : 2;
