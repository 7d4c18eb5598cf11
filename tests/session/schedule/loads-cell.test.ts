import { describe, expect, test } from 'vitest';
import { readLoadsCell, writeLoadsCell } from '../../../src/session/schedule/loads-cell.ts';

describe('loads in one cell', () => {
  test('are read as the session file has them', () => {
    expect(
      readLoadsCell(
        'dead 60 plf from 0 ft to 8 ft; live 0 plf .. 90 plf from 8 ft to 14\'-6"; snow 850 lb at 5 ft; wind 1.2 kN/m;',
        ['loads'],
      ),
    ).toEqual([
      { kind: 'dead', line: '60 plf', from: '0 ft', to: '8 ft' },
      { kind: 'live', line: ['0 plf', '90 plf'], from: '8 ft', to: '14\'-6"' },
      { kind: 'snow', point: '850 lb', at: '5 ft' },
      { kind: 'wind', line: '1.2 kN/m' },
    ]);
  });

  test('are written as they are read', () => {
    const text = 'dead -60 plf to 8 ft; live 0 plf .. 90 plf from 8 ft; snow -850 lb at 5 1/2 ft';
    expect(writeLoadsCell(readLoadsCell(text, []) as never)).toBe(text);
  });

  test('say what is wrong', () => {
    expect(() => readLoadsCell('heavy', ['loads'])).toThrow('"heavy" is no load; write snow 850 lb at 5 ft');
  });
});
