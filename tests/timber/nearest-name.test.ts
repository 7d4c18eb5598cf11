import { expect, test } from 'vitest';
import { nearestName } from '../../src/timber/nearest-name.ts';

const GRADES = ['Select Structural', 'No.1/No.2', 'No.3', 'Stud'];

test('the nearest name is the one that is the fewest edits away', () => {
  expect(nearestName('No.4', GRADES)).toBe('No.3');
  expect(nearestName('stud', GRADES)).toBe('Stud');
  expect(nearestName('select strctural', GRADES)).toBe('Select Structural');
});

test('a grade that is listed together with another is found by either', () => {
  for (const name of ['No.1', 'no.2']) expect(nearestName(name, GRADES)).toBe('No.1/No.2');
});

test('where none is near there is none', () => {
  expect(nearestName('glulam', GRADES)).toBeNull();
  expect(nearestName('', GRADES)).toBeNull();
});
