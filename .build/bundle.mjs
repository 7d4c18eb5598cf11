import { execFile } from 'node:child_process';
import { chmod, mkdir, readFile, stat, writeFile } from 'node:fs/promises';
import { dirname, join, relative } from 'node:path';
import { fileURLToPath } from 'node:url';
import { promisify } from 'node:util';
import { fontsWithin } from './fonts.mjs';
import { segmenter, standIns } from './stand-ins.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const KILOBYTE = 1000;

// Packages written as CommonJS ask for Node's own modules through `require`, which an ES module has not.
const BANNER = `#!/usr/bin/env node
import { createRequire as __createRequire } from 'node:module';
const require = __createRequire(import.meta.url);`;

/** Ink asks for the React developer tools only with DEV=true; the bundle has none. */
const noDeveloperTools = {
  name: 'no-developer-tools',
  setup(builder) {
    builder.onResolve({ filter: /^react-devtools-core$/ }, ({ path }) => ({ path, namespace: 'empty' }));
    builder.onLoad({ filter: /.*/, namespace: 'empty' }, () => ({ contents: 'export default {};' }));
  },
};

/** What is loaded only when it is asked for (`await import`), and the file beside the program that holds it. */
const ASIDE = new Map([
  ['tinypool', './pool.js'],
  ['../session/samples.ts', './samples.js'],
  ['../sheet/index.ts', './sheet.js'],
  ['./pdf/write-pdf.ts', './sheet-pdf.js'],
]);

const keepAside = {
  name: 'keep-aside',
  setup(builder) {
    builder.onResolve({ filter: /^[^/]/ }, ({ path, kind }) =>
      kind === 'dynamic-import' && ASIDE.has(path) ? { path: ASIDE.get(path), external: true } : undefined,
    );
  },
};

/** What makes this program quicker than a plain bundle of Ink: see the stand-ins. */
const MEASURES = {
  plugins: [standIns],
  inject: [segmenter],
  define: {
    'Intl.Segmenter': 'QuickSegmenter',
    // The layout engine would fetch its wasm from a data URL, which loads a whole HTTP client: 40 to 75 ms.
    fetch: 'undefined',
  },
};
const NO_MEASURES = { plugins: [], inject: [], define: {} };

/**
 * Bundles `entry` into the one executable file `outfile`, which needs no node_modules.
 * Without `measures` it is bundled the same way but for the stand-ins and Node's fetch: for comparison.
 */
export async function bundle({ entry, outfile, measures = true }) {
  const { build } = await import('esbuild');
  const { plugins, inject, define } = measures ? MEASURES : NO_MEASURES;
  const { metafile, outputFiles } = await build({
    absWorkingDir: root,
    entryPoints: [entry],
    outfile,
    bundle: true,
    write: false,
    metafile: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    jsx: 'automatic',
    minify: true,
    legalComments: 'none',
    banner: { js: BANNER },
    plugins: [noDeveloperTools, keepAside, fontsWithin, ...plugins],
    loader: { '.ttf': 'binary' },
    inject,
    define: {
      'process.env.NODE_ENV': '"production"',
      'process.env.DEV': '"false"',
      ...define,
    },
    logLevel: 'warning',
  });
  const [output] = outputFiles;
  await mkdir(dirname(output.path), { recursive: true });
  const code = inAscii(output.text);
  await writeFile(output.path, code);
  await chmod(output.path, 0o755);
  return { path: output.path, bytes: code.length, metafile };
}

/** One character beyond ASCII, such as in a pattern, makes the engine read and hold the whole file at two bytes each. */
function inAscii(code) {
  return code.replace(/[^\0-\x7f]/g, (unit) => `\\u${unit.charCodeAt(0).toString(16).padStart(4, '0')}`);
}

/** What is published: the program, and beside it what it loads only when it is asked for. */
const FILES = [
  { entry: 'src/main.ts', outfile: 'dist/thrice.js' },
  { entry: 'src/commands/schedule/worker.ts', outfile: 'dist/schedule-worker.js' },
  { entry: 'node_modules/tinypool/dist/index.js', outfile: 'dist/pool.js' },
  { entry: 'src/session/samples.ts', outfile: 'dist/samples.js' },
  { entry: 'src/sheet/index.ts', outfile: 'dist/sheet.js' },
  { entry: 'src/sheet/pdf/write-pdf.ts', outfile: 'dist/sheet-pdf.js' },
  // The pool looks for its own end of a thread here.
  { entry: 'node_modules/tinypool/dist/entry/worker.js', outfile: 'dist/entry/worker.js' },
];
/** What the last build was made from, a path a line. */
const SOURCES = 'dist/thrice.js.sources.txt';
const LICENSES = 'dist/thrice.js.licenses.txt';
/** The manual page, as the program itself prints it. */
const MANUAL = 'dist/thrice.1';
/** The build itself is a source too. */
const BUILDERS = [
  '.build/bundle.mjs',
  '.build/fonts.mjs',
  '.build/stand-ins.mjs',
  '.build/licenses.mjs',
  'package-lock.json',
];

/** Whether the bundle is newer than everything it was made from: asking costs a tenth of building. */
async function isFresh() {
  try {
    const changed = async (path) => (await stat(join(root, path))).mtimeMs;
    const outputs = [...FILES.map(({ outfile }) => outfile), MANUAL];
    const built = Math.min(...(await Promise.all(outputs.map(changed))));
    const sources = (await readFile(join(root, SOURCES), 'utf8')).trim().split('\n');
    const times = await Promise.all(sources.map(changed));
    return times.every((time) => time < built);
  } catch {
    return false;
  }
}

async function buildProgram() {
  if (await isFresh()) return;
  const { collectLicenses } = await import('./licenses.mjs');
  const built = await Promise.all(FILES.map(bundle));
  const inputs = new Set(built.flatMap(({ metafile }) => Object.keys(metafile.inputs)));
  const sources = [...inputs].filter((input) => !input.startsWith('empty:'));
  await writeFile(join(root, SOURCES), `${[...BUILDERS, ...sources].join('\n')}\n`);
  await writeFile(
    join(root, LICENSES),
    await collectLicenses(
      built.map(({ metafile }) => metafile),
      root,
    ),
  );
  const { stdout } = await promisify(execFile)(process.execPath, [join(root, FILES[0].outfile), 'manual']);
  await writeFile(join(root, MANUAL), stdout);
  for (const { path, bytes } of built) {
    console.log(`${relative(process.cwd(), path)} ${Math.round(bytes / KILOBYTE)} kB`);
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  await buildProgram().catch((fault) => {
    // What esbuild found it has told already.
    if (!Array.isArray(fault.errors)) console.error(fault);
    process.exitCode = 1;
  });
}
