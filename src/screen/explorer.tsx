import { useApp, useIsScreenReaderEnabled } from 'ink';
import { type ReactElement, useEffect, useLayoutEffect, useRef, useState } from 'react';
import type { Glyphs } from './draw/glyphs.ts';
import { Screen } from './draw/screen.tsx';
import type { Theme } from './draw/theme.ts';
import { drawState } from './draw-state.ts';
import { Spoken } from './ear/spoken.tsx';
import type { Effect } from './effect.ts';
import { pressName } from './keys.ts';
import { restOf } from './rest.ts';
import type { State } from './state.ts';
import { useKeys } from './terminal/use-keys.ts';
import { type Event, update } from './update.ts';

interface ExplorerProps {
  /** The state to begin with. */
  readonly initial: State;
  readonly columns: number;
  readonly rows: number;
  readonly theme: Theme;
  readonly glyphs: Glyphs;
  /** Carries out what the state asks for and tells what came of it. */
  readonly perform: (effect: Effect) => Event | null;
  /** Tells what happens outside without having been asked for; gives what ends it. */
  readonly listen: (happen: (event: Event) => void) => () => void;
}

/** The loop: keys become events, events the next state, the state a screen. */
export function Explorer({
  initial,
  columns,
  rows,
  theme,
  glyphs,
  perform,
  listen,
}: ExplorerProps): ReactElement {
  const app = useApp();
  const state = useRef(initial);
  const [, redraw] = useState(0);
  const byEar = useIsScreenReaderEnabled();
  /** How often a listener asked to hear everything again. */
  const again = useRef(0);

  const happen = (events: readonly Event[]): void => {
    const queue = [...events];
    for (let event = queue.shift(); event !== undefined; event = queue.shift()) {
      const step = update(state.current, event);
      state.current = step.state;
      for (const effect of step.effects) {
        const after = perform(effect);
        if (effect.do === 'leave') {
          app.exit();
          return;
        }
        if (after !== null) queue.unshift(after);
      }
    }
    redraw((count) => count + 1);
  };

  useKeys({
    onKeys: (keys) => {
      if (byEar && keys.some((press) => pressName(press) === 'ctrl-l')) again.current += 1;
      const time = Date.now();
      happen(keys.map((press) => ({ type: 'key', press, time })));
    },
    onPaste: (text) => happen([{ type: 'paste', text }]),
  });

  // Its end is part of taking the screen down: a signal leaves no time for effects.
  const told = useRef(happen);
  told.current = happen;
  useLayoutEffect(() => listen((event) => told.current([event])), [listen]);

  useEffect(() => {
    const rest = restOf(state.current);
    if (rest === null) return;
    const timer = setTimeout(() => happen([{ type: 'settle' }]), rest.ms);
    return () => clearTimeout(timer);
  });

  // The size is told from outside, so that a resize draws once, in the new size.
  if (state.current.columns !== columns || state.current.rows !== rows) {
    state.current = update(state.current, { type: 'resize', columns, rows }).state;
  }

  if (byEar) return <Spoken state={state.current} again={again.current} />;
  const { canvas, entry } = drawState(state.current, glyphs);
  return <Screen canvas={canvas} theme={theme} entry={entry} />;
}
