/** What a sheet is written as, by the end of its file's name. */
export const FORMATS = ['pdf', 'html', 'md', 'txt'] as const;
export type Format = (typeof FORMATS)[number];

/** The format that a file's name ends in; null for any other end. */
export function formatOf(file: string): Format | null {
  const end = /\.([a-z]+)$/i.exec(file)?.[1]?.toLowerCase();
  return FORMATS.find((format) => format === end) ?? null;
}
