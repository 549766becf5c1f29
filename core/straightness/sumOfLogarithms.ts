/** Products within these bounds take another factor; others are turned into a logarithm first. */
const LEAST = 1e-150;
const MOST = 1e150;

/** Σ ln |column|, the factors multiplied up so that few logarithms are taken; −∞ where one is 0. */
export function sumOfLogarithms(column: Float64Array): number {
  let sum = 0;
  let product = 1;
  for (let i = 0; i < column.length; i++) {
    const factor = Math.abs(column[i] as number); // i < length
    if (factor > LEAST && factor < MOST) {
      product *= factor;
      if (product < LEAST || product > MOST) {
        sum += Math.log(product);
        product = 1;
      }
    } else sum += Math.log(factor);
  }
  return sum + Math.log(product);
}
