import { type ReactElement, useState } from 'react';
import { useApp } from 'ink';
import { Canvas } from '../../src/screen/draw/canvas.ts';
import { chooseTheme } from '../../src/screen/draw/theme.ts';
import { Screen } from '../../src/screen/draw/screen.tsx';
import { openScreen, type Size } from '../../src/screen/terminal/open.tsx';
import { useKeys } from '../../src/screen/terminal/use-keys.ts';

const theme = chooseTheme(process.env);

function App({ size }: { size: Size }): ReactElement {
  const [count, setCount] = useState(0);
  const [typed, setTyped] = useState<string | null>(null);
  const { exit } = useApp();
  useKeys({
    onKeys: (keys) => {
      for (const k of keys) {
        if (k.char === 'q') exit('bye');
        if (k.char === 'x') setTimeout(() => { throw new Error('boom'); }, 1);
        if (k.char === 't') setTyped('12 ft');
        if (k.name === 'escape') setTyped(null);
        if (k.name === 'right') setCount((c) => c + 1);
        if (k.name === 'left') setCount((c) => c - 1);
      }
    },
    onPaste: (text) => setTyped(text),
  });
  const c = new Canvas(size.columns, size.rows);
  c.put(0, 0, ` thrice  ${size.columns}x${size.rows} count ${count}`, 'strong');
  for (let y = 1; y < size.rows - 1; y++) {
    const fill = (count * y) % 50 + 1;
    c.put(1, y, `knob ${y}`, y % 3 ? 'plain' : 'quiet');
    c.putRight(22, y, `${y % 3 === 1 ? count : y}`, 'now');
    if (y % 3 === 1) { c.put(30, y, '━'.repeat(fill) + '●', 'now'); c.put(82, y, '┃', 'governs'); }
    else c.put(30, y, '┄'.repeat(50), 'quiet');
    c.put(90, y, `(2) 2x${y} 0.${y}0 lightest`, y === 5 ? 'governsStrong' : 'plain');
  }
  c.put(0, size.rows - 1, '=', 'plain'); c.putRight(size.columns - 1, size.rows - 1, `foot ↑↓ knob q quit`, 'quiet');
  return <Screen canvas={c} theme={theme} entry={typed === null ? null : { row: 3, column: 10, width: 8, value: typed, cursor: typed.length }} />;
}
const end = await openScreen((size) => <App size={size} />);
console.log(JSON.stringify(end), end.kind === 'failed' ? end.error.message : '');
process.exitCode = end.kind === 'closed' ? 0 : 2;
