import { describe, expect, test } from 'vitest';
import { readSession, writeSession } from '../../src/session/index.ts';
import { sessionText } from '../support/session.ts';

const withSheet = (sheet: unknown) => JSON.stringify({ ...JSON.parse(sessionText({})), sheet });
const faultOf = (sheet: unknown) => {
  const read = readSession(withSheet(sheet), 'job.json');
  return read.ok ? null : read.fault;
};

describe('the title block of a session', () => {
  test('is read and written as it is', () => {
    const sheet = {
      firm: 'Larch and Line',
      job: 'Quay',
      jobNumber: '26-04',
      by: 'AB',
      checkedBy: '',
      revision: 'B',
      date: '2026-05-02',
      paper: 'A4',
    };
    const read = readSession(withSheet(sheet), 'job.json');
    if (!read.ok) throw new Error(read.fault);
    expect(read.session.sheet).toEqual(sheet);
    expect(JSON.parse(writeSession(read.session)).sheet).toEqual(sheet);
  });

  test('may be empty or absent', () => {
    expect(faultOf({})).toBeNull();
    const read = readSession(sessionText({}), 'job.json');
    expect(read.ok && writeSession(read.session)).not.toContain('sheet');
  });

  test.each([
    [{ frim: 'x' }, /sheet\.frim.*firm/],
    [{ firm: 3 }, /sheet\.firm/],
    [{ paper: 'A3' }, /sheet\.paper/],
    [{ by: 'a\u001b[31m' }, /sheet\.by.*control or invisible/],
    [{ job: 'x'.repeat(121) }, /sheet\.job/],
    ['none', /sheet/],
  ])('that is %j is refused with its path', (sheet, fault) => {
    expect(faultOf(sheet)).toMatch(fault);
  });
});
