/**
 * Names close to a misspelt one: optimal string alignment distance (insertion, deletion, substitution, swap of
 * neighbours), ignoring case. At most `limit` candidates within a third of the longer name's length, nearest first;
 * a name contained in another counts as near.
 */
export function nearestNames(name: string, candidates: readonly string[], limit = 3): string[] {
  // A name far longer than any candidate cannot be near one; cutting it keeps the cost bounded.
  const wanted = name.slice(0, 64).toLowerCase();
  const scored: { candidate: string; distance: number }[] = [];
  for (const candidate of candidates) {
    const other = candidate.toLowerCase();
    const contained =
      Math.min(wanted.length, other.length) >= 3 && (other.includes(wanted) || wanted.includes(other));
    const longest = Math.max(wanted.length, other.length);
    // So many insertions at least: no need to count the rest.
    if (!contained && Math.abs(wanted.length - other.length) > longest / 3) continue;
    const distance = contained ? 0.5 : alignmentDistance(wanted, other);
    if (contained || distance <= longest / 3) scored.push({ candidate, distance });
  }
  scored.sort((a, b) => a.distance - b.distance || a.candidate.localeCompare(b.candidate, "en"));
  return scored.slice(0, limit).map(({ candidate }) => candidate);
}

/** " Did you mean …?" with the nearest names quoted, or an empty string. */
export function suggestion(name: string, candidates: readonly string[]): string {
  const near = nearestNames(name, candidates);
  return near.length > 0 ? ` Did you mean ${near.map((entry) => `"${entry}"`).join(" or ")}?` : "";
}

function alignmentDistance(a: string, b: string): number {
  let beforeLast: number[] = [];
  let last = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const row = [i];
    for (let j = 1; j <= b.length; j++) {
      const cost = a[i - 1] === b[j - 1] ? 0 : 1;
      let best = Math.min(last[j] + 1, row[j - 1] + 1, last[j - 1] + cost);
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1]) {
        best = Math.min(best, beforeLast[j - 2] + 1);
      }
      row.push(best);
    }
    beforeLast = last;
    last = row;
  }
  return last[b.length];
}
