const LONGEST = 40;
/** A hint is not worth comparing with every part of a large board. */
const MOST_COMPARED = 500;

/** The word of the list that a misspelt one most likely means; null where none is near. */
function nearestWord(word: string, words: Iterable<string>): string | null {
  const allowed = Math.min(2, Math.floor(word.length / 2));
  if (word.length > LONGEST) return null;
  let nearest: string | null = null;
  let least = allowed + 1;
  let compared = 0;
  for (const candidate of words) {
    compared += 1;
    if (compared > MOST_COMPARED) break;
    if (Math.abs(candidate.length - word.length) >= least) continue;
    const edits = distance(word.toLowerCase(), candidate.toLowerCase());
    if (edits < least) {
      least = edits;
      nearest = candidate;
    }
  }
  return nearest;
}

/** The end of a sentence about a word that is not known: `; did you mean "gain"?`, or a full stop. */
export function meaning(word: string, words: Iterable<string>): string {
  const nearest = nearestWord(word, words);
  return nearest === null ? "." : `; did you mean "${nearest}"?`;
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
