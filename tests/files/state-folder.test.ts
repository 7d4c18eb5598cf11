import { expect, it } from 'vitest';
import { stateFolder } from '../../src/files/state-folder.ts';

// XDG Base Directory Specification 0.8: $XDG_STATE_HOME, by default ~/.local/state; a path that is not whole is ignored.
it.each([
  [{ XDG_STATE_HOME: '/var/state', HOME: '/home/ada' }, '/var/state/thrice'],
  [{ HOME: '/home/ada' }, '/home/ada/.local/state/thrice'],
  [{ XDG_STATE_HOME: '', HOME: '/home/ada' }, '/home/ada/.local/state/thrice'],
  [{ XDG_STATE_HOME: 'here', HOME: '/home/ada' }, '/home/ada/.local/state/thrice'],
  [{}, null],
  [{ HOME: '' }, null],
])('with %j the folder for state is %s', (env, folder) => {
  expect(stateFolder(env, 'linux')).toBe(folder);
});

it('is the local one of a Windows user where there is one', () => {
  expect(stateFolder({ LOCALAPPDATA: '/users/ada/local', HOME: '/home/ada' }, 'win32')).toBe(
    '/users/ada/local/thrice',
  );
});
