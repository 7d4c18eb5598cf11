import type { Step as NudgeSize } from '../explore/knobs/knob.ts';
import type { Action } from './keys.ts';

const NUDGES: Readonly<Partial<Record<Action, readonly [1 | -1, NudgeSize]>>> = {
  'nudge-less': [-1, 'normal'],
  'nudge-more': [1, 'normal'],
  'fine-less': [-1, 'fine'],
  'fine-more': [1, 'fine'],
  'coarse-less': [-1, 'coarse'],
  'coarse-more': [1, 'coarse'],
};

/** The nudge that an action is, which way and how far; null where it is none. */
export function nudgeOf(action: Action | null): readonly [1 | -1, NudgeSize] | null {
  return action === null ? null : (NUDGES[action] ?? null);
}
