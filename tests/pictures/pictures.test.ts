// The pictures of the README, made from the program as it is: `npm run pictures` makes them anew, and a picture that
// no longer shows the program fails here.
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'vitest';
import { BOATHOUSE } from '../support/samples.ts';
import { opened } from '../terminal/explorer.ts';
import { svgOf } from './svg.ts';

const COLUMNS = 120;
const ROWS = 36;
const QUIET_MS = 400;
const WAITS = 8;

test.each([
  ['explorer', 'The explorer: verdict, knobs, gauges, ruler and rack of a deck girder', []],
  ['moves', 'Moves: the changes that would help, best first', ['m']],
  ['diagrams', 'The beam with its loads, shear, moment and deflection', ['v']],
  ['workings', 'Workings: the calculation behind a check, with its clauses', ['w']],
])('%s.svg is what the program shows', async (name, title, keys) => {
  const session = await opened(BOATHOUSE.file, {
    columns: COLUMNS,
    rows: ROWS,
    env: { COLORTERM: 'truecolor', THRICE_THEME: 'dark' },
  });
  // One nudge, so that the ghost of where the beads stood is in the picture.
  session.press('right');
  await session.settle(QUIET_MS);
  if (keys.length > 0) session.press(...keys);
  const file = join(import.meta.dirname, `${name}.svg`);
  const kept = existsSync(file) ? readFileSync(file, 'utf8') : null;
  // A slow machine may pause in the middle of a frame: only what stays otherwise is another picture.
  let svg = '';
  for (let waits = 0; waits < WAITS && svg !== kept; waits += 1) {
    await session.settle(QUIET_MS);
    svg = svgOf(session, title);
  }
  await expect(svg).toMatchFileSnapshot(file);
});
