/**
 * A refusal in two words, what is refused and the clause that says so: "notch 4.4.3", "wet 8.1.4"; a limit of the
 * user's own ("too deep") as it is.
 */
export function refusedWord(refused: string): string {
  const what = /^(notch|incised|wet|flat)\b/.exec(refused)?.[1];
  const clause = /NDS (?:Table )?(\d+(?:\.\d+)*)/.exec(refused)?.[1];
  return what === undefined || clause === undefined ? refused : `${what} ${clause}`;
}
