/**
 * npm run bench [-- NAME ...]: runs each bench named, or all. A bench is a file here that exports
 * `run(): Promise<void>` (or `run(): void`) and prints its own lines; it is bundled on the way, so that it
 * may be TypeScript and import the program's sources.
 */
import { existsSync } from 'node:fs';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { build } from 'esbuild';

const BENCHES = ['start', 'frame', 'held', 'core', 'beams', 'explore', 'links', 'rows', 'sheet'];

const root = fileURLToPath(new URL('../../', import.meta.url));
/** Not under dist/, which is what gets published. */
const OUT = `${root}node_modules/.cache/thrice-bench`;
/** The bundler is a program of its own, which finds its files beside itself: not to be bundled. */
const leaveBundler = {
  name: 'leave-bundler',
  setup(builder) {
    const path = pathToFileURL(`${root}.build/bundle.mjs`).href;
    builder.onResolve({ filter: /\.build\/bundle\.mjs$/ }, () => ({ path, external: true }));
  },
};
const chosen = process.argv.slice(2);
const unknown = chosen.filter((name) => !BENCHES.includes(name));
if (unknown.length > 0) {
  console.error(`no such bench: ${unknown.join(', ')}; there are ${BENCHES.join(', ')}`);
  process.exit(2);
}

for (const name of chosen.length > 0 ? chosen : BENCHES) {
  const source = `${root}tests/bench/${name}.ts`;
  if (!existsSync(source)) {
    console.log(`${name}: not there yet\n`);
    continue;
  }
  const outfile = `${OUT}/${name}.mjs`;
  await build({
    entryPoints: [source],
    outfile,
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    jsx: 'automatic',
    packages: 'external',
    plugins: [leaveBundler],
    define: { 'process.env.NODE_ENV': '"production"' },
    logLevel: 'warning',
  });
  const { run } = await import(pathToFileURL(outfile).href);
  await run();
  console.log('');
}
// Pseudo-terminals of ended programs may keep the event loop alive.
process.exit();
