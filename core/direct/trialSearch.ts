import type { Law, StraightForm } from '../law/law.ts';
import type { WeightedReadings } from './lawModel.ts';
import { type Candidate, lineStarts } from './lineStarts.ts';
import { coarseGrid, fineGrid, trialGrid } from './trialGrid.ts';

/** What a search found, and how much it did. */
export interface SearchResult {
  /** Local minima of the sum of squares over the trial constants, best first. */
  readonly candidates: readonly Candidate[];
  readonly tried: number;
  /** True when values were left out to stay within the bound. */
  readonly cut: boolean;
}

/** A function of one coordinate that may not exist. */
type Profile = (value: number) => Candidate | null;

/** Golden-section steps that follow a local minimum of the grid. */
const REFINEMENTS = 10;
/** Times that the line is fitted at one value of the trials, by their number. */
const PASSES: readonly number[] = [8, 4, 2];

/**
 * Profiles the strict law's sum of squares over a form's trial constants: at each value of the trials the line gives
 * the other constants; local minima over the grid are returned.
 * @param constants aligned with `law.constants`: known ones filled in, NaN for the others
 * @param mostTried bound on the number of lines fitted, so that the time is bounded and the digits do not depend on it
 */
export function trialSearch(
  law: Law,
  form: StraightForm,
  readings: WeightedReadings,
  constants: Float64Array,
  mostTried: number,
): SearchResult {
  const places = form.trials.map((name) => law.constants.indexOf(name));
  const startAt = lineStarts(law, form, readings);
  let tried = 0;
  const at = (...trials: number[]): Candidate | null => {
    tried++;
    const filled = Float64Array.from(constants);
    trials.forEach((value, k) => {
      filled[places[k] ?? 0] = value;
    });
    return startAt(filled, PASSES[places.length] ?? 2);
  };

  if (places.length === 0) {
    const only = at();
    return { candidates: only ? [only] : [], tried, cut: false };
  }
  if (places.length === 1) {
    const grid = trialGrid(edgesAt(form, 0, readings, constants), fineGrid);
    const kept = every(grid, mostTried);
    return { candidates: minimaOf(at, kept, 8), tried, cut: kept.length < grid.length };
  }
  const [outer, inner] = dependsOn(form, 0, places[1] ?? -1) ? [1, 0] : [0, 1];
  const outerGrid = trialGrid(edgesAt(form, outer, readings, constants), coarseGrid);
  const found: Candidate[] = [];
  const rows: (Candidate | null)[] = [];
  let cut = false;
  for (const value of outerGrid) {
    const filled = Float64Array.from(constants);
    filled[places[outer] ?? 0] = value;
    const innerGrid = trialGrid(edgesAt(form, inner, readings, filled), coarseGrid);
    const kept = every(innerGrid, Math.max(8, Math.floor(mostTried / outerGrid.length)));
    cut = cut || kept.length < innerGrid.length;
    const row = minimaOf((other) => (outer === 0 ? at(value, other) : at(other, value)), kept, 3, 0);
    rows.push(row[0] ?? null);
    found.push(...row.slice(1));
  }
  // Minima of the rows' best first, then the best of the rows' other minima: a valley may run across rows.
  const profile = localMinima(rows).flatMap((i) => rows[i] ?? []);
  return { candidates: [...best(profile, 8), ...best(found, 4)], tried, cut };
}

/** Local minima of a profile over a grid, each refined between its neighbours, best first. */
function minimaOf(
  profile: Profile,
  grid: readonly number[],
  most: number,
  refinements = REFINEMENTS,
): Candidate[] {
  const row = grid.map((value) => profile(value));
  const places = localMinima(row)
    .sort((i, j) => sumAt(row, i) - sumAt(row, j))
    .slice(0, most);
  const minima = places.flatMap((i) => {
    const start = row[i];
    return start ? [refine(profile, grid, i, start, refinements)] : [];
  });
  return best(minima, most);
}

/** Indices whose value is below one neighbour and not above the other; what does not exist counts as +∞. */
function localMinima(row: readonly (Candidate | null)[]): number[] {
  return Array.from(row.keys()).filter((i) => {
    const here = sumAt(row, i);
    const left = sumAt(row, i - 1);
    const right = sumAt(row, i + 1);
    return Number.isFinite(here) && here <= left && here <= right && (here < left || here < right);
  });
}

function sumAt(row: readonly (Candidate | null)[], i: number): number {
  return row[i]?.sumOfSquares ?? Number.POSITIVE_INFINITY;
}

/** Golden sections between the neighbours of a grid minimum, along the grid's own spacing. */
function refine(
  profile: Profile,
  grid: readonly number[],
  i: number,
  start: Candidate,
  steps: number,
): Candidate {
  const along = (u: number): number => {
    const from = grid[i] ?? 0;
    const to = (u < 0 ? grid[i - 1] : grid[i + 1]) ?? from;
    return from + Math.abs(u) * (to - from);
  };
  const ratio = (Math.sqrt(5) - 1) / 2;
  let low = -1;
  let high = 1;
  let found = start;
  let p = high - ratio * (high - low);
  let q = low + ratio * (high - low);
  let atP: Candidate | null = null;
  let atQ: Candidate | null = null;
  for (let step = 0; step < steps; step++) {
    atP = atP ?? profile(along(p));
    atQ = atQ ?? profile(along(q));
    for (const candidate of [atP, atQ]) {
      if (candidate && candidate.sumOfSquares < found.sumOfSquares) found = candidate;
    }
    if ((atP?.sumOfSquares ?? Number.POSITIVE_INFINITY) < (atQ?.sumOfSquares ?? Number.POSITIVE_INFINITY)) {
      high = q;
      q = p;
      atQ = atP;
      p = high - ratio * (high - low);
      atP = null;
    } else {
      low = p;
      p = q;
      atP = atQ;
      q = low + ratio * (high - low);
      atQ = null;
    }
  }
  return found;
}

/** Edges of the form's domain for one trial, from all readings; those that need constants not filled in are left out. */
function edgesAt(
  form: StraightForm,
  trial: number,
  readings: WeightedReadings,
  constants: Float64Array,
): number[] {
  const n = readings.x.length;
  const inputs = [readings.x, readings.y, ...constants];
  return (form.trialEdges[trial] ?? []).flatMap((edge) => Array.from(edge.evaluate(inputs, n)).slice(0, n));
}

function dependsOn(form: StraightForm, trial: number, place: number): boolean {
  return (form.trialEdges[trial] ?? []).some((edge) => edge.uses.includes(place + 2));
}

function best(candidates: readonly Candidate[], most: number): Candidate[] {
  return [...candidates].sort((p, q) => p.sumOfSquares - q.sumOfSquares).slice(0, most);
}

/** All values, or evenly chosen ones when there are more than `most`. */
function every(values: readonly number[], most: number): number[] {
  if (values.length <= most) return [...values];
  return Array.from(
    { length: most },
    (_, i) => values[Math.round((i * (values.length - 1)) / (most - 1))] ?? 0,
  );
}
