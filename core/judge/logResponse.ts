import type { Fit } from '../fit/fit.ts';

/**
 * Where the vertical axis is a logarithm of the response, c·ln y + g(x), that c; null for any other axis.
 * Told by y ∂Y/∂y, which is the same at every reading.
 */
export function logResponse({ form, axes, used, readings }: Fit): number | null {
  if (form.responseOnBothAxes) return null;
  let c = Number.NaN;
  for (let row = 0; row < used.length; row++) {
    const here = (readings.y[used[row] ?? 0] ?? Number.NaN) * (axes.verticalByY[row] ?? Number.NaN);
    if (row === 0) c = here;
    if (!(Math.abs(here - c) <= 1e-9 * Math.abs(c))) return null;
  }
  // A response that happens to be the same everywhere tells nothing.
  const first = readings.y[used[0] ?? 0];
  return used.some((index) => readings.y[index] !== first) ? c : null;
}
