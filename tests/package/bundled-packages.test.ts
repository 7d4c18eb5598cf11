import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, test } from 'vitest';

const read = (name: string): string =>
  readFileSync(fileURLToPath(new URL(`../../${name}`, import.meta.url)), 'utf8');

/** A package in the notice: "ink 8.0.0 (MIT)", then its licence texts. */
const notices = read('dist/thrice.js.licenses.txt')
  .split(`\n\n${'-'.repeat(72)}\n\n`)
  .map((notice) => {
    const [, name, version, licence] = /^(\S+) (\S+) \((.+)\)\n/.exec(notice) ?? [];
    return {
      name: name!,
      version: version!,
      licence: licence!,
      text: notice.slice(notice.indexOf('\n')).trim(),
    };
  });

/** Name and licence of each row of the guide's table. */
const told = [
  ...read('DEVELOPERS.md')
    .split('## What is in the bundle')[1]!
    .split('\n## ')[0]!
    .matchAll(/^\| `([^`]+)` *\| ([^|]+?) *\|/gm),
].map(([, name, licence]) => ({ name: name!, licence: licence! }));

/** What a licence text has to hold to be one. */
const WORDS: Readonly<Record<string, RegExp>> = {
  MIT: /Permission is hereby granted, free of charge[\s\S]+WITHOUT WARRANTY OF ANY KIND/,
  ISC: /Permission to use, copy, modify, and\/or distribute[\s\S]+THE AUTHOR DISCLAIMS ALL WARRANTIES/,
  'Apache-2.0': /Apache License\s+Version 2\.0[\s\S]+TERMS AND CONDITIONS/,
  'SEE LICENSE IN README.md AND LICENSE': /Bitstream Vera[\s\S]+Permission is hereby granted, free of charge/,
};

describe('the packages in the bundle', () => {
  test('are those of the guide’s table, with their licences', () => {
    expect(told).toEqual(notices.map(({ name, licence }) => ({ name, licence })));
    expect(told.length).toBeGreaterThan(0);
  });

  test('each has its licence text and its copyright in the notice that goes with the program', () => {
    for (const { name, licence, text } of notices) {
      expect(text, name).toMatch(WORDS[licence] ?? /^$/);
      expect(text, name).toMatch(/copyright/i);
    }
  });

  test('are of the versions that the lock file pins, each with what its content has to hash to', () => {
    const { packages } = JSON.parse(read('package-lock.json')) as {
      packages: Readonly<Record<string, { version?: string; integrity?: string }>>;
    };
    for (const { name, version } of notices) {
      const pinned = Object.entries(packages).filter(([path]) => path.endsWith(`node_modules/${name}`));
      expect(
        pinned.map(([, entry]) => entry.version),
        name,
      ).toContain(version);
      expect(
        pinned.every(([, { integrity }]) => integrity?.startsWith('sha512-')),
        name,
      ).toBe(true);
    }
  });
});
