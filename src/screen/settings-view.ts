import { type JobSetting, jobSettings } from '../session/job-settings.ts';
import type { SettingsMode } from './mode.ts';
import type { State } from './state.ts';
import { ALL_KEYS, type FootView } from './view.ts';

export type SettingsRow =
  | { readonly heading: string }
  | { readonly label: string; readonly value: string; readonly about: string };

export interface SettingsView {
  readonly rows: readonly SettingsRow[];
  /** Index of the row in hand. */
  readonly inHand: number;
  readonly typing: boolean;
  /** Why what was typed may not be; null where it may. */
  readonly fault: string | null;
  readonly foot: readonly FootView[];
}

const HEADING: Readonly<Record<JobSetting['part'], string>> = {
  session: 'the session',
  'new members': 'the wood of new members',
  'title block': 'the title block of the sheet',
};

export function settingsView({ session }: State, { line, typing }: SettingsMode): SettingsView {
  const rows: SettingsRow[] = [];
  let inHand = 0;
  let part = '';
  for (const [at, setting] of jobSettings().entries()) {
    if (setting.part !== part) rows.push({ heading: HEADING[setting.part] });
    part = setting.part;
    if (at === line) inHand = rows.length;
    const value = setting.show(session);
    rows.push({ label: setting.label, value: value === '' ? 'none' : value, about: setting.about });
  }
  return {
    rows,
    inHand,
    typing: typing !== null,
    fault: typing?.fault ?? null,
    foot: footOf(jobSettings()[line]!, typing !== null),
  };
}

function footOf({ turn, clear }: JobSetting, typing: boolean): FootView[] {
  if (typing)
    return [
      { keys: 'Enter', does: 'take it' },
      { keys: 'Esc', does: 'leave the old one' },
    ];
  return [
    { keys: '↑↓', does: 'choose' },
    turn === undefined ? { keys: 'Enter', does: 'type' } : { keys: '←→', does: 'change' },
    ...(clear === undefined ? [] : [{ keys: 'Delete', does: 'none' }]),
    { keys: 'u', does: 'undo' },
    { keys: 'Esc', does: 'back' },
    ALL_KEYS,
  ];
}
