import { expect, test } from 'vitest';
import { sampleCopy, started } from './explorer.ts';

const BY_EAR = { INK_SCREEN_READER: 'true' };

test('by ear the explorer tells sentences that stay, one after another, on the terminal itself', async () => {
  const session = started([sampleCopy()], { columns: 120, rows: 50, env: BY_EAR });
  await session.until('Control L says all of this again');
  expect(session.onAlternateScreen()).toBe(false);
  session.press('right');
  await session.until('Bending governs at 1.32, up 0.04; fails.');
  session.press('enter');
  await session.until(/Type span/);
  session.press('1', '6');
  await session.until(/^span: 16$/m);
  session.press('enter');
  await session.until('Span 16 ft 0 in.');
  const written = session.written().length;
  session.press('ctrl+l');
  await session.until(() => session.written().slice(written).includes('Knobs: span 16 ft 0 in, in hand'));
  session.press('s');
  await session.until(/Kept in/i);
  session.press('q');
  expect(await session.exit()).toEqual({ code: 0, screenRestored: true, modesRestored: true });
});
