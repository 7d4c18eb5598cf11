import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import * as z from 'zod';
import { SAMPLES } from '../support/samples.ts';
import { command, sessionText } from '../support/session.ts';

describe('thrice schema', () => {
  test('prints a JSON Schema that every sample session satisfies, read by another reader of schemas', async () => {
    const { status, out, error } = await command('schema');
    expect({ status, error }).toEqual({ status: 0, error: '' });
    const schema = z.fromJSONSchema(JSON.parse(out));
    for (const { file } of SAMPLES) {
      expect(schema.safeParse(JSON.parse(readFileSync(file, 'utf8'))).success).toBe(true);
    }
    for (const wrong of [{}, { spans: '14 ft' }, { spanz: ['14 ft'] }, { section: {} }]) {
      const document = JSON.parse(sessionText(wrong));
      expect(schema.safeParse(document).success).toBe(JSON.stringify(wrong) === '{}');
    }
  });
});

describe('help and version', () => {
  test('--version prints the version alone', async () => {
    expect(await command('--version')).toEqual({ status: 0, out: '0.0.0\n', error: '' });
  });

  test('--help names every command, the statuses and the caution', async () => {
    const { out, status, error } = await command('--help');
    expect({ status, error }).toEqual({ status: 0, error: '' });
    for (const name of ['check', 'rack', 'reach', 'schema'])
      expect(out).toMatch(new RegExp(`^ +${name} `, 'm'));
    expect(out).toContain('Exit status: 0 yes, 1 no, 2 bad input, 3 an output could not be written');
    expect(out).toContain('licensed professional decide');
  });

  test.each(['check', 'rack', 'reach'])('%s --help names its options', async (name) => {
    const { out } = await command(name, '--help');
    for (const option of ['--member', '--set', '--units', '--only', '--json']) expect(out).toContain(option);
  });
});
