import type { Mode } from '../mode.ts';
import { add } from './add.ts';
import { buying } from './buying.ts';
import { changedOnDisk } from './changed-on-disk.ts';
import { compare } from './compare.ts';
import { copy } from './copy.ts';
import { diagrams } from './diagrams.ts';
import { entry } from './entry.ts';
import { explore } from './explore.ts';
import { handovers } from './handovers.ts';
import { headroom } from './headroom.ts';
import { help } from './help.ts';
import { leaving } from './leaving.ts';
import { links } from './links.ts';
import { members } from './members.ts';
import type { ModeOf, ModeRules } from './mode-rules.ts';
import { moves } from './moves.ts';
import { proportions } from './proportions.ts';
import { reach } from './reach.ts';
import { recovered } from './recovered.ts';
import { saveAs } from './save-as.ts';
import { settings } from './settings.ts';
import { sheet } from './sheet.ts';
import { start } from './start.ts';
import { trail } from './trail.ts';
import { wood } from './wood.ts';
import { workings } from './workings.ts';

/** The rules of every mode, by its name. */
const RULES: { readonly [N in Mode['name']]: ModeRules<ModeOf<N>> } = {
  explore,
  entry,
  'save-as': saveAs,
  help,
  workings,
  diagrams,
  wood,
  add,
  moves,
  headroom,
  buying,
  proportions,
  reach,
  handovers,
  compare,
  copy,
  leaving,
  links,
  members,
  settings,
  'changed-on-disk': changedOnDisk,
  recovered,
  sheet,
  trail,
  start,
};

/** The rules of the mode a state is in. */
export function rulesOf(mode: Mode): ModeRules<Mode> {
  // The table above pairs each name with the rules for it.
  return RULES[mode.name] as ModeRules<Mode>;
}
