/** Bundles `entry` into the one executable file `outfile`; without `measures` it has no stand-ins. */
export function bundle(options: {
  readonly entry: string;
  readonly outfile: string;
  readonly measures?: boolean;
}): Promise<{ readonly path: string; readonly bytes: number }>;
