import { readFileSync } from 'node:fs';
import { sep } from 'node:path';
import { fileURLToPath } from 'node:url';

const inTerminal = (name) => fileURLToPath(new URL(`../src/screen/terminal/${name}`, import.meta.url));

/** Packages that Ink spends most of a frame in, and what takes their place. */
const PACKAGES = new Map([
  ['string-width', inTerminal('string-width.ts')],
  ['@alcalzone/ansi-tokenize', inTerminal('ansi-tokenize.ts')],
]);

/** Modules inside Ink, and what takes their place. */
const INK_MODULES = new Map([
  ['./dom.js', inTerminal('ink-dom.ts')],
  ['./output.js', inTerminal('ink-output.ts')],
  ['./line-update.js', inTerminal('ink-line-update.ts')],
  ['./sanitize-ansi.js', inTerminal('ink-sanitize.ts')],
]);
/** The version whose modules those were written for and are tested against. */
const INK_VERSION = '8.0.0';
const INK_BUILD = `${sep}node_modules${sep}ink${sep}build${sep}`;

function installedInk() {
  const about = new URL('../node_modules/ink/package.json', import.meta.url);
  return JSON.parse(readFileSync(about, 'utf8')).version;
}

/** An esbuild plugin. A stand-in may import what it stands for. */
export const standIns = {
  name: 'stand-ins',
  setup(build) {
    const standInFor = (standIn, importer) => (importer === standIn ? undefined : { path: standIn });
    build.onResolve({ filter: /^(string-width|@alcalzone\/ansi-tokenize)$/ }, ({ path, importer }) =>
      standInFor(PACKAGES.get(path), importer),
    );

    if (installedInk() !== INK_VERSION) {
      console.warn(
        `Ink is not ${INK_VERSION}: built without the stand-ins for its modules, which are quicker`,
      );
      return;
    }
    build.onResolve({ filter: /^\.\/(dom|line-update|output|sanitize-ansi)\.js$/ }, ({ path, importer }) =>
      importer.includes(INK_BUILD) ? standInFor(INK_MODULES.get(path), importer) : undefined,
    );
  },
};

/** esbuild puts its exports where bundle.mjs's `define` names them. */
export const segmenter = inTerminal('segmenter-global.ts');
