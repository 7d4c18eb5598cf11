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
    if (licenses.length === 0) licenses.push(textOf(about));
    texts.push(
      [`${name} ${about.version} (${nameOf(about, licenses)})`, ...licenses.map((text) => text.trim())].join(
        '\n\n',
      ),
    );
  }
  return `${texts.join(`\n\n${'-'.repeat(72)}\n\n`)}\n`;
}

/** The licence as its package names it, or as its text shows. */
function nameOf({ name, license }, texts) {
  if (license !== undefined) return license;
  if (texts.some((text) => text.includes(MIT.slice(0, 60)))) return 'MIT';
  throw new Error(`${name} names no licence`);
}

/** The text of a package that names its licence and leaves the text out. */
function textOf({ name, license, author }) {
  const holder = typeof author === 'string' ? author : author?.name;
  if (license !== 'MIT' || holder === undefined)
    throw new Error(`${name} has no licence text, and none can stand for it`);
  return `MIT License (named by the package, which leaves out its text)\n\nCopyright (c) ${holder}\n\n${MIT}`;
}

/** As the Open Source Initiative gives it. */
const MIT = `Permission is hereby granted, free of charge, to any person obtaining a copy of this software and associated documentation files (the "Software"), to deal in the Software without restriction, including without limitation the rights to use, copy, modify, merge, publish, distribute, sublicense, and/or sell copies of the Software, and to permit persons to whom the Software is furnished to do so, subject to the following conditions:

The above copyright notice and this permission notice shall be included in all copies or substantial portions of the Software.

THE SOFTWARE IS PROVIDED "AS IS", WITHOUT WARRANTY OF ANY KIND, EXPRESS OR IMPLIED, INCLUDING BUT NOT LIMITED TO THE WARRANTIES OF MERCHANTABILITY, FITNESS FOR A PARTICULAR PURPOSE AND NONINFRINGEMENT. IN NO EVENT SHALL THE AUTHORS OR COPYRIGHT HOLDERS BE LIABLE FOR ANY CLAIM, DAMAGES OR OTHER LIABILITY, WHETHER IN AN ACTION OF CONTRACT, TORT OR OTHERWISE, ARISING FROM, OUT OF OR IN CONNECTION WITH THE SOFTWARE OR THE USE OR OTHER DEALINGS IN THE SOFTWARE.`;
