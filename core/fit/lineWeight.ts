import { Problem } from '../problem.ts';
import { fitWords } from '../words/fitWords.ts';
import type { StraightAxes } from './fit.ts';
import type { FitTask } from './fitTask.ts';
import { spreadOf } from './spread.ts';

/**
 * Weights of readings on the straight axes, 1/(σ ∂Y/∂y)², from a spread in y; null where none is given.
 * @param task only its readings on the line
 * @throws Problem `domain` for a reading whose weight does not exist or is infinite
 */
export function lineWeightOf(task: FitTask, axes: StraightAxes): Float64Array | null {
  const { y, position, settings } = task;
  if (settings.spreadY.kind === 'none') return null;
  const deviation = spreadOf(settings.spreadY, y, position, 'u_y');
  const { verticalByY } = axes;
  const lineWeight = new Float64Array(y.length);
  for (let i = 0; i < y.length; i++) {
    const scatter = (deviation[i] ?? Number.NaN) * (verticalByY[i] ?? Number.NaN);
    const weight = 1 / (scatter * scatter);
    if (!(weight > 0 && weight < Number.POSITIVE_INFINITY)) {
      const at = position[i] ?? 0;
      throw new Problem('domain', 'y', fitWords.infiniteWeight(at), { position: at });
    }
    lineWeight[i] = weight;
  }
  return lineWeight;
}

/**
 * Standard uncertainties of readings on both straight axes and their covariance, to first order.
 * @param task only its readings on the line; u_y and u_x known
 */
export function axisUncertainties(
  task: FitTask,
  axes: StraightAxes,
): { readonly horizontal: Float64Array; readonly vertical: Float64Array; readonly covariance: Float64Array } {
  const { x, y, position, settings } = task;
  const uX = spreadOf(settings.spreadX, x, position, 'u_x');
  const uY = spreadOf(settings.spreadY, y, position, 'u_y');
  const { verticalByY, verticalByX, horizontalByX, horizontalByY } = axes;
  const horizontal = new Float64Array(x.length);
  const vertical = new Float64Array(x.length);
  const covariance = new Float64Array(x.length);
  for (let i = 0; i < x.length; i++) {
    const varianceX = (uX[i] ?? Number.NaN) ** 2;
    const varianceY = (uY[i] ?? Number.NaN) ** 2;
    const vx = verticalByX[i] ?? 0;
    const vy = verticalByY[i] ?? 0;
    const hx = horizontalByX[i] ?? 0;
    const hy = horizontalByY[i] ?? 0;
    horizontal[i] = Math.sqrt(hx * hx * varianceX + hy * hy * varianceY);
    vertical[i] = Math.sqrt(vx * vx * varianceX + vy * vy * varianceY);
    covariance[i] = vx * hx * varianceX + vy * hy * varianceY;
  }
  return { horizontal, vertical, covariance };
}
