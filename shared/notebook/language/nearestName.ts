/** Names are short; a longer one has no near neighbour worth naming. */
const longestName = 64;

/** Edits between two words (insert, delete, replace, swap of neighbours), given up above `limit`. */
function editDistance(from: string, to: string, limit: number): number {
  if (Math.abs(from.length - to.length) > limit) return limit + 1;
  let beforeLast: number[] = [];
  let last = Array.from({ length: to.length + 1 }, (_, column) => column);
  for (let row = 1; row <= from.length; row += 1) {
    const current = [row];
    let smallest = row;
    for (let column = 1; column <= to.length; column += 1) {
      const same = from[row - 1] === to[column - 1];
      let cost = Math.min(last[column] + 1, current[column - 1] + 1, last[column - 1] + (same ? 0 : 1));
      const swapped =
        row > 1 && column > 1 && from[row - 1] === to[column - 2] && from[row - 2] === to[column - 1];
      if (swapped) cost = Math.min(cost, beforeLast[column - 2] + 1);
      current.push(cost);
      smallest = Math.min(smallest, cost);
    }
    if (smallest > limit) return limit + 1;
    beforeLast = last;
    last = current;
  }
  return last[to.length];
}

/**
 * The candidate that was most likely meant, or undefined if none is near: at most a third of the letters may
 * differ, case aside. A candidate that the word begins, or that begins with the word, counts as near.
 */
export function nearestName(name: string, candidates: Iterable<string>): string | undefined {
  if (name === "" || name.length > longestName) return undefined;
  const word = name.toLowerCase();
  const limit = Math.max(1, Math.floor(word.length / 3));
  let nearest: string | undefined;
  let least = Infinity;
  for (const candidate of candidates) {
    if (candidate === name || candidate.length > longestName) continue;
    const other = candidate.toLowerCase();
    let distance = editDistance(word, other, limit);
    if (distance > limit) {
      const shared = Math.min(word.length, other.length);
      const begins = shared >= 3 && (word.startsWith(other) || other.startsWith(word));
      if (!begins) continue;
      distance = limit + Math.abs(word.length - other.length) / longestName;
    }
    if (candidate.length <= 2 && other !== word && word.length <= 2) continue;
    if (distance < least) {
      least = distance;
      nearest = candidate;
    }
  }
  return nearest;
}
