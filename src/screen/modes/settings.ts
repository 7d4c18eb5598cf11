import { type Changed, type JobSetting, jobSettings, YARD_SETTING } from '../../session/job-settings.ts';
import { isTooSmall } from '../arrange.ts';
import { edited, editOf, inserted } from '../edit.ts';
import { type Step, still } from '../effect.ts';
import { redo, undo } from '../history.ts';
import { actionOf } from '../keys.ts';
import { drawTooSmall } from '../layout.ts';
import type { SettingsMode } from '../mode.ts';
import { drawSettings } from '../panels/settings.ts';
import { settingsView } from '../settings-view.ts';
import { refused, type State, withSession } from '../state.ts';
import type { KeyPress } from '../terminal/key-press.ts';
import { titleOf } from '../view-model.ts';
import { isCancel, type ModeRules, scrolled } from './mode-rules.ts';

/** What is set for the whole session. */
export const settings: ModeRules<SettingsMode> = {
  press: (state, mode, key) =>
    mode.typing === null ? still(press(state, mode, key)) : type(state, mode, mode.typing, key),
  paste(state, mode, text) {
    const { edit } = mode.typing ?? { edit: editOf('') };
    return isTyped(inHand(mode)) ? typing(state, mode, { edit: inserted(edit, text), fault: null }) : state;
  },
  draw(state, mode, canvas, glyphs) {
    if (isTooSmall(canvas.columns, canvas.rows)) {
      drawTooSmall(canvas);
      return null;
    }
    const screen = { title: titleOf(state), notice: state.notice };
    const place = drawSettings(screen, settingsView(state, mode), canvas, glyphs);
    if (place === null || mode.typing === null) return null;
    return { ...place, value: mode.typing.edit.text, cursor: mode.typing.edit.cursor };
  },
};

/** The settings; Escape leads back to the view that they were opened in. */
export function openSettings(state: State): State {
  return { ...state, mode: { name: 'settings', line: 0, typing: null, back: state.mode }, notice: null };
}

function inHand({ line }: SettingsMode): JobSetting {
  return jobSettings()[line]!;
}

function isTyped({ enter, key }: JobSetting): boolean {
  return enter !== undefined || key === YARD_SETTING;
}

function typing(state: State, mode: SettingsMode, now: SettingsMode['typing']): State {
  return { ...state, mode: { ...mode, typing: now }, notice: null };
}

function press(state: State, mode: SettingsMode, press: KeyPress): State {
  const letter = press.name === 'char' && !press.ctrl ? press.char : null;
  if (isCancel(press) || press.name === 'tab' || letter === 'q')
    return { ...state, mode: mode.back, notice: null };
  const line = scrolled(mode.line, press, jobSettings().length - 1);
  if (line !== null) return { ...state, mode: { ...mode, line }, notice: null };
  const setting = inHand(mode);
  if (press.name === 'left') return turned(state, setting, -1);
  if (press.name === 'right') return turned(state, setting, 1);
  switch (actionOf(press)) {
    case 'type':
      return isTyped(setting)
        ? typing(state, mode, { edit: editOf(setting.turn ? '' : typedNow(state, setting)), fault: null })
        : turned(state, setting, 1);
    case 'remove':
      return cleared(state, setting);
    case 'undo':
      return undo(state);
    case 'redo':
      return redo(state);
    default:
      return state;
  }
}

/** What is typed begins with what stands there; of a yard list with its file. */
function typedNow({ session }: State, { key, show }: JobSetting): string {
  return key === YARD_SETTING ? (session.yard?.file ?? '') : show(session);
}

function changed(state: State, change: Changed): State {
  return 'fault' in change ? refused(state, change.fault) : withSession(state, change.session);
}

function turned(state: State, setting: JobSetting, by: 1 | -1): State {
  if (setting.turn === undefined) return refused(state, `${setting.label} is typed: Enter begins`);
  return changed(state, setting.turn(state.session, by));
}

function cleared(state: State, setting: JobSetting): State {
  if (setting.clear === undefined) return refused(state, `${setting.label} always stands: ← and → change it`);
  return withSession(state, setting.clear(state.session));
}

function type(
  state: State,
  mode: SettingsMode,
  now: NonNullable<SettingsMode['typing']>,
  press: KeyPress,
): Step {
  if (isCancel(press)) return still(typing(state, mode, null));
  if (press.name !== 'enter') {
    const edit = edited(now.edit, press);
    return still(edit === null ? state : typing(state, mode, { edit, fault: null }));
  }
  const text = now.edit.text.trim();
  const closed = typing(state, mode, null);
  if (text === '') return still(closed);
  const setting = inHand(mode);
  if (setting.enter === undefined) {
    const { session, file } = state;
    return { state: closed, effects: [{ do: 'read-yard', name: text, session, file }] };
  }
  const change = setting.enter(state.session, text);
  if ('fault' in change) return still(typing(state, mode, { ...now, fault: change.fault }));
  return still(changed(closed, change));
}
