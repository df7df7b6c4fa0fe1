// The known word that a mistyped one most likely stands for.

/**
 * The candidate nearest to `word` by insertions, deletions, exchanges and swaps of neighbours (Damerau's distance),
 * at most one for every three letters; undefined where none is near. Case alone is the smallest difference.
 */
export function nearest(word: string, candidates: Iterable<string>): string | undefined {
  if (word.length > LONGEST) return undefined;
  const lower = word.toLowerCase();
  let best: string | undefined;
  let least = Math.max(1, Math.floor(word.length / 3)) + 0.5;
  for (const candidate of candidates) {
    if (candidate === word || Math.abs(candidate.length - word.length) > least) continue;
    const distance = candidate.toLowerCase() === lower ? 0.5 : distanceBetween(lower, candidate.toLowerCase());
    // A word of one or two letters that shares none with the candidate is no mistyping of it.
    if (distance >= Math.max(word.length, candidate.length)) continue;
    if (distance < least) {
      least = distance;
      best = candidate;
    }
  }
  return best;
}

const LONGEST = 64;

function distanceBetween(a: string, b: string): number {
  let beforeLast: number[] = [];
  let last = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const row = [i];
    for (let j = 1; j <= b.length; j++) {
      const exchange = last[j - 1]! + (a[i - 1] === b[j - 1] ? 0 : 1);
      let cost = Math.min(exchange, last[j]! + 1, row[j - 1]! + 1);
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1])
        cost = Math.min(cost, beforeLast[j - 2]! + 1);
      row.push(cost);
    }
    beforeLast = last;
    last = row;
  }
  return last[b.length]!;
}
