/** The word of the list that a misspelt one most likely means; null where none is near. */
export function nearestWord(word: string, words: Iterable<string>): string | null {
  const allowed = Math.min(2, Math.floor(word.length / 2));
  if (word.length > 40) return null;
  let nearest: string | null = null;
  let least = allowed + 1;
  for (const candidate of words) {
    if (Math.abs(candidate.length - word.length) >= least) continue;
    const edits = distance(word.toLowerCase(), candidate.toLowerCase());
    if (edits < least) {
      least = edits;
      nearest = candidate;
    }
  }
  return nearest;
}

/** A hint to end a sentence with: `; did you mean "gain"?` or nothing. */
export function meaning(word: string, words: Iterable<string>): string {
  const nearest = nearestWord(word, words);
  return nearest === null ? "" : `; did you mean "${nearest}"?`;
}

/** Insertions, deletions and replacements between two words (Wagner and Fischer 1974). */
function distance(from: string, to: string): number {
  let previous = Array.from({ length: to.length + 1 }, (_, column) => column);
  for (let row = 1; row <= from.length; row += 1) {
    const current = [row];
    for (let column = 1; column <= to.length; column += 1) {
      const replaced = (previous[column - 1] ?? 0) + (from[row - 1] === to[column - 1] ? 0 : 1);
      const removed = (previous[column] ?? 0) + 1;
      const added = (current[column - 1] ?? 0) + 1;
      current.push(Math.min(replaced, removed, added));
    }
    previous = current;
  }
  return previous[to.length] ?? 0;
}
