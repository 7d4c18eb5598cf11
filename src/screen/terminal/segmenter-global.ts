/** Under this name the bundler puts the stand-in wherever a package says Intl.Segmenter. */
export { Segmenter as QuickSegmenter } from './segmenter.ts';
