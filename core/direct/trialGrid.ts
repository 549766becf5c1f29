/** How finely a trial constant is sampled. */
export interface GridDensity {
  /** Values per decade of distance from the edges of the domain. */
  readonly nearEdges: number;
  /** Values per decade of plain size when there are edges, and when there are none. */
  readonly sizes: number;
  readonly sizesWithoutEdges: number;
  /** Most values between the edges. */
  readonly between: number;
}

export const fineGrid: GridDensity = { nearEdges: 3, sizes: 1, sizesWithoutEdges: 4, between: 60 };
export const coarseGrid: GridDensity = { nearEdges: 1, sizes: 0.5, sizesWithoutEdges: 1, between: 16 };

/** Decades of plain size: from 10⁻¹⁸ to 10¹⁸, so that the choice of units does not matter. */
const SIZE_DECADES = 18;
const FROM_EDGE_DECADES: readonly [number, number] = [-9, 6];

/**
 * Values at which a trial constant is tried: outside the edges of the form's domain at distances that grow by
 * decades, between the edges, and at sizes of either sign from 10⁻¹⁸ to 10¹⁸.
 * @param edges values of the trial at which a form ceases to exist at some reading, any order, finite
 * @returns ascending, without repeats
 */
export function trialGrid(edges: readonly number[], density: GridDensity): number[] {
  const sorted = unique(edges);
  const first = sorted[0];
  const last = sorted[sorted.length - 1];
  const values = [0, ...sizes(first === undefined ? density.sizesWithoutEdges : density.sizes)];
  if (first !== undefined && last !== undefined) {
    const span = last - first || Math.abs(last) || 1;
    const [lowest, highest] = FROM_EDGE_DECADES;
    const count = Math.round((highest - lowest) * density.nearEdges);
    for (let i = 0; i <= count; i++) {
      const distance = span * 10 ** (lowest + i / density.nearEdges);
      values.push(last + distance, first - distance);
    }
    values.push(...gaps(sorted, density.between));
  }
  return unique(values);
}

function sizes(perDecade: number): number[] {
  const count = Math.round(2 * SIZE_DECADES * perDecade);
  return Array.from({ length: count + 1 }, (_, i) => 10 ** (i / perDecade - SIZE_DECADES)).flatMap((size) => [
    size,
    -size,
  ]);
}

/** Middles of the gaps between edges; of some evenly chosen ones when there are many. */
function gaps(sorted: readonly number[], most: number): number[] {
  const count = sorted.length - 1;
  const chosen = Math.min(count, most);
  return Array.from({ length: Math.max(0, chosen) }, (_, i) => {
    const gap = Math.floor((i + 0.5) * (count / chosen));
    return ((sorted[gap] ?? Number.NaN) + (sorted[gap + 1] ?? Number.NaN)) / 2;
  });
}

function unique(values: readonly number[]): number[] {
  const sorted = values.filter(Number.isFinite).sort((p, q) => p - q);
  return sorted.filter((value, i) => i === 0 || value !== sorted[i - 1]);
}
