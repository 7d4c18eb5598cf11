import type { Column } from '../sheet.ts';

/** A column of words. */
export const left = (head: string): Column => ({ head, align: 'left' });
/** A column of figures. */
export const right = (head: string): Column => ({ head, align: 'right' });
