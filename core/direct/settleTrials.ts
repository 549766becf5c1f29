import type { DirectResult } from '../fit/fit.ts';
import type { StraightForm } from '../law/law.ts';
import { Problem } from '../problem.ts';
import { directWords } from '../words/directWords.ts';
import { clearedStarts } from './clearedStarts.ts';
import { type DirectProblem, requireReadings } from './directFit.ts';
import { directResult } from './directResult.ts';
import { type LawModel, lawModel, unknownPlaces } from './lawModel.ts';
import { descend, levenbergMarquardt, type Minimum } from './levenbergMarquardt.ts';
import type { Candidate } from './lineStarts.ts';
import { preferPositive } from './preferPositive.ts';
import { solveLinear } from './solveLinear.ts';
import { thinReadings } from './thinReadings.ts';
import { type SearchResult, trialSearch } from './trialSearch.ts';

/** Readings that take part in the search, by number of trial constants; the final constants come from all readings. */
const SEARCHED: readonly number[] = [400, 120, 60];
/** Lines fitted at most, by number of trial constants, over all forms. */
const MOST_TRIED: readonly number[] = [8, 2000, 9000];
/** Candidates that are followed down to their minimum. */
const POLISHED = 10;
/** Distinct minima that are settled with all readings when the search used some of them. */
const SETTLED = 3;

/** A direct problem with the straight form that its search begins from; null for a law that has none. */
export interface TrialProblem extends DirectProblem {
  readonly form: StraightForm | null;
}

/**
 * Settles the constants of a law by least squares in the units of y without starting values: the sum of squares is
 * profiled over the trial constants, the line solved at each of their values, and the best minima are settled
 * with all constants together.
 * @param problem the law, n readings (n ≥ number of unknown constants), ω, scale and known constants
 * @param problem.form the straight form whose trial constants are searched first; other sets of trials, and the law multiplied
 * through by its denominator, add starts
 * @returns as `directFit`; `notes` say when the search was cut or the optimum lies at the edge of the law's domain
 * @throws Problem `tooFew` with fewer readings than constants; `noConvergence` when no minimum exists or the constants
 * run away; `argument` when the law cannot be solved for y
 */
export function settleTrials(problem: TrialProblem): DirectResult {
  const { law } = problem;
  requireReadings(problem);
  const model = lawModel(law, problem, problem.constants);
  if (law.linearInConstants) return directResult(problem, model, solveLinear(model, law.unknown), []);
  const { candidates, tried, cut } = searchForms(problem);
  const starts = candidates.map(({ constants }) =>
    unknownPlaces(law).map((place) => constants[place] ?? Number.NaN),
  );
  if (starts.length === 0) {
    throw new Problem('noConvergence', 'law', directWords.noTrialFits(law.unknown, law.equation));
  }
  const minimum = leastOf(model, descents(problem, starts), law.unknown);
  const theta = preferPositive(model, minimum.theta, minimum.sumOfSquares);
  const notes = [
    ...(minimum.atEdge ? [directWords.atEdge(law.unknown)] : []),
    ...(cut ? [directWords.searchCut(tried)] : []),
  ];
  return directResult(problem, model, { ...minimum, theta }, notes);
}

/** Candidates from the given form and from one form of every other set of trials. */
function searchForms(problem: TrialProblem): SearchResult {
  const { law, form, constants } = problem;
  const forms = new Map<string, StraightForm>();
  for (const source of [...(form ? [form] : []), ...law.forms]) {
    const key = source.trials.join(' ');
    if (!forms.has(key)) forms.set(key, source);
  }
  const trials = form?.trials.length ?? 0;
  const readings = thinReadings(problem, SEARCHED[trials] ?? 60);
  const blank = Float64Array.from(constants, (value, k) =>
    law.unknown.includes(law.constants[k] ?? '') ? Number.NaN : value,
  );
  const share = Math.floor((MOST_TRIED[trials] ?? 0) / forms.size);
  const results = Array.from(forms.values(), (source) => trialSearch(law, source, readings, blank, share));
  const candidates: Candidate[] = results.flatMap((result) => result.candidates);
  if (readings.x.length >= law.unknown.length) candidates.push(...clearedStarts(law, readings, blank));
  return {
    candidates: candidates.sort((p, q) => p.sumOfSquares - q.sumOfSquares),
    tried: results.reduce((sum, result) => sum + result.tried, 0),
    cut: results.some((result) => result.cut),
  };
}

/** A minimum with the start that led to it. */
interface Descent extends Minimum {
  readonly start: readonly number[];
}

/** Follows the best starts down on the thinned readings; distinct minima, least first. */
function descents(problem: DirectProblem, starts: readonly number[][]): Descent[] {
  const { law, constants } = problem;
  const model = lawModel(law, thinReadings(problem, 250), constants);
  const minima: Descent[] = [];
  for (const start of starts.slice(0, POLISHED)) {
    const minimum = { ...descend(model, start, 60), start };
    if (Number.isFinite(minimum.sumOfSquares) && !minima.some((other) => same(other, minimum)))
      minima.push(minimum);
  }
  return minima.sort((p, q) => p.sumOfSquares - q.sumOfSquares).slice(0, SETTLED);
}

function same(p: Minimum, q: Minimum): boolean {
  return p.theta.every((value, k) => Math.abs(value - (q.theta[k] ?? 0)) <= 1e-5 * Math.abs(value));
}

/**
 * The least of the minima when each is settled with all readings.
 * @throws Problem `noConvergence` of the least one when it does not settle: a greater sum of squares elsewhere is no answer
 */
function leastOf(model: LawModel, minima: readonly Descent[], names: readonly string[]): Minimum {
  let least: Minimum | null = null;
  let failure: { readonly problem: Problem; readonly sumOfSquares: number } | null = null;
  const residual = new Float64Array(model.readings);
  for (const descent of minima) {
    try {
      const minimum = levenbergMarquardt(model, descent.theta, names, descent.start);
      if (least === null || minimum.sumOfSquares < least.sumOfSquares) least = minimum;
    } catch (error) {
      if (!(error instanceof Problem)) throw error;
      const sumOfSquares = model.residuals(descent.theta, residual);
      if (failure === null || sumOfSquares < failure.sumOfSquares) failure = { problem: error, sumOfSquares };
    }
  }
  if (least !== null && !(failure !== null && failure.sumOfSquares < least.sumOfSquares * (1 - 1e-9)))
    return least;
  throw failure?.problem ?? new Problem('noConvergence', 'law', directWords.notSettled(names, 0));
}
