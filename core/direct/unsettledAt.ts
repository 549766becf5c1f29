import { directWords } from '../words/directWords.ts';
import { DEPENDENT } from './gaussNewton.ts';
import { dependentColumns, factorisationSpace, factorise } from './qr.ts';
import type { ResidualModel } from './residualModel.ts';

/** Growth beyond the start from which a constant counts as running away. */
const RUN_AWAY = 1e4;

/**
 * The sentence that says why an iteration did not settle: which constants ran away or depend on each other, or
 * that the steps never became small.
 * @param theta where the iteration gave up
 * @param start where it began
 */
export function unsettledAt(
  model: ResidualModel,
  theta: Float64Array,
  start: ArrayLike<number>,
  names: readonly string[],
  iterations: number,
): string {
  const running = names.filter((_, k) => {
    const from = Math.abs(start[k] ?? 0);
    return (from > 0 && Math.abs(theta[k] ?? 0) > RUN_AWAY * from) || !Number.isFinite(theta[k]);
  });
  if (running.length > 0)
    return directWords.runAway(
      running,
      running.map((name) => theta[names.indexOf(name)] ?? 0),
    );
  const loose = looseConstants(model, theta, names);
  return loose.length > 0 ? directWords.dependent(loose) : directWords.notSettled(names, iterations);
}

/**
 * The constants that the readings do not settle at θ: those with a part in the direction along which the fitted
 * values do not change. Empty when the Jacobian has full rank.
 */
export function looseConstants(
  model: ResidualModel,
  theta: Float64Array,
  names: readonly string[],
): string[] {
  const { readings, constants } = model;
  const jacobian = new Float64Array(readings * constants);
  if (!Number.isFinite(model.jacobian(theta, new Float64Array(readings), jacobian))) return [];
  const space = factorise(factorisationSpace(readings, constants), jacobian);
  const flat = names.filter((_, k) => isZero(jacobian, k * readings, readings));
  if (flat.length > 0) return flat;
  return dependentColumns(space, DEPENDENT).map((k) => names[k] ?? '');
}

function isZero(column: Float64Array, start: number, count: number): boolean {
  for (let i = start; i < start + count; i++) if (column[i] !== 0) return false;
  return true;
}
