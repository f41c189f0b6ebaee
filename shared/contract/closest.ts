/** Edit distance of two short words (insertions, deletions, substitutions; Levenshtein's recurrence). */
function editDistance(a: string, b: string): number {
  let previous = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const current = [i];
    for (let j = 1; j <= b.length; j++) {
      const change = (previous[j - 1] ?? 0) + (a[i - 1] === b[j - 1] ? 0 : 1);
      current.push(Math.min(change, (previous[j] ?? 0) + 1, (current[j - 1] ?? 0) + 1));
    }
    previous = current;
  }
  return previous[b.length] ?? 0;
}

/** The known name that a mistyped one most likely meant, if any comes near. */
export function closest(word: string, known: readonly string[]): string | undefined {
  if (word.length > 60) return undefined;
  const lower = word.toLowerCase();
  let best: string | undefined;
  let least = Math.max(1, Math.floor(word.length / 3)) + 1;
  for (const name of known) {
    // The distance is never less than the difference in length.
    if (Math.abs(name.length - word.length) >= least) continue;
    const distance = editDistance(lower, name.toLowerCase());
    if (distance < least) [best, least] = [name, distance];
  }
  return best;
}
