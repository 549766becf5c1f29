import type { Cells } from '../hostCalls.ts';

/** The least that any fit of an exponential must do: read the cells, take the logarithms, and sum. */
export function bareLoop(x: Cells, y: Cells): number {
  let n = 0;
  let sx = 0;
  let sy = 0;
  let sxx = 0;
  let sxy = 0;
  for (let i = 0; i < x.length; i++) {
    const a = x[i]?.[0];
    const b = y[i]?.[0];
    if (typeof a !== 'number' || typeof b !== 'number') continue;
    const vertical = Math.log(b);
    n++;
    sx += a;
    sy += vertical;
    sxx += a * a;
    sxy += a * vertical;
  }
  return (n * sxy - sx * sy) / (n * sxx - sx * sx);
}
