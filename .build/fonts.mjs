import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('..', import.meta.url));

/** An esbuild plugin: the fonts of a PDF stand in the bundle, where the source reads them from their package. */
export const fontsWithin = {
  name: 'fonts-within',
  setup(build) {
    build.onLoad({ filter: /src\/sheet\/pdf\/font-files\.ts$/ }, () => ({
      contents: `
        export { default as regular } from 'dejavu-fonts-ttf/ttf/DejaVuSansCondensed.ttf';
        export { default as bold } from 'dejavu-fonts-ttf/ttf/DejaVuSansCondensed-Bold.ttf';`,
      loader: 'js',
      resolveDir: root,
    }));
  },
};
