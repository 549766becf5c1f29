/** gᵀ C g. */
export function quadraticForm(gradient: readonly number[], covariance: readonly Float64Array[]): number {
  let sum = 0;
  covariance.forEach((row, j) => {
    row.forEach((entry, k) => {
      sum += (gradient[j] ?? 0) * (gradient[k] ?? 0) * entry;
    });
  });
  return sum;
}
