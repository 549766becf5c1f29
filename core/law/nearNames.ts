/** Names at most two edits away from `text`, or that contain it; the nearest first, at most three. */
export function nearNames(text: string, names: readonly string[]): string[] {
  const wanted = text.toLowerCase();
  const most = wanted.length <= 3 ? 1 : wanted.length <= 12 ? 2 : 4;
  return names
    .map((name) => ({ name, far: editDistance(wanted, name.toLowerCase()) }))
    .filter(({ name, far }) => far <= most || (wanted.length > 3 && name.toLowerCase().includes(wanted)))
    .sort((a, b) => a.far - b.far)
    .slice(0, 3)
    .map(({ name }) => name);
}

/** Number of insertions, deletions and replacements that turn one text into the other. */
function editDistance(from: string, to: string): number {
  if (Math.abs(from.length - to.length) > 12) return 99;
  let row = Array.from({ length: to.length + 1 }, (_, j) => j);
  for (let i = 1; i <= from.length; i++) {
    const next = [i];
    for (let j = 1; j <= to.length; j++) {
      const replaced = (row[j - 1] ?? 0) + (from[i - 1] === to[j - 1] ? 0 : 1);
      next.push(Math.min(replaced, (row[j] ?? 0) + 1, (next[j - 1] ?? 0) + 1));
    }
    row = next;
  }
  return row[to.length] ?? 99;
}
