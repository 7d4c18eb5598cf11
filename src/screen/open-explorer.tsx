import type { ReactElement } from 'react';
import type { Session } from '../session/session.ts';
import { chooseGlyphs } from './draw/glyphs.ts';
import { chooseTheme } from './draw/theme.ts';
import { Explorer } from './explorer.tsx';
import { START } from './modes/start.ts';
import type { Effect, State } from './state.ts';
import type { Size } from './terminal/open.tsx';
import type { Event } from './update.ts';

export interface ExplorerOptions {
  readonly file: string | null;
  /** null: ask for a beam first. */
  readonly session: Session | null;
  readonly env: Readonly<Record<string, string | undefined>>;
  /** Sends text to the clipboard, where the terminal takes that. */
  readonly copy: (text: string) => void;
  /** Writes a session; null when kept, else the reason why not. */
  readonly save: (file: string, session: Session, fresh: boolean) => string | null;
}

/** What `openScreen` draws for the explorer at each size. */
export function openExplorer({
  file,
  session,
  env,
  copy,
  save,
}: ExplorerOptions): (size: Size) => ReactElement {
  const theme = chooseTheme(env);
  const glyphs = chooseGlyphs(env);
  const initial = (size: Size): State => ({
    session: session ?? EMPTY,
    kept: session,
    file,
    member: 0,
    knob: 'spans.0',
    past: [],
    future: [],
    ghost: null,
    mode: session === null ? START : { name: 'explore' },
    notice: null,
    settled: false,
    ...size,
  });
  let first: State | null = null;
  const perform = (effect: Effect): Event | null => {
    if (effect.do === 'copy') copy(effect.text);
    if (effect.do !== 'save') return null;
    const reason = save(effect.file, effect.session, effect.fresh);
    return reason === null
      ? { type: 'saved', file: effect.file, session: effect.session, thenLeave: effect.thenLeave }
      : { type: 'save-failed', reason };
  };
  return (size) => {
    first ??= initial(size);
    return (
      <Explorer
        initial={first}
        columns={size.columns}
        rows={size.rows}
        theme={theme}
        glyphs={glyphs}
        perform={perform}
      />
    );
  };
}

/** Before the first question is answered there is no member to show. */
const EMPTY: Session = { title: '', units: 'us', combinations: 'ASCE 7-16', members: [] };
