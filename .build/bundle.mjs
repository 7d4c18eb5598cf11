import { chmod, mkdir, readFile, stat, writeFile } from 'node:fs/promises';
import { dirname, join, relative } from 'node:path';
import { fileURLToPath } from 'node:url';
import { segmenter, standIns } from './stand-ins.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));
const KILOBYTE = 1000;

// Packages written as CommonJS ask for Node's own modules through `require`, and write-file-atomic for its own
// file name: an ES module has neither.
const BANNER = `#!/usr/bin/env node
import { createRequire as __createRequire } from 'node:module';
const require = __createRequire(import.meta.url);
const __filename = import.meta.filename;`;

/** Ink asks for the React developer tools only with DEV=true; the bundle has none. */
const noDeveloperTools = {
  name: 'no-developer-tools',
  setup(builder) {
    builder.onResolve({ filter: /^react-devtools-core$/ }, ({ path }) => ({ path, namespace: 'empty' }));
    builder.onLoad({ filter: /.*/, namespace: 'empty' }, () => ({ contents: 'export default {};' }));
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
    plugins: [noDeveloperTools, ...plugins],
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
  await writeFile(output.path, output.contents);
  await chmod(output.path, 0o755);
  return { path: output.path, bytes: output.contents.length, metafile };
}

const OUTPUT = 'dist/thrice.js';
/** What the last build was made from, a path a line. */
const SOURCES = 'dist/thrice.js.sources.txt';
/** The build itself is a source too. */
const BUILDERS = ['.build/bundle.mjs', '.build/stand-ins.mjs', '.build/licenses.mjs', 'package-lock.json'];

/** Whether the bundle is newer than everything it was made from: asking costs a tenth of building. */
async function isFresh() {
  try {
    const changed = async (path) => (await stat(join(root, path))).mtimeMs;
    const built = await changed(OUTPUT);
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
  const { path, bytes, metafile } = await bundle({ entry: 'src/main.ts', outfile: OUTPUT });
  const sources = Object.keys(metafile.inputs).filter((input) => !input.startsWith('empty:'));
  await writeFile(join(root, SOURCES), `${[...BUILDERS, ...sources].join('\n')}\n`);
  await writeFile(`${path}.licenses.txt`, await collectLicenses(metafile, root));
  console.log(`${relative(process.cwd(), path)} ${Math.round(bytes / KILOBYTE)} kB`);
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  await buildProgram().catch((fault) => {
    // What esbuild found it has told already.
    if (!Array.isArray(fault.errors)) console.error(fault);
    process.exitCode = 1;
  });
}
