import { readdir, readFile } from 'node:fs/promises';
import { join } from 'node:path';

const PACKAGE = /^(.*node_modules\/((?:@[^/]+\/)?[^/]+))\//;
const LICENSE_FILE = /^(licen[cs]e|copying|notice)/i;

/** The licence texts of every package whose code is in the bundles, from esbuild's metafiles. */
export async function collectLicenses(metafiles, root) {
  const folders = new Map();
  for (const { inputs } of metafiles.flatMap(({ outputs }) => Object.values(outputs))) {
    for (const [path, { bytesInOutput }] of Object.entries(inputs)) {
      const [, folder, name] = PACKAGE.exec(path) ?? [];
      if (name !== undefined && bytesInOutput > 0) folders.set(name, join(root, folder));
    }
  }
  const texts = [];
  for (const [name, folder] of [...folders].sort(([a], [b]) => (a < b ? -1 : 1))) {
    const about = JSON.parse(await readFile(join(folder, 'package.json'), 'utf8'));
    const files = (await readdir(folder)).filter((file) => LICENSE_FILE.test(file));
    const licenses = await Promise.all(files.map((file) => readFile(join(folder, file), 'utf8')));
    texts.push(
      [`${name} ${about.version} (${about.license})`, ...licenses.map((text) => text.trim())].join('\n\n'),
    );
  }
  return `${texts.join(`\n\n${'-'.repeat(72)}\n\n`)}\n`;
}
