import fc from 'fast-check';
import { expect, test } from 'vitest';
import { chooseGlyphs } from '../../src/screen/draw/glyphs.ts';
import { drawState } from '../../src/screen/draw-state.ts';
import { memberOf, type State } from '../../src/screen/state.ts';
import { viewOf } from '../../src/screen/view-model.ts';
import { readSession, writeSession } from '../../src/session/index.ts';
import { reportMember } from '../../src/timber/index.ts';
import { ABSURD } from '../support/absurd.ts';
import { anySessionText } from '../support/any-session.ts';
import { anyKeys } from '../support/keys.ts';
import { runs } from '../support/runs.ts';
import { SAMPLES } from '../support/samples.ts';
import { sessionFile } from '../support/session.ts';
import { afterEvents, pressing } from '../support/state.ts';
import { twinOf } from '../support/twin.ts';

const SIZES = [
  [60, 18],
  [80, 24],
  [120, 36],
  [160, 48],
] as const;

function text({ state }: { state: State }): string {
  const { canvas } = drawState(state, chooseGlyphs({ LANG: 'C.UTF-8' }));
  return Array.from({ length: canvas.rows }, (_, y) => canvas.text(y)).join('\n');
}

/** The session as its file would have it, read again: nothing that was worked out before is left of it. */
function readAgain({ session }: State): State['session'] {
  const read = readSession(writeSession(session), 'again.json');
  if (!read.ok) throw new Error(read.fault);
  return read.session;
}

/** A sample session, or one of any beams at all. */
const anyFile = fc.oneof(
  { arbitrary: fc.constantFrom(...SAMPLES).map(({ file }) => file), weight: 3 },
  { arbitrary: anySessionText.map((text) => sessionFile(text)), weight: 1 },
);

test('whatever keys are pressed, in whatever view, the screen shows sound figures and the verdict is that of a full evaluation', () => {
  fc.assert(
    fc.property(
      anyFile,
      fc.constantFrom(...SIZES),
      fc.boolean(),
      anyKeys(60),
      (file, [columns, rows], settles, keys) => {
        let state = twinOf(file, columns, rows).state();
        for (const key of keys) {
          state = pressing(state, key).state;
          if (settles) state = afterEvents(state, { type: 'settle' }).state;
          expect(text({ state }), `after ${key}`).not.toMatch(ABSURD);
        }
        const again = readAgain(state).members[state.member];
        if (again === undefined || state.session.members.length === 0) return;
        const full = reportMember(again.member);
        expect(viewOf(state).verdict.passes).toBe(full.passes);
        expect(memberOf(state).name).toBe(again.member.name);
      },
    ),
    { numRuns: runs(120) },
  );
});
