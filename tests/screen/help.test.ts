import { describe, expect, test } from 'vitest';
import { helpSections } from '../../src/screen/help-text.ts';
import { BINDINGS } from '../../src/screen/keys.ts';
import type { State } from '../../src/screen/state.ts';
import { shown } from '../support/shown.ts';
import { pressing, stateOf } from '../support/state.ts';

/** Keys of the explorer that open a view, and the mode it is in. */
const VIEWS = [
  ['m', 'moves'],
  ['v', 'diagrams'],
  ['y', 'wood'],
  ['w', 'workings'],
  ['a', 'add'],
  ['c', 'compare'],
  ['H', 'handovers'],
  ['h', 'headroom'],
  ['K', 'links'],
  ['j', 'members'],
  ['$', 'buying'],
  ['k', 'copy'],
  ['=', 'proportions'],
  ['e', 'reach'],
  ['T', 'trail'],
] as const;
const opened = (...keys: string[]): State => pressing(stateOf([{}, {}]), ...keys).state;

describe('? explains the view at hand', () => {
  test.each(VIEWS)(
    '%s: the %s first, then what every view has; Escape and ? lead back to it',
    (key, name) => {
      const view = opened(key);
      expect(view.mode.name).toBe(name);
      const help = pressing(view, '?').state;
      const rows = shown(help, 80, 24).join('\n').replace(/\s+/g, ' ');
      const { help: about } = BINDINGS.find(({ keys }) => keys === key)!;
      expect(rows).toContain(`this view ${about}`);
      for (const back of ['escape', '?', 'q']) expect(pressing(help, back).state.mode).toEqual(view.mode);
    },
  );

  test('in the settings, at the start and in the question on leaving, their own keys first', () => {
    const first = (state: State) => shown(pressing(state, '?').state, 80, 24)[2]?.trim();
    expect(first(opened('j', 'tab'))).toBe('in the settings of the session');
    expect(first(opened('j', 'a'))).toBe('at the start');
    expect(first(opened('right', 'q'))).toBe('when something is not kept on leaving');
  });

  test('in the explorer the keys in their order', () => {
    expect(shown(opened('?'), 80, 24)[2]?.trim()).toBe('keys');
  });

  test('no section is lost for the one that comes first', () => {
    const titles = (view?: State['mode']['name']) => helpSections(view).map(({ title }) => title);
    for (const [, name] of VIEWS) expect(titles(name)).toEqual(expect.arrayContaining(titles()));
  });

  test.each([
    ['an entry', ['enter']],
    ['a name to keep under', ['A']],
    ['a name for the sheet', ['S']],
    ['the filter of the list', ['j', '/']],
    ['a title of the session', ['j', 'tab', 'enter']],
  ])('in %s it is a sign like any other', (_field, keys) => {
    const { mode } = opened(...keys);
    expect(opened(...keys, '?').mode.name).toBe(mode.name);
  });
});
