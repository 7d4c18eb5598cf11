/** The known name that holds this one between its slashes ("No.1/No.2"), or is the fewest edits away; null where none is near. */
export function nearestName(name: string, known: readonly string[]): string | null {
  const asked = name.toLowerCase();
  const holder = known.find((candidate) => candidate.toLowerCase().split('/').includes(asked));
  if (holder !== undefined) return holder;
  let best: string | null = null;
  let least = Infinity;
  for (const candidate of known) {
    const edits = distance(asked, candidate.toLowerCase());
    if (edits < least) {
      least = edits;
      best = candidate;
    }
  }
  return best !== null && least <= Math.max(2, best.length / 2) ? best : null;
}

/** Levenshtein's distance. */
function distance(a: string, b: string): number {
  let row = Array.from({ length: b.length + 1 }, (_, at) => at);
  for (let i = 1; i <= a.length; i += 1) {
    const next = [i];
    for (let j = 1; j <= b.length; j += 1) {
      const change = row[j - 1]! + (a[i - 1] === b[j - 1] ? 0 : 1);
      next.push(Math.min(change, row[j]! + 1, next[j - 1]! + 1));
    }
    row = next;
  }
  return row[b.length]!;
}
