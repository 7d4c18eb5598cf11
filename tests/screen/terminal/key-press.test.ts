import type { Key } from 'ink';
import { describe, expect, test } from 'vitest';
import { readKeys, readPaste } from '../../../src/screen/terminal/key-press.ts';

const NO_KEY: Key = {
  upArrow: false,
  downArrow: false,
  leftArrow: false,
  rightArrow: false,
  pageDown: false,
  pageUp: false,
  home: false,
  end: false,
  return: false,
  escape: false,
  ctrl: false,
  shift: false,
  tab: false,
  backspace: false,
  delete: false,
  meta: false,
  super: false,
  hyper: false,
  capsLock: false,
  numLock: false,
};
const press = (input: string, key: Partial<Key> = {}) => readKeys(input, { ...NO_KEY, ...key });
const char = (letter: string, held: object = {}) => ({
  name: 'char',
  char: letter,
  shift: false,
  ctrl: false,
  meta: false,
  ...held,
});
const named = (name: string, held: object = {}) => ({
  name,
  shift: false,
  ctrl: false,
  meta: false,
  ...held,
});

test('keys written at once are as many key presses', () => {
  expect(press('uu')).toEqual([char('u'), char('u')]);
});

test('an Enter among digits is a key of its own', () => {
  expect(press('12\r')).toEqual([char('1'), char('2'), named('enter')]);
});

test('tab, backspace and Escape among characters are keys of their own', () => {
  expect(press('a\tb\x7f\x1b')).toEqual([
    char('a'),
    named('tab'),
    char('b'),
    named('backspace'),
    named('escape'),
  ]);
});

test('a control letter among characters is that letter with ctrl', () => {
  expect(press('a\x03')).toEqual([char('a'), char('c', { ctrl: true })]);
});

test('control codes that are no key are dropped', () => {
  expect(press('\x00a\x1c\x9b')).toEqual([char('a')]);
});

test('a capital letter says it was shifted', () => {
  expect(press('Q', { shift: true })).toEqual([char('Q', { shift: true })]);
  expect(press('aB')).toEqual([char('a'), char('B', { shift: true })]);
});

test('a character outside the basic plane is one key press', () => {
  expect(press('𝑙')).toEqual([char('𝑙')]);
});

test('a control letter alone is one key press', () => {
  expect(press('c', { ctrl: true })).toEqual([char('c', { ctrl: true })]);
});

describe('a special key comes with what was held', () => {
  test.each<[Partial<Key>, string]>([
    [{ upArrow: true }, 'up'],
    [{ downArrow: true }, 'down'],
    [{ leftArrow: true }, 'left'],
    [{ rightArrow: true }, 'right'],
    [{ return: true }, 'enter'],
    [{ tab: true }, 'tab'],
    [{ backspace: true }, 'backspace'],
    [{ delete: true }, 'delete'],
    [{ home: true }, 'home'],
    [{ end: true }, 'end'],
    [{ pageUp: true }, 'pageup'],
    [{ pageDown: true }, 'pagedown'],
  ])('%j is %s', (key, name) => {
    expect(press('', key)).toEqual([named(name)]);
    expect(press('', { ...key, shift: true })).toEqual([named(name, { shift: true })]);
  });
});

test('two Escapes in one write are two key presses, neither with Alt', () => {
  expect(press('', { escape: true })).toEqual([named('escape')]);
  expect(press('', { escape: true, meta: true })).toEqual([named('escape'), named('escape')]);
});

test('a character with Alt is no key', () => {
  expect(press('x', { meta: true })).toEqual([]);
  expect(press('c', { meta: true, ctrl: true })).toEqual([]);
});

test('letting go of a key presses nothing', () => {
  expect(press('a', { eventType: 'release' })).toEqual([]);
});

test('a pasted text becomes one line without controls', () => {
  expect(readPaste("14'-6\r\n")).toBe("14'-6");
  expect(readPaste('14\t6\x1b[2J\nft')).toBe('14 6 [2J ft');
});
