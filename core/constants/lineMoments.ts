/** Σw, Σwx/Σw and Σw(x − mean)² of the horizontal values of a line. */
export interface LineMoments {
  readonly total: number;
  readonly mean: number;
  readonly spread: number;
}

/** @param lineWeight w, one per value of `horizontal` */
export function lineMoments(horizontal: Float64Array, lineWeight: Float64Array): LineMoments {
  let total = 0;
  let sum = 0;
  for (let i = 0; i < horizontal.length; i++) {
    total += lineWeight[i] ?? 0;
    sum += (lineWeight[i] ?? 0) * (horizontal[i] ?? 0);
  }
  const mean = sum / total;
  let spread = 0;
  for (let i = 0; i < horizontal.length; i++) {
    spread += (lineWeight[i] ?? 0) * ((horizontal[i] ?? 0) - mean) ** 2;
  }
  return { total, mean, spread };
}
