/** What no one should ever read on a screen. */
export const ABSURD = /NaN|undefined|Infinity|null|\[object/;
