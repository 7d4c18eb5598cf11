import type { ReactElement } from 'react';
import type { Keeper } from '../files/keeper.ts';
import type { Units } from '../quantity/index.ts';
import type { Session } from '../session/session.ts';
import { chooseGlyphs } from './draw/glyphs.ts';
import { chooseTheme } from './draw/theme.ts';
import type { Effect, OpenAnswer, Opened, SheetAnswer, YardAnswer } from './effect.ts';
import { Explorer } from './explorer.tsx';
import { EXPLORE, type Mode, type Offers } from './mode.ts';
import { startWith } from './modes/start.ts';
import type { State } from './state.ts';
import type { Size } from './terminal/open.tsx';
import type { Event } from './update.ts';

export interface ExplorerOptions {
  readonly file: string | null;
  /** null: ask for a beam first. */
  readonly session: Session | null;
  readonly env: Readonly<Record<string, string | undefined>>;
  /** Of a beam that is begun without a file; left out: US. */
  readonly units?: Units | undefined;
  /** Said on the first screen; null: nothing. */
  readonly told: string | null;
  /** Sends text to the clipboard, where the terminal takes that. */
  readonly copy: (text: string) => void;
  /** Writes the session, its recovery journal, and nothing where it may not. */
  readonly keeper: Keeper;
  /** What an empty start offers, and what opens it; null where there is a session. */
  readonly opening: { readonly offers: Offers; open(what: Opened): FoundSession } | null;
  /** Writes a calculation sheet, by and by. */
  readonly writeSheet: (wanted: SheetWanted) => Promise<SheetAnswer['outcome']>;
  /** Reads a yard list by its name, for a session of this file. */
  readonly readYard: (name: string, session: Session, file: string | null) => YardAnswer;
}

/** A session that was opened in place of an empty start, with what keeps it; null: as before, it has no file. */
export type FoundSession =
  | {
      readonly ok: true;
      readonly file: string | null;
      readonly session: Session;
      readonly keeper: Keeper | null;
    }
  | { readonly ok: false; readonly fault: string };

/** A sheet as the screen asks for it. */
export type SheetWanted = Extract<Effect, { readonly do: 'write-sheet' }>;

/** What `openScreen` draws for the explorer at each size. */
export function openExplorer({
  file,
  session,
  env,
  units = 'us',
  told,
  copy,
  keeper: first,
  opening,
  readYard,
  writeSheet,
}: ExplorerOptions): (size: Size) => ReactElement {
  let keeper = first;
  const theme = chooseTheme(env);
  const glyphs = chooseGlyphs(env);
  const initial = (size: Size): State => ({
    session: session ?? { ...EMPTY, units },
    kept: session,
    file,
    member: 0,
    knob: 'spans.0',
    past: [],
    future: [],
    ghost: null,
    readOnly: keeper.readOnly,
    mode: firstMode(session, keeper, opening?.offers ?? NO_OFFERS),
    notice: noticeOf(keeper.notice ?? told),
    settled: false,
    ...size,
  });
  let begun: State | null = null;
  let tell: (event: Event) => void = () => undefined;
  const listenToKeeper = () => keeper.listen((text) => tell({ type: 'told', text, refusal: true }));
  const opened = (found: FoundSession): OpenAnswer => {
    if (!found.ok) return found;
    const { session, file, keeper: its } = found;
    if (its === null)
      return { ok: true, session, file, readOnly: keeper.readOnly, recovered: null, notice: null };
    keeper.close();
    keeper = its;
    listenToKeeper();
    const { readOnly, recovered, notice } = its;
    return { ok: true, session, file, readOnly, recovered, notice };
  };
  const perform = (effect: Effect): Event | null => {
    if (effect.do === 'copy') copy(effect.text);
    if (effect.do === 'read-yard')
      return { type: 'yard', answer: readYard(effect.name, effect.session, effect.file) };
    if (effect.do === 'open' && opening !== null)
      return { type: 'opened', answer: opened(opening.open(effect.what)) };
    if (effect.do === 'write-sheet') {
      const { file } = effect;
      void writeSheet(effect).then((outcome) => tell({ type: 'sheet', answer: { file, outcome } }));
    }
    if (effect.do === 'journal') keeper.note(effect.session);
    if (effect.do === 'leave') keeper.note(null);
    if (effect.do === 'answer-recovered') {
      const text = keeper.answer(effect.answer);
      return text === null ? null : { type: 'told', text, refusal: false };
    }
    if (effect.do !== 'save') return null;
    const { file, session, thenLeave } = effect;
    const outcome = keeper.save(effect);
    switch (outcome.kind) {
      case 'saved':
        return { type: 'saved', file, session, thenLeave };
      case 'changed':
        return { type: 'changed-on-disk', thenLeave };
      case 'failed':
        return { type: 'save-failed', reason: outcome.reason };
    }
  };
  const listen = (happen: (event: Event) => void): (() => void) => {
    tell = happen;
    listenToKeeper();
    return () => {
      tell = () => undefined;
      keeper.close();
    };
  };
  return (size) => {
    begun ??= initial(size);
    return (
      <Explorer
        initial={begun}
        columns={size.columns}
        rows={size.rows}
        theme={theme}
        glyphs={glyphs}
        perform={perform}
        listen={listen}
      />
    );
  };
}

function noticeOf(text: string | null): State['notice'] {
  return text === null ? null : { text, refusal: true };
}

/** What was not kept is asked about before anything else. */
function firstMode(session: Session | null, { recovered }: Keeper, offers: Offers): Mode {
  const after = session === null ? startWith(offers) : EXPLORE;
  return recovered === null ? after : { name: 'recovered', recovered, scroll: 0, after };
}

const NO_OFFERS: Offers = { samples: [], files: [] };

/** Before the first question is answered there is no member to show. */
const EMPTY: Session = { title: '', units: 'us', combinations: 'ASCE 7-16', members: [] };
