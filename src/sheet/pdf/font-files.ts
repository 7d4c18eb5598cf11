import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';

// Where the program is bundled, a module with the fonts in it takes the place of this one (.build/fonts.mjs).

const require = createRequire(import.meta.url);
const read = (name: string): Uint8Array =>
  readFileSync(require.resolve(`dejavu-fonts-ttf/ttf/DejaVuSansCondensed${name}.ttf`));

/** The fonts that a PDF embeds a part of: DejaVu Sans Condensed (free, Bitstream Vera licence), TrueType. */
export const regular: Uint8Array = read('');
export const bold: Uint8Array = read('-Bold');
