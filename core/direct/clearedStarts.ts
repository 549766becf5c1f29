import { clearedRelation } from '../law/clearedRelation.ts';
import type { Law } from '../law/law.ts';
import { curveOf, lawModel, unknownPlaces, type WeightedReadings } from './lawModel.ts';
import type { Candidate } from './lineStarts.ts';
import { applyTransposed, factorisationSpace, factorise, reciprocalCondition, solveRotated } from './qr.ts';

/** Times that the relation is solved, each time with the weights that the solution before gives. */
const PASSES = 8;

/**
 * Starts for a curve that is a ratio P/Q: y·Q − P = 0 is linear in the constants and is solved by least squares,
 * with weights ω/Q² that make it least squares in the units of y. Every pass is a candidate.
 * @param constants aligned with `law.constants`: known ones filled in
 * @returns empty when the law is no such ratio, or the readings do not determine the relation
 */
export function clearedStarts(law: Law, readings: WeightedReadings, constants: Float64Array): Candidate[] {
  const cleared = clearedRelation(curveOf(law).expression, law.symbols, law.unknown);
  if (cleared === null) return [];
  const { x, y, omega } = readings;
  const n = x.length;
  const places = unknownPlaces(law);
  const p = places.length;
  const model = lawModel(law, readings, constants);
  const filled = Float64Array.from(constants);
  for (const place of places) filled[place] = 0;
  const { value, partials } = cleared.relation.gradient(
    [x, y, ...filled],
    n,
    places.map((place) => place + 2),
  );

  const matrix = new Float64Array(n * p);
  const right = new Float64Array(n);
  const theta = new Float64Array(p);
  const residual = new Float64Array(n);
  const space = factorisationSpace(n, p);
  let weight = omega.map(Math.sqrt);
  const candidates: Candidate[] = [];
  for (let pass = 0; pass < PASSES; pass++) {
    for (let i = 0; i < n; i++) {
      for (let k = 0; k < p; k++) matrix[k * n + i] = (weight[i] ?? 0) * (partials[k]?.[i] ?? 0);
      right[i] = -(weight[i] ?? 0) * (value[i] ?? 0);
    }
    if (!(matrix.every(Number.isFinite) && right.every(Number.isFinite))) break;
    factorise(space, matrix);
    if (!(reciprocalCondition(space) > 1e-14)) break;
    applyTransposed(space, right);
    solveRotated(space, right, theta);
    const solution = Float64Array.from(filled);
    places.forEach((place, k) => {
      solution[place] = theta[k] ?? Number.NaN;
    });
    const sumOfSquares = model.residuals(theta, residual);
    if (Number.isFinite(sumOfSquares)) candidates.push({ constants: solution, sumOfSquares });
    const denominator = cleared.denominator.evaluate([x, y, ...solution], n);
    weight = omega.map((w, i) => Math.sqrt(w) / Math.abs(denominator[i] ?? Number.NaN));
  }
  return candidates;
}
